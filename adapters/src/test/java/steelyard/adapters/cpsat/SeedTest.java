package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Map;
import java.util.SortedMap;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Seeding;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveRequest;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Model;
import steelyard.variants.model.judge.Evaluator;

/** A seed permutes the model, which is what makes the library search differently. */
class SeedTest {
  private static final Model HARD = JobShop.model(JobShop.FT10);

  @Test
  void changesTheSearch() {
    assertThat(LongStream.range(0, 4).mapToObj(seed -> solve(seed).counters))
        .doesNotHaveDuplicates();
  }

  @Test
  void keepsTheSearch_whenItIsTheSame() {
    SortedMap<String, Long> first = solve(3).counters;
    assertThat(solve(3).counters).isEqualTo(first);
  }

  @Test
  void givesSolutionsOfTheModelAsWritten() {
    Evaluator judge = new Evaluator(HARD);
    assertThat(solve(5).solutions)
        .isNotEmpty()
        .extracting(Ints::toArray)
        .allSatisfy(solution -> assertThat(judge.judge(solution).violations()).isEmpty());
  }

  private static Recording solve(long seed) {
    Recording heard = new Recording();
    Seeding seeding = Seeding.of(HARD, seed);
    SolveRequest request =
        new SolveRequest(
            Settings.of(Solving.BACKEND.describe(), Map.of()),
            seed,
            1,
            Limit.work(WorkUnits.CONFLICTS, 40));
    try (Lowering lowering =
        (Lowering) Solving.BACKEND.lower(seeding.model(), request, seeding.monitor(heard))) {
      lowering.solve(seeding.goal(new Goal.Optimise()), seeding.monitor(heard));
    }
    return heard;
  }
}
