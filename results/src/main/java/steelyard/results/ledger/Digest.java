package steelyard.results.ledger;

import com.fasterxml.jackson.annotation.JsonCreator;
import com.fasterxml.jackson.annotation.JsonValue;
import java.util.HexFormat;

/**
 * What stands for some content: equal digests mean equal content.
 *
 * @param hex lowercase hexadecimal digits of 16 to 64 bytes
 */
public record Digest(@JsonValue String hex) {

  private static final int LEAST_BYTES = 16;
  private static final int MOST_BYTES = 64;

  @JsonCreator(mode = JsonCreator.Mode.DELEGATING)
  public Digest {
    Hex.check("digest", hex, LEAST_BYTES, MOST_BYTES);
  }

  /** The digest whose bytes these are. */
  public static Digest of(byte[] bytes) {
    return new Digest(HexFormat.of().formatHex(bytes));
  }

  byte[] bytes() {
    return HexFormat.of().parseHex(hex);
  }

  @Override
  public String toString() {
    return hex;
  }
}
