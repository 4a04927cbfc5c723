package steelyard.results.ledger;

import com.fasterxml.jackson.annotation.JsonCreator;
import com.fasterxml.jackson.annotation.JsonValue;
import java.nio.ByteBuffer;
import java.util.HexFormat;

/**
 * What makes two runs the same experiment: 16 bytes, compared as bytes.
 *
 * @param high the first eight bytes, big-endian
 * @param low the last eight bytes, big-endian
 */
public record RunKey(long high, long low) {

  static final int BYTES = 16;

  /** The key that 32 lowercase hexadecimal digits spell. */
  @JsonCreator
  public static RunKey parse(String hex) {
    Hex.check("key", hex, BYTES, BYTES);
    return of(HexFormat.of().parseHex(hex));
  }

  /**
   * The key that these bytes are.
   *
   * @throws IllegalArgumentException unless there are 16
   */
  public static RunKey of(byte[] bytes) {
    if (bytes.length != BYTES) {
      throw new IllegalArgumentException("a key has 16 bytes, not " + bytes.length);
    }
    ByteBuffer buffer = ByteBuffer.wrap(bytes);
    return new RunKey(buffer.getLong(), buffer.getLong());
  }

  byte[] bytes() {
    return ByteBuffer.allocate(BYTES).putLong(high).putLong(low).array();
  }

  /** 32 lowercase hexadecimal digits. */
  @JsonValue
  public String hex() {
    return HexFormat.of().formatHex(bytes());
  }

  @Override
  public String toString() {
    return hex();
  }
}
