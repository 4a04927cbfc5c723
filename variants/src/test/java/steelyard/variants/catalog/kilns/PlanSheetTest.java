package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.variants.model.Ints;

class PlanSheetTest {
  @Test
  void shows_costs_kilns_and_late_lots() {
    Campaign campaign = Campaigns.byHand();
    assertThat(sheet(campaign, Campaigns.planByHand()))
        .isEqualTo(
            """
            3 lots in 3 firings of 2 kilns: cost 32
            fuel 16, changes of temperature 8, lateness 8

            A column is 1 day: the heat while firing, - while cooling, # under repair.

            day           100
            A             1-.22-...
            B             ..#..1-..

            kiln A: 2 firings
              A.1  heat 1  days 100-102  2 of 4 shelves
                L1
              A.2  heat 2  days 103-106  2 of 4 shelves
                L2

            kiln B: 1 firing
              B.1  heat 1  days 105-107  1 of 3 shelves
                L3

            Late:
              L2: due on day 104, 2 days late, cost 4
              L3: due on day 103, 4 days late, cost 4

            This plan says only what is fired where and when. Kiln, gas and machine safety
            rules, working-hours rules and local codes come first, and licensed practice
            decides what may be lit.
            """);
  }

  @ParameterizedTest
  @ValueSource(strings = {"tiny-1", "medium-1", "large-1", "many-glazes-1"})
  void stays_within_80_columns_and_names_every_lot_whenGiven(String instance) {
    Campaign campaign = Campaigns.shipped(instance);
    String sheet = sheet(campaign, GreedyPlan.of(campaign).orElseThrow());
    assertThat(sheet.lines()).allMatch(line -> line.length() <= 80);
    assertThat(campaign.lots()).allMatch(lot -> sheet.contains(lot.name()));
  }

  @Test
  void stays_within_80_columns_whenGiven_long_names_many_heats_and_many_days() {
    List<Heat> heats = new ArrayList<>();
    IntStream.range(0, 20).forEach(i -> heats.add(new Heat(300, 600, 1)));
    Kiln kiln =
        new Kiln(
            "ABCDEFGHIJKL", 100_000, 100_000, 20, 12, 1, 1, 1, Ints.of(new int[20]), List.of());
    List<Lot> lots =
        IntStream.range(10, 40)
            .mapToObj(
                i ->
                    new Lot(
                        "LOT-NAMED-" + i, 3_000, false, 12, 20, 0, 0, 1, 9, OptionalInt.empty()))
            .toList();
    Campaign campaign =
        new Campaign(
            new Works(99_000, 1000, 1, 1, 1),
            heats,
            IntStream.range(0, 20).mapToObj(i -> Ints.of(new int[20])).toList(),
            List.of(new Glaze("clear", Glaze.Kind.PLAIN)),
            List.of(),
            List.of(kiln),
            lots,
            List.of(),
            List.of());
    Plan plan = new Plan(Ints.of(new int[30]), Ints.of(12), Ints.of(50));
    String sheet = sheet(campaign, plan);
    assertThat(sheet.lines()).allMatch(line -> line.length() <= 80);
    assertThat(sheet)
        .contains("A column is 16 days")
        .contains("Heats from 10 on are marked a, b, c and so on.")
        .contains("....cccccccccccccccccc---")
        .contains("heat 12  days 99050-99950  90000 of 100000 shelves");
  }

  private static String sheet(Campaign campaign, Plan plan) {
    return PlanSheet.of(campaign, Campaigns.answer(campaign, plan));
  }
}
