package steelyard.harness.local;

import java.security.SecureRandom;
import java.util.HexFormat;

/** Ids of runs and sweeps. */
public final class RunIds {
  private static final SecureRandom RANDOM = new SecureRandom();
  private static final int BYTES = 8;

  private RunIds() {}

  /** A new id: 16 hexadecimal digits that nothing else will have. */
  public static String next() {
    byte[] bytes = new byte[BYTES];
    RANDOM.nextBytes(bytes);
    return HexFormat.of().formatHex(bytes);
  }
}
