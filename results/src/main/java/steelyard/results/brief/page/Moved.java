package steelyard.results.brief.page;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/** Files that are complete or not there: written beside their place and moved into it. */
final class Moved {

  private Moved() {}

  /**
   * Replaces a file by this text, in UTF-8. A reader sees the old text or the new one; if it fails
   * the old file is untouched.
   */
  static void into(Path file, String text) throws IOException {
    Path target = file.toAbsolutePath();
    Path folder = target.getParent();
    Files.createDirectories(folder);
    Path beside = Files.createTempFile(folder, "." + target.getFileName() + ".", ".part");
    try {
      Files.write(beside, text.getBytes(StandardCharsets.UTF_8));
      move(beside, target);
    } finally {
      Files.deleteIfExists(beside);
    }
  }

  private static void move(Path from, Path to) throws IOException {
    try {
      Files.move(from, to, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    } catch (AtomicMoveNotSupportedException e) {
      Files.move(from, to, StandardCopyOption.REPLACE_EXISTING);
    }
  }
}
