package steelyard.results.ledger;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.FileSystemException;
import java.nio.file.NoSuchFileException;
import java.nio.file.NotDirectoryException;

/** Says why a file operation failed; exceptions of the library often say no more than the path. */
public final class Reasons {

  private Reasons() {}

  /** The reason in a few words, without the path. */
  public static String of(IOException e) {
    if (e instanceof NoSuchFileException || e instanceof NotDirectoryException) {
      return "no such folder or file";
    }
    if (e instanceof FileAlreadyExistsException) {
      return "a file stands where a folder is needed";
    }
    if (e instanceof AccessDeniedException) {
      return "permission denied";
    }
    if (e instanceof FileSystemException f && f.getReason() != null) {
      return f.getReason();
    }
    return e.getMessage() == null ? e.getClass().getSimpleName() : e.getMessage();
  }
}
