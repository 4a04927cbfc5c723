package steelyard.results.ledger;

import static java.nio.charset.StandardCharsets.UTF_8;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.zip.Deflater;
import java.util.zip.DeflaterOutputStream;
import java.util.zip.InflaterOutputStream;

/** Text in little room: UTF-8 in the ZLIB format (RFC 1950). */
final class Packed {

  private Packed() {}

  static byte[] pack(String text) {
    Deflater deflater = new Deflater(Deflater.BEST_COMPRESSION);
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
   * @throws IOException if the bytes are damaged: the format carries a checksum
   */
  static String unpack(byte[] packed) throws IOException {
    ByteArrayOutputStream text = new ByteArrayOutputStream();
    try (InflaterOutputStream out = new InflaterOutputStream(text)) {
      out.write(packed);
    }
    return text.toString(UTF_8);
  }
}
