package steelyard.adapters;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assertions.fail;

import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import steelyard.adapters.spi.Backend;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Term;
import steelyard.variants.model.sample.JavaText;
import steelyard.variants.model.sample.RandomRelations;
import steelyard.variants.model.sample.RandomSketches;
import steelyard.variants.model.sample.Sketch;
import steelyard.variants.model.sample.Smaller;

/**
 * Everything agrees on random models over all kinds. {@code scripts/fuzz} runs it on more of them.
 */
class RandomModelsTest {
  private static final int MODELS = Integer.getInteger("steelyard.fuzz.models", 3000);
  private static final long FIRST = Long.getLong("steelyard.fuzz.seed", 0);

  @Test
  void everything_agrees_onRandomModels() {
    List<Backend> backends = Agreement.backends();
    assertThat(backends).hasSizeGreaterThanOrEqualTo(3);
    Set<String> kinds = new TreeSet<>();
    for (long seed = FIRST; seed < FIRST + MODELS; seed++) {
      Sketch sketch = RandomSketches.of(seed);
      note(sketch.model(), kinds);
      if (Agreement.broken(sketch, backends, seed).isPresent()) {
        fail(smallest(sketch, backends, seed));
      }
    }
    if (MODELS >= 1000) {
      assertThat(kinds).containsExactlyInAnyOrderElementsOf(RandomRelations.KINDS);
    }
  }

  /** Found among random models. */
  @Test
  void everything_agrees_whereTheTermsOfAFactorCancel() {
    IntVar x = new IntVar("x0", 0);
    Term nothing = new Term.Sum(List.of(x, x), Longs.of(2, -2));
    assertAgreed(
        new Sketch(
            List.of(Domain.between(0, 2)),
            List.of(),
            List.of(new Term.Constant(2).le(new Term.Product(nothing, x.times(-3)))),
            Optional.empty()));
  }

  private static void assertAgreed(Sketch sketch) {
    assertThat(Agreement.broken(sketch, Agreement.backends(), 0)).isEmpty();
  }

  private static void note(Model model, Set<String> kinds) {
    for (Posting posting : model.postings()) {
      for (Constraint constraint : posting.asserted()) {
        Relation relation =
            constraint instanceof Conditional it ? it.then() : (Relation) constraint;
        kinds.add(relation.kind());
      }
    }
  }

  private static String smallest(Sketch sketch, List<Backend> backends, long seed) {
    Sketch small = Smaller.smallest(sketch, s -> Agreement.broken(s, backends, seed).isPresent());
    Optional<String> what = Agreement.broken(small, backends, seed);
    return "model %d: %s\n%s\n"
        .formatted(seed, what.orElse("gone"), JavaText.test(small, "agrees_onModel" + seed));
  }
}
