package steelyard.variants.catalog.dispatch;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalLong;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.AllSolutions;
import steelyard.variants.family.Variant;

/** The plain model's least cost is that of a program of another kind. */
class ExactToursTest {
  private static final DispatchFamily FAMILY = new DispatchFamily();

  private static OptionalLong leastByModel(Dispatch day) {
    return AllSolutions.minimum(AllSolutions.of(Variant.PLAIN.build(FAMILY, day)));
  }

  @Test
  void plain_costs_as_little_as_the_exact_tours_on_small_days() {
    List<Dispatch> days =
        LongStream.range(1000, 1120)
            .mapToObj(s -> s % 2 == 0 ? RandomDay.of(s, 2, 2) : RandomDay.of(s, 3, 1))
            .toList();
    for (Dispatch day : days) {
      assertThat(ExactTours.leastCost(day)).as("%s", day).isEqualTo(leastByModel(day));
    }
    assertThat(days.stream().map(ExactTours::leastCost))
        .contains(OptionalLong.empty())
        .anyMatch(OptionalLong::isPresent);
  }
}
