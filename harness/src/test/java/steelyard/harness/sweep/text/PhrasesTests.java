package steelyard.harness.sweep.text;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class PhrasesTests {

  private static final List<String> KNOWN = List.of("cpsat", "engine", "sat", "seed");

  @Test
  void suggests_theNearestName() {
    assertThat(Phrases.nearest("cpsatt", KNOWN)).contains("cpsat");
    assertThat(Phrases.nearest("CPSAT", KNOWN)).contains("cpsat");
    assertThat(Phrases.nearest("sede", KNOWN)).contains("seed");
    assertThat(Phrases.nearest("st", KNOWN)).contains("sat");
  }

  @Test
  void suggestsNothing_whereNothingIsNear() {
    assertThat(Phrases.nearest("choco", KNOWN)).isEmpty();
    assertThat(Phrases.nearest("x", KNOWN)).isEmpty();
    assertThat(Phrases.nearest("cpsat", List.of())).isEmpty();
  }

  @Test
  void quotesOnOneLine_andCutsWhatIsLong() {
    assertThat(Phrases.quoted("a\nb\u001b[31m")).isEqualTo("'a b [31m'");
    assertThat(Phrases.quoted("x".repeat(100))).isEqualTo("'" + "x".repeat(60) + "...'");
    assertThat(Phrases.quoted("\uD83D\uDE00".repeat(61)))
        .isEqualTo("'" + "\uD83D\uDE00".repeat(60) + "...'");
  }

  @Test
  void listsWhatIsKnown_upToTwelve() {
    assertThat(Phrases.known(KNOWN)).isEqualTo("known: cpsat, engine, sat, seed");
    assertThat(Phrases.known(List.of())).isEqualTo("known: none");
    assertThat(Phrases.known(IntStream.range(0, 15).mapToObj(Integer::toString).toList()))
        .isEqualTo("known: 0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11 and 3 more");
  }
}
