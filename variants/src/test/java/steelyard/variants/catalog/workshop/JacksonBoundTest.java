package steelyard.variants.catalog.workshop;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class JacksonBoundTest {
  /** Carlier (1982), section 2: the preemptive optimum is the maximum of h over all sets. */
  @Test
  void equals_the_largest_bound_of_any_set_of_visits() {
    SplittableRandom random = new SplittableRandom(1982);
    for (int trial = 0; trial < 500; trial++) {
      List<Visit> visits = new ArrayList<>();
      for (int i = 0; i < random.nextInt(1, 8); i++) {
        visits.add(new Visit(i, 0, random.nextInt(20), random.nextInt(1, 9), random.nextInt(20)));
      }
      assertThat(JacksonBound.of(visits)).as("%s", visits).isEqualTo(largestOfSets(visits));
    }
  }

  @Test
  void is_nothing_whenGiven_no_visits() {
    assertThat(JacksonBound.of(List.of())).isZero();
  }

  private static int largestOfSets(List<Visit> visits) {
    return IntStream.range(1, 1 << visits.size())
        .map(set -> boundOf(visits, set))
        .max()
        .orElseThrow();
  }

  private static int boundOf(List<Visit> visits, int set) {
    int head = Integer.MAX_VALUE;
    int load = 0;
    int tail = Integer.MAX_VALUE;
    for (int i = 0; i < visits.size(); i++) {
      if ((set >> i & 1) == 1) {
        head = Math.min(head, visits.get(i).head());
        load += visits.get(i).minutes();
        tail = Math.min(tail, visits.get(i).tail());
      }
    }
    return head + load + tail;
  }

  /**
   * The one-machine bounds at the root of complete search, as the literature gives them since
   * Carlier and Pinson (1989), Management Science 35(2):164-176 (values from memory).
   */
  @ParameterizedTest
  @CsvSource({"ft06, 52", "ft10, 808", "ft20, 1164"})
  void is_the_published_root_bound_whenGiven(String instance, int bound) {
    Workshop workshop = Workshops.shipped(instance);
    int best =
        IntStream.range(0, workshop.stations())
            .map(station -> JacksonBound.of(workshop.visits(station)))
            .max()
            .orElseThrow();
    assertThat(best).isEqualTo(bound);
  }
}
