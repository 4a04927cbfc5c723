package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;

import com.google.ortools.sat.CpModelProto;
import com.google.ortools.sat.DecisionStrategyProto;
import com.google.ortools.sat.DecisionStrategyProto.DomainReductionStrategy;
import com.google.ortools.sat.DecisionStrategyProto.VariableSelectionStrategy;
import com.google.ortools.sat.LinearExpressionProto;
import com.google.ortools.sat.PartialVariableAssignment;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.Consumer;
import org.junit.jupiter.api.Test;
import steelyard.adapters.cpsat.Solving.Solved;
import steelyard.adapters.spi.Goal;
import steelyard.variants.model.Branching.ValueOrder;
import steelyard.variants.model.Branching.VariableOrder;
import steelyard.variants.model.Hint;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Model;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.ModelBuilder;

/** How a branching and a hint reach the library. */
class SearchGuideTest {
  @Test
  void followsPhasesInOrder() {
    CpModelProto message =
        message(
            Map.of(),
            draft -> {
              IntVar x = draft.integer("x", 0, 9);
              IntVar y = draft.integer("y", 0, 9);
              Views flipped = Views.of(y.view().negated(), View.constant(3));
              draft.branch(flipped, VariableOrder.SMALLEST_MIN, ValueOrder.MAX);
              draft.branch(Views.of(x), VariableOrder.INPUT, ValueOrder.MEDIAN);
            });
    assertThat(message.getSearchStrategyCount()).isEqualTo(2);
    DecisionStrategyProto first = message.getSearchStrategy(0);
    assertThat(first.getExprsList())
        .containsExactly(LinearExpressionProto.newBuilder().addVars(1).addCoeffs(-1).build());
    assertThat(first.getVariableSelectionStrategy())
        .isEqualTo(VariableSelectionStrategy.CHOOSE_LOWEST_MIN);
    assertThat(first.getDomainReductionStrategy())
        .isEqualTo(DomainReductionStrategy.SELECT_MAX_VALUE);
    assertThat(message.getSearchStrategy(1).getDomainReductionStrategy())
        .isEqualTo(DomainReductionStrategy.SELECT_MEDIAN_VALUE);
  }

  @Test
  void leavesTheRestToTheSolver_fromWeightedDegreeOn() {
    Consumer<Draft> phases =
        draft -> {
          IntVar x = draft.integer("x", 0, 9);
          draft.branch(Views.of(x), VariableOrder.INPUT, ValueOrder.MIN);
          draft.branch(Views.of(x), VariableOrder.WEIGHTED_DEGREE, ValueOrder.MIN);
          draft.branch(Views.of(x), VariableOrder.LARGEST_MAX, ValueOrder.MIN);
        };
    assertThat(message(Map.of(), phases).getSearchStrategyCount()).isEqualTo(1);
    assertThat(lower(Map.of(), phases).sizes().how())
        .containsEntry("branching", "1 of 3 phases followed, the rest automatic");
  }

  @Test
  void ignoresPhases_whenToldTo() {
    Consumer<Draft> phase =
        draft ->
            draft.branch(Views.of(draft.integer("x", 0, 9)), VariableOrder.INPUT, ValueOrder.MIN);
    assertThat(message(Map.of("branching", "ignore"), phase).getSearchStrategyCount()).isZero();
  }

  /** The library refuses the median of a domain of more than 100,000 values. */
  @Test
  void halvesInsteadOfTakingTheMedian_whenADomainIsLarge() {
    Consumer<Draft> phase =
        draft ->
            draft.branch(
                Views.of(draft.integer("x", 0, 200_000)), VariableOrder.INPUT, ValueOrder.MEDIAN);
    assertThat(message(Map.of(), phase).getSearchStrategy(0).getDomainReductionStrategy())
        .isEqualTo(DomainReductionStrategy.SELECT_LOWER_HALF);
  }

  @Test
  void findsTheLargestFirst_whenThePhaseSaysSo() {
    Model model =
        ModelBuilder.of(
            draft -> {
              IntVar x = draft.integer("x", 0, 9);
              IntVar y = draft.integer("y", 0, 9);
              draft.group("sum").post(x.plus(y).le(12));
              draft.branch(Views.of(y, x), VariableOrder.INPUT, ValueOrder.MAX);
            });
    Map<String, String> fixed = Map.of("branching", "fixed", "cp_model_presolve", "false");
    Solved solved = Solving.solve(model, new Goal.Satisfy(), fixed, Limit.none());
    assertThat(solved.heard().last()).containsExactly(3, 9);
  }

  @Test
  void hintsLiteralsWithTheirVariable() {
    CpModelProto message =
        message(
            Map.of(),
            draft -> {
              IntVar x = draft.integer("x", 0, 9);
              IntVar y = draft.integer("y", 0, 9);
              draft.group("one").post(x.ge(4).or(y.ge(7)).or(x.le(1)));
              draft.hint(x, 3);
            });
    Map<Integer, Long> hinted = new TreeMap<>();
    PartialVariableAssignment hint = message.getSolutionHint();
    for (int i = 0; i < hint.getVarsCount(); i++) {
      hinted.put(hint.getVars(i), hint.getValues(i));
    }
    assertThat(hint.getVarsCount()).isEqualTo(hinted.size()).isEqualTo(3);
    assertThat(hinted).containsEntry(0, 3L).doesNotContainKey(1);
    assertThat(hinted.values()).containsExactlyInAnyOrder(3L, 1L, 0L);
  }

  @Test
  void startsFromTheHint_whenItIsASolution() {
    Model shop = JobShop.model(JobShop.FT06);
    int[] schedule = Solving.solve(shop, new Goal.Satisfy()).heard().last();
    Hint hint = new Hint(shop.variables().decisions(), Ints.of(schedule));
    Model hinted =
        Model.of(shop.variables(), shop.postings(), shop.objective(), shop.branching(), hint);
    Solved solved = Solving.solve(hinted, new Goal.Optimise());
    assertThat(solved.heard().solutions.get(0)).isEqualTo(Ints.of(schedule));
    assertThat(solved.outcome().bound()).hasValue(55);
  }

  private static CpModelProto message(Map<String, String> settings, Consumer<Draft> draft) {
    return lower(settings, draft).message();
  }

  private static Instance lower(Map<String, String> settings, Consumer<Draft> draft) {
    Model model = ModelBuilder.of(draft);
    return new ModelLowering(model, Solving.request(settings, 1, Limit.none())).lower();
  }
}
