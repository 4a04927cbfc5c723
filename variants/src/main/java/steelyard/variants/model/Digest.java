package steelyard.variants.model;

import java.util.Locale;
import java.util.Objects;

/**
 * A SHA-256 digest (FIPS 180-4).
 *
 * @param hex 64 lower-case hexadecimal digits
 */
public record Digest(String hex) implements Comparable<Digest> {
  public Digest {
    Objects.requireNonNull(hex, "hex");
    if (!hex.matches("[0-9a-f]{64}")) {
      throw new IllegalArgumentException(
          String.format(Locale.ROOT, "a digest has 64 hexadecimal digits, not '%s'", hex));
    }
  }

  @Override
  public int compareTo(Digest other) {
    return hex.compareTo(other.hex);
  }

  @Override
  public String toString() {
    return hex.substring(0, 12);
  }
}
