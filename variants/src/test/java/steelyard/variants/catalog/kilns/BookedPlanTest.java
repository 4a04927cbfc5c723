package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.KnownSolution;

class BookedPlanTest {
  private static final Campaign CAMPAIGN = Campaigns.byHand();
  private static final Plan PLAN = Campaigns.planByHand();
  private static final String TEXT =
      """
      kiln-plan 1
      firing A.1 heat 1 day 100 lots L1
      firing A.2 heat 2 day 103 lots L2
      firing B.1 heat 1 day 105 lots L3
      cost 32
      """;

  @TempDir private Path folder;

  @Test
  void writes_firings_and_the_cost() {
    assertThat(BookedPlan.text(CAMPAIGN, PLAN, 32)).isEqualTo(TEXT);
  }

  @Test
  void reads_what_is_written() {
    KnownSolution known = read(TEXT);
    assertThat(known.decisions()).isEqualTo(PLAN.decisions(CAMPAIGN));
    assertThat(known.objective()).hasValue(32);
    assertThat(read(TEXT.replace("cost 32\n", "")).objective()).isEmpty();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          firing B.1 | firing B.9 | text:4: firing B.9: no firing 'B.9'; there is A.1, A.2, B.1, B.2
          firing B.1 | firing A.1 | text:4: firing A.1: this firing is booked twice; remove one of them
          lots L3 | lots L2 | text:4: firing B.1: lot L2 is in a firing already; remove it from one of them
          lots L3 | lots L3,L9 | text:4: firing B.1: no lot 'L9'; there is L1, L2, L3
          firing A.2 heat 2 day 103 lots L2 | firing B.2 heat 1 day 107 lots L2 | OK
          heat 2 | heat 3 | text:3: firing A.2: heat '3' must be a whole number from 1 to 2
          day 100 | day 99 | text:2: firing A.1: day '99' must be a whole number from 100 to 109
          cost 32 | price 32 | text:5: price 32: no such keyword; a line begins with 'firing' or 'cost'
          cost 32 | cost much | text:5: cost much: its number 'much' must be a whole number from 0 to 1000000
          cost 32 | cost 32 in coins | text:5: cost 32: no field 'in'; a cost has nothing but its name
          firing B.1 heat 1 day 105 lots L3 | # | text:5: lot L3 is in no firing; add it to one
          """)
  void says_where_and_what_to_do_whenGiven(String text, String instead, String message) {
    String changed = TEXT.replace(text, instead);
    assertThat(changed).isNotEqualTo(TEXT);
    if (message.equals("OK")) {
      assertThat(read(changed).decisions()).containsEntry("in[L2,B.2]", 1);
    } else {
      assertThatExceptionOfType(InstanceException.class)
          .isThrownBy(() -> read(changed))
          .withMessage(message);
    }
  }

  @Test
  void says_so_whenGiven_a_kiln_that_cannot_take_the_lot() {
    Lot hot = new Lot("L3", 1, false, 2, 2, 2, 0, 3, 1, OptionalInt.empty());
    Campaign campaign = CAMPAIGN.withLots(List.of(CAMPAIGN.lot(0), CAMPAIGN.lot(1), hot));
    assertThatExceptionOfType(InstanceException.class)
        .isThrownBy(() -> BookedPlan.read(campaign, source(TEXT)))
        .withMessage("text:4: firing B.1: the kiln is not hot enough for lot L3, or too small");
  }

  private KnownSolution read(String text) {
    try {
      return BookedPlan.read(CAMPAIGN, source(text));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private InstanceSource source(String text) {
    try {
      return new InstanceSource("text", Files.writeString(folder.resolve("text"), text));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
