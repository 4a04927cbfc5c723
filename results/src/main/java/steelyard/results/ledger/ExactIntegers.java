package steelyard.results.ledger;

import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.util.JsonGeneratorDelegate;
import java.io.IOException;

/**
 * Writes integers beyond 2^53 in magnitude as strings, since many readers of JSON keep numbers as
 * doubles, which are exact only up to there (IEEE 754 binary64; RFC 8259, section 6).
 */
public final class ExactIntegers extends JsonGeneratorDelegate {

  private static final long EXACT = 1L << 53;

  /** Writes to another generator, which it closes with itself. */
  public ExactIntegers(JsonGenerator target) {
    super(target);
  }

  @Override
  public void writeNumber(long value) throws IOException {
    if (value > EXACT || value < -EXACT) {
      writeString(Long.toString(value));
    } else {
      super.writeNumber(value);
    }
  }
}
