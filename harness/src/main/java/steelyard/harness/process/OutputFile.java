package steelyard.harness.process;

import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;

/** A file that a child writes text to: kept from filling the disk, and read as far as it is fit. */
final class OutputFile {
  static final int TAIL_BYTES = 8192;

  private OutputFile() {}

  /**
   * Empties the file if it is longer than allowed; the child, which appends, writes on from the
   * start, so that the latest output is what remains.
   */
  static void cut(Path file, long allowedBytes) {
    try {
      if (Files.size(file) > allowedBytes) {
        FileChannel.open(file, StandardOpenOption.WRITE, StandardOpenOption.TRUNCATE_EXISTING)
            .close();
      }
    } catch (IOException e) {
      return; // the child has removed its own output: nothing to cut
    }
  }

  /** Shortens the file of a child that has ended to what is allowed. */
  static void shorten(Path file, long allowedBytes) {
    try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
      channel.truncate(allowedBytes);
    } catch (IOException e) {
      return;
    }
  }

  /**
   * The last lines, at most {@value #TAIL_BYTES} bytes of them, fit for a terminal or a page: line
   * breaks and tabs stay, every other control or format character becomes {@code ?}.
   */
  static String tail(Path file) {
    try (RandomAccessFile in = new RandomAccessFile(file.toFile(), "r")) {
      long from = Math.max(0, in.length() - TAIL_BYTES);
      in.seek(from);
      byte[] bytes = new byte[(int) Math.min(TAIL_BYTES, in.length() - from)];
      in.readFully(bytes);
      String text = new String(bytes, StandardCharsets.UTF_8);
      return printable(from == 0 ? text : text.substring(text.indexOf('\n') + 1)).strip();
    } catch (IOException e) {
      return "";
    }
  }

  private static String printable(String text) {
    return text.codePoints()
        .map(c -> c == '\n' || c == '\t' || !unprintable(c) ? c : '?')
        .collect(StringBuilder::new, StringBuilder::appendCodePoint, StringBuilder::append)
        .toString();
  }

  private static boolean unprintable(int codePoint) {
    return switch (Character.getType(codePoint)) {
      case Character.CONTROL,
          Character.FORMAT,
          Character.SURROGATE,
          Character.LINE_SEPARATOR,
          Character.PARAGRAPH_SEPARATOR,
          Character.UNASSIGNED ->
          true;
      default -> false;
    };
  }
}
