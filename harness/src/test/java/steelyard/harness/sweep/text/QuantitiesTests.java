package steelyard.harness.sweep.text;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.math.BigDecimal;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class QuantitiesTests {

  @ParameterizedTest
  @CsvSource({"10s, 10", "10 s, 10", "0.25s, 0.25", "1500 ms, 1.5", "2min, 120", "1.5 h, 5400"})
  void readsDurations(String text, double seconds) {
    assertThat(Quantities.seconds(text)).isEqualTo(seconds);
  }

  /** Prefixes after IEC 80000-13: k = 10^3, Ki = 2^10 and so on. */
  @ParameterizedTest
  @CsvSource({
    "1000 kB, 1000000",
    "2 GB, 2000000000",
    "1.5GB, 1500000000",
    "1024 KiB, 1048576",
    "512 MiB, 536870912",
    "2GiB, 2147483648",
    "1.0000001 MB, 1000000"
  })
  void readsSizes(String text, long bytes) {
    assertThat(Quantities.bytes(text)).isEqualTo(bytes);
  }

  @Test
  void readsShares() {
    assertThat(Quantities.share("5%")).isEqualTo(0.05);
    assertThat(Quantities.share("0 %")).isZero();
    assertThat(Quantities.share("100 %")).isEqualTo(1);
  }

  @Test
  void readsAmounts_inOneOfTheUnits() {
    assertThat(Quantities.amount("2.5 nodes", List.of("conflicts", "nodes")))
        .isEqualTo(new Quantities.Measured(new BigDecimal("2.5"), "nodes"));
  }

  @ParameterizedTest
  @CsvSource(
      quoteCharacter = '"',
      value = {
        "10, \"'10' has no unit; write a number and a unit (ms, s, min, h): 10 s\"",
        "soon, \"'soon' is not a duration; write a number and a unit (ms, s, min, h): 10 s\"",
        "3 hrs, \"unknown unit 'hrs'; write a number and a unit (ms, s, min, h): 10 s\"",
        "3 mim, \"unknown unit 'mim' (did you mean 'min'?); write a number and a unit (ms, s, min,"
            + " h): 10 s\"",
        "-3 s, \"'-3 s' is no time at all\"",
        "0 s, \"'0 s' is no time at all\"",
        "200 h, \"'200 h' is longer than a week\"",
        "1e3 s, \"'1e3 s' is not a duration; write a number and a unit (ms, s, min, h): 10 s\""
      })
  void refusesDurations_withWhatIsAllowed(String text, String message) {
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Quantities.seconds(text))
        .withMessage(message);
  }

  @Test
  void refusesSizesAndSharesOutOfRange() {
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Quantities.bytes("10 kB"))
        .withMessage("'10 kB' is less than 1 MB");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Quantities.bytes("9999999 GB"))
        .withMessage("'9999999 GB' is more than any machine has");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Quantities.share("101 %"))
        .withMessage("'101 %' is not in 0 % .. 100 %");
  }
}
