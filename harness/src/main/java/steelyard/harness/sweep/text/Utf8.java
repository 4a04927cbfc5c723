package steelyard.harness.sweep.text;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.StandardCharsets;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;

/** Reads a text file of bounded size, and nothing that is not UTF-8. */
public final class Utf8 {

  private static final char BYTE_ORDER_MARK = '\uFEFF';

  private Utf8() {}

  /**
   * The file's text, without a byte order mark.
   *
   * @param shown the file's name in messages
   * @param mostBytes a larger file is refused
   * @throws SweepProblem if it cannot be read, is too large or is not UTF-8
   */
  public static String read(Path file, String shown, int mostBytes) {
    Place place = Place.of(shown);
    if (Files.isDirectory(file)) {
      throw Mistakes.only(place, "is a folder, not a file");
    }
    try (InputStream in = Files.newInputStream(file)) {
      byte[] bytes = in.readNBytes(mostBytes + 1);
      if (bytes.length > mostBytes) {
        throw Mistakes.only(place, "is larger than " + mostBytes / 1000 + " kB; is this the file?");
      }
      return decode(bytes, place);
    } catch (NoSuchFileException e) {
      throw Mistakes.only(place, "no such file");
    } catch (AccessDeniedException e) {
      throw Mistakes.only(place, "may not be read by this user");
    } catch (IOException e) {
      throw Mistakes.only(place, "cannot be read: " + e.getMessage());
    }
  }

  private static String decode(byte[] bytes, Place place) {
    CharsetDecoder decoder = StandardCharsets.UTF_8.newDecoder();
    ByteBuffer in = ByteBuffer.wrap(bytes);
    CharBuffer out = CharBuffer.allocate(bytes.length);
    CoderResult result = decoder.decode(in, out, true);
    if (result.isError()) {
      int line = 1;
      for (int i = 0; i < in.position(); i++) {
        line += bytes[i] == '\n' ? 1 : 0;
      }
      throw Mistakes.only(place.line(line), "not UTF-8 text; save the file as UTF-8");
    }
    String text = out.flip().toString();
    return !text.isEmpty() && text.charAt(0) == BYTE_ORDER_MARK ? text.substring(1) : text;
  }
}
