package steelyard.results.brief;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.results.statistics.TimeRatio;
import steelyard.results.statistics.TimeRatio.Kind;

class WordsTest {

  @Test
  void shows_whatCannotBeSeen() {
    assertThat(Words.name("a\u202Eb\u0000c\nd\u200Be"))
        .isEqualTo("a[U+202E]b[U+0000]c[U+000A]d[U+200B]e");
    assertThat(Words.name("half \uD83D pair")).isEqualTo("half [U+D83D] pair");
    assertThat(Words.name("é 瓦 🧱")).isEqualTo("é 瓦 🧱");
    assertThat(Words.name("")).isEqualTo("(empty)");
    assertThat(Words.visibleLines("a:\n\tb\r\u0007")).isEqualTo("a:\n\tb[U+000D][U+0007]");
    assertThat(Words.visibleLines("")).isEmpty();
  }

  @Test
  void cutsByCodePoints() {
    assertThat(Words.name("x".repeat(4096))).hasSize(80).endsWith("x…");
    assertThat(Words.cut("🧱🧱🧱", 2)).isEqualTo("🧱…");
    assertThat(Words.cut("ab", 2)).isEqualTo("ab");
    assertThat(Words.cutMiddle("plain+heads on engine", 11)).isEqualTo("plain…ngine");
    assertThat(Words.cutMiddle("🧱🧱🧱🧱🧱", 4)).isEqualTo("🧱🧱…🧱");
    assertThat(Words.cutMiddle("short", 5)).isEqualTo("short");
  }

  @ParameterizedTest
  @CsvSource({
    "0, 0.000",
    "0.0123, 0.012",
    "0.9994, 0.999",
    "0.9996, 1.00",
    "3.14159, 3.14",
    "9.996, 10.0",
    "99.96, 100",
    "3600, 3600",
  })
  void writesSeconds_toThreeDigits(double seconds, String expected) {
    assertThat(Words.seconds(seconds)).isEqualTo(expected);
  }

  @Test
  void writesNumbers_theSameInEveryLocale() {
    Locale before = Locale.getDefault();
    try {
      Locale.setDefault(Locale.GERMANY);
      assertThat(Words.seconds(1.5)).isEqualTo("1.50");
      assertThat(Words.count(4.5)).isEqualTo("4.50");
      assertThat(Words.percent(0.05)).isEqualTo("5 %");
      assertThat(Words.percent(0.125)).isEqualTo("12.5 %");
      assertThat(Words.plain(0.05)).isEqualTo("0.05");
    } finally {
      Locale.setDefault(before);
    }
  }

  @Test
  void saysWhatIsKnown_ofARatio() {
    assertThat(Words.ratio(new TimeRatio(1.07, Kind.EXACT))).isEqualTo("1.07×");
    assertThat(Words.ratio(new TimeRatio(12.4, Kind.AT_LEAST))).isEqualTo("≥ 12×");
    assertThat(Words.speedup(new TimeRatio(0.25, Kind.AT_MOST))).isEqualTo("≥ 4.0×");
  }

  @Test
  void ordersNames_byTheirNumbers() {
    List<String> names =
        new ArrayList<>(List.of("la10", "la2", "ft06", "la02", "la", "la2b", "10", "9"));

    names.sort(NaturalOrder.BY_NUMBER);

    assertThat(names).containsExactly("9", "10", "ft06", "la", "la02", "la2", "la2b", "la10");
  }
}
