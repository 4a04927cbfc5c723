package steelyard.adapters.spi;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.function.IntBinaryOperator;
import java.util.stream.IntStream;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.apache.commons.rng.sampling.ArraySampler;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.FieldSource;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Mentions;
import steelyard.variants.model.Model;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Rewriting;
import steelyard.variants.model.judge.RelationJudge;
import steelyard.variants.model.sample.RandomRelations;

/** What a relation says does not depend on names of variables and on the order of what commutes. */
class RewritingTest {
  private static final int VARIABLES = 3;

  private record Shuffled(UniformRandomProvider random, Ints places) implements Rewriting {
    static Shuffled of(long seed) {
      UniformRandomProvider random = new SplitMix64(seed);
      int[] places = IntStream.range(0, VARIABLES).toArray();
      return new Shuffled(random, Ints.of(ArraySampler.shuffle(random, places)));
    }

    @Override
    public int variable(int old) {
      return places.get(old);
    }

    @Override
    public int[] rows(int size, IntBinaryOperator byContent) {
      return ArraySampler.shuffle(random, IntStream.range(0, size).toArray());
    }
  }

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void keepsTheMeaning_whenShuffled(String kind) {
    for (long seed = 0; seed < 30; seed++) {
      RandomRelations made = new RandomRelations(seed, VARIABLES);
      Relation relation = made.relation(kind);
      Shuffled shuffled = Shuffled.of(seed);
      Relation other = relation.rewrite(shuffled);
      List<Ints> wrong =
          AllAssignments.of(
              made.domains(),
              values -> {
                int[] moved = new int[VARIABLES];
                IntStream.range(0, VARIABLES).forEach(v -> moved[shuffled.variable(v)] = values[v]);
                return new RelationJudge(v -> values[v]).holds(relation)
                    != new RelationJudge(v -> moved[v]).holds(other);
              });
      assertThat(wrong).as("seed %s: %s and %s", seed, relation, other).isEmpty();
    }
  }

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void keepsTheCanonicalDigest_whenShuffled(String kind) {
    for (long seed = 0; seed < 30; seed++) {
      RandomRelations made = new RandomRelations(seed, VARIABLES);
      Model model = SmallModels.of(made.domains(), List.of(made.relation(kind)));
      Model shuffled = model.rewrite(Shuffled.of(seed), new int[] {0});
      assertThat(shuffled.canonical()).as("seed %s", seed).isEqualTo(model.canonical());
    }
  }

  /** A digest that left a part of the relation out would be equal where meanings differ. */
  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void hasAnotherDigest_whereTheMeaningDiffers(String kind) {
    List<Domain> domains = new RandomRelations(1, VARIABLES).domains();
    List<Model> models = new ArrayList<>();
    List<List<Ints>> solutions = new ArrayList<>();
    for (long seed = 0; seed < 30; seed++) {
      Relation relation = new RandomRelations(seed, VARIABLES).relation(kind);
      models.add(SmallModels.of(domains, List.of(relation)));
      solutions.add(AllAssignments.of(domains, x -> new RelationJudge(v -> x[v]).holds(relation)));
    }
    for (int i = 0; i < models.size(); i++) {
      for (int j = 0; j < i; j++) {
        if (models.get(i).canonical().equals(models.get(j).canonical())) {
          assertThat(solutions.get(i)).as("%s and %s", i, j).isEqualTo(solutions.get(j));
        }
      }
    }
  }

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void mentionsEveryVariableThatMatters(String kind) {
    for (long seed = 0; seed < 30; seed++) {
      RandomRelations made = new RandomRelations(seed, VARIABLES);
      Relation relation = made.relation(kind);
      BitSet mentioned = new BitSet();
      new Mentions(mentioned::set).of(relation);
      for (int v = mentioned.nextClearBit(0); v < VARIABLES; v = mentioned.nextClearBit(v + 1)) {
        int free = v;
        int fixed = made.domains().get(v).min();
        List<Ints> wrong =
            AllAssignments.of(
                made.domains(),
                x ->
                    new RelationJudge(w -> x[w]).holds(relation)
                        != new RelationJudge(w -> w == free ? fixed : x[w]).holds(relation));
        assertThat(wrong).as("%s without x%s", relation, v).isEmpty();
      }
    }
  }
}
