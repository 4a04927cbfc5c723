package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import steelyard.variants.model.Ints;

class CostBoundsTest {
  /** Rows of 0 and 1 of one length, by the number of their 1s. */
  private static IntStream rows(int slots, int ones) {
    return IntStream.range(0, 1 << slots).filter(row -> Integer.bitCount(row) == ones);
  }

  private static int overruns(int row, int slots, int most, int window) {
    int length = Math.min(window, slots);
    return (int)
        IntStream.rangeClosed(0, slots - length)
            .filter(first -> Integer.bitCount(row >> first & (1 << length) - 1) > most)
            .count();
  }

  private static GlazeLine line(int slots, int with, Treatment treatment) {
    return new GlazeLine(
        List.of(treatment),
        List.of(new Kind(with, Ints.of(0), 0), new Kind(slots - with, Ints.of(), 0)),
        0,
        slots);
  }

  @Test
  void no_row_has_fewer_overruns_than_the_bound_and_some_have_as_many() {
    int tight = 0;
    for (int window = 1; window <= 5; window++) {
      for (int most = 1; most <= window; most++) {
        for (int slots = 1; slots <= 10; slots++) {
          for (int with = 0; with <= slots; with++) {
            int bound =
                CostBounds.leastOverruns(0, line(slots, with, new Treatment(most, window, 1)));
            int least = fewest(slots, with, most, window);
            assertThat(bound)
                .as("%d of %d in %d: %d", most, window, slots, with)
                .isBetween(0, least);
            tight += bound == least && least > 0 ? 1 : 0;
          }
        }
      }
    }
    assertThat(tight).isGreaterThan(50);
  }

  private static int fewest(int slots, int with, int most, int window) {
    return rows(slots, with).map(row -> overruns(row, slots, most, window)).min().orElseThrow();
  }

  @Test
  void no_glaze_does_with_fewer_runs_than_the_bound_and_some_with_as_many() {
    int tight = 0;
    for (int window = 2; window <= 5; window++) {
      for (int most = 1; most < window; most++) {
        Treatment treatment = new Treatment(most, window, 0);
        for (int tiles = 1; tiles <= 12; tiles++) {
          for (int with = 0; with <= tiles; with++) {
            int bound = CostBounds.leastRuns(0, line(tiles, with, treatment));
            int least = fewestRuns(tiles, with, treatment);
            assertThat(bound).as("%d of %d, %s", with, tiles, treatment).isBetween(1, least);
            tight += bound == least && least > 1 ? 1 : 0;
          }
        }
      }
    }
    assertThat(tight).isGreaterThan(100);
  }

  /** Into how many parts the tiles must be split, so that the parts can hold those with it. */
  private static int fewestRuns(int tiles, int with, Treatment treatment) {
    int runs = 1;
    while (holdAtMost(tiles, runs, treatment) < with) {
      runs++;
    }
    return runs;
  }

  private static int holdAtMost(int tiles, int runs, Treatment treatment) {
    return runs == 1
        ? treatment.mostAmong(tiles)
        : IntStream.rangeClosed(0, tiles)
            .map(
                first ->
                    treatment.mostAmong(first) + holdAtMost(tiles - first, runs - 1, treatment))
            .max()
            .orElseThrow();
  }

  @Test
  void counts_runs_by_their_length() {
    GlazeLine line =
        new GlazeLine(
            List.of(new Treatment(1, 1, 0)),
            List.of(new Kind(7, Ints.of(), 0), new Kind(1, Ints.of(), 1)),
            1,
            3);
    assertThat(CostBounds.leastRuns(0, line)).isEqualTo(3);
    assertThat(CostBounds.leastRuns(1, line)).isEqualTo(1);
  }
}
