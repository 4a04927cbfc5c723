package steelyard.variants.catalog.workshop;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.variants.family.Answer;

class PlanSheetTest {
  private static Answer greedy(Workshop workshop) {
    GreedyPlan plan = GreedyPlan.of(workshop);
    SortedMap<String, Integer> starts = new TreeMap<>();
    for (int m = 0; m < workshop.moulds().size(); m++) {
      for (int step = 0; step <= workshop.mould(m).lastStep(); step++) {
        starts.put(Names.start(m, step), plan.start(m, step));
      }
    }
    return new Answer(starts, OptionalLong.of(plan.makespan()));
  }

  @Test
  void shows_stations_moulds_and_minutes() {
    Workshop workshop =
        new Workshop(
            2,
            List.of(
                new Mould(List.of(new Operation(0, 2), new Operation(1, 3))),
                new Mould(List.of(new Operation(0, 1), new Operation(1, 0)))));
    assertThat(PlanSheet.of(workshop, greedy(workshop)))
        .isEqualTo(
            """
            2 moulds at 2 stations: done after 5 minutes (0:05 h)

            A column is 1 minute: the mould that fills most of it, . for none.

            station  0
                  0  001..
                  1  ..000

            Minutes from-to of each mould at each station, in order of time:

            station 0, busy for 3 of 5 minutes
              mould 0: 0-2  mould 1: 2-3

            station 1, busy for 3 of 5 minutes
              mould 0: 2-5

            This plan says only when. Machine-safety rules, rest-time rules and local codes
            come first, and licensed practice decides what may run.
            """);
  }

  @ParameterizedTest
  @ValueSource(strings = {"ft06", "ft10", "abz7", "la15", "twins-4x3"})
  void stays_within_80_columns_whenGiven(String instance) {
    Workshop workshop = Workshops.shipped(instance);
    String sheet = PlanSheet.of(workshop, greedy(workshop));
    assertThat(sheet.lines()).allMatch(line -> line.length() <= 80);
    for (int station = 0; station < workshop.stations(); station++) {
      assertThat(sheet).contains("station " + station + ", busy for");
    }
  }

  @Test
  void stays_within_80_columns_whenGiven_very_long_and_very_many_operations() {
    Mould slow = new Mould(List.of(new Operation(0, 999_000_000)));
    List<Mould> moulds =
        IntStream.range(0, 70)
            .mapToObj(m -> m == 64 ? slow : new Mould(List.of(new Operation(0, 10_000))))
            .toList();
    Workshop workshop = new Workshop(1, moulds);
    String sheet = PlanSheet.of(workshop, greedy(workshop));
    assertThat(sheet.lines()).allMatch(line -> line.length() <= 80);
    assertThat(sheet)
        .contains("done after 999690000 minutes (16661500:00 h)")
        .contains("from 62 on #")
        .contains("0  " + "#".repeat(59));
  }

  @Test
  void says_so_whenGiven_nothing_to_do() {
    Workshop workshop = new Workshop(1, List.of(new Mould(List.of(new Operation(0, 0)))));
    assertThat(PlanSheet.of(workshop, greedy(workshop)))
        .startsWith("1 mould at 1 station: done after 0 minutes (0:00 h)")
        .contains("Machine-safety rules");
  }
}
