package steelyard.results.ledger;

import static java.nio.charset.StandardCharsets.UTF_8;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.zip.DataFormatException;
import java.util.zip.Deflater;
import java.util.zip.DeflaterOutputStream;
import java.util.zip.Inflater;

/** Text in little room: UTF-8 in the ZLIB format (RFC 1950), whose checksums tell of damage. */
final class Packed {

  private Packed() {}

  /**
   * Packs a text, the smaller the more it resembles another.
   *
   * @param basis the other text, needed again to unpack; empty for none
   */
  static byte[] pack(String text, String basis) {
    Deflater deflater = new Deflater(Deflater.BEST_COMPRESSION);
    if (!basis.isEmpty()) {
      deflater.setDictionary(basis.getBytes(UTF_8));
    }
    ByteArrayOutputStream packed = new ByteArrayOutputStream();
    try (DeflaterOutputStream out = new DeflaterOutputStream(packed, deflater)) {
      out.write(text.getBytes(UTF_8));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    } finally {
      deflater.end();
    }
    return packed.toByteArray();
  }

  /**
   * What was packed by the same basis.
   *
   * @throws IOException if the bytes are damaged or were packed by another basis
   */
  static String unpack(byte[] packed, String basis) throws IOException {
    Inflater inflater = new Inflater();
    try {
      inflater.setInput(packed);
      return inflated(inflater, basis.getBytes(UTF_8));
    } catch (DataFormatException | IllegalArgumentException e) {
      throw new IOException("not what was packed", e);
    } finally {
      inflater.end();
    }
  }

  private static String inflated(Inflater inflater, byte[] dictionary)
      throws DataFormatException, IOException {
    ByteArrayOutputStream text = new ByteArrayOutputStream();
    byte[] buffer = new byte[8192];
    while (!inflater.finished()) {
      int size = inflater.inflate(buffer);
      text.write(buffer, 0, size);
      if (inflater.needsDictionary()) {
        inflater.setDictionary(dictionary);
      } else if (size == 0 && inflater.needsInput() && !inflater.finished()) {
        throw new IOException("cut off");
      }
    }
    return text.toString(UTF_8);
  }
}
