package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class TextTest {

  private static final String FLAME = "\ud83d\udd25";

  @Test
  void keeps_a_text_that_fits() {
    assertThat(Text.head("kiln", 4)).isEqualTo("kiln");
    assertThat(Text.tail("kiln", 4)).isEqualTo("kiln");
  }

  @Test
  void cuts_and_marks_a_text_that_does_not_fit() {
    assertThat(Text.head("kilns", 4)).isEqualTo("kil…");
    assertThat(Text.tail("kilns", 4)).isEqualTo("…lns");
  }

  @Test
  void never_leaves_half_of_a_pair_when_it_cuts() {
    assertThat(Text.head("ab" + FLAME + "c", 4)).isEqualTo("ab…");
    assertThat(Text.tail("a" + FLAME + "bc", 4)).isEqualTo("…bc");
  }
}
