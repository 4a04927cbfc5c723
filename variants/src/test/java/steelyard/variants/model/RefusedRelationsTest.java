package steelyard.variants.model;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import org.junit.jupiter.api.Test;

/** Relations that could not mean anything are refused where they are made. */
class RefusedRelationsTest {
  private static final View X = View.of(0);

  @Test
  void refuses_columns_of_different_length() {
    assertThatIllegalArgumentException()
        .isThrownBy(
            () ->
                new GlobalCardinality(
                    Views.of(X), Ints.of(1, 2), Views.of(X), GlobalCardinality.Others.ALLOWED))
        .withMessage("2 values with 1 counts");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Lexicographic(Views.of(X), Views.of(), Lexicographic.Ties.ALLOWED))
        .withMessage("a row of 1 views against one of 0");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new NoOverlap2D(Tasks.of(Task.fixed(X, 1)), Tasks.of()))
        .withMessage("1 spans across with 0 spans up");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Knapsack(Views.of(X), Longs.of(1), X, Longs.of(), X))
        .withMessage("1 items with 1 weights and 0 profits");
  }

  @Test
  void refuses_a_value_twice_and_a_value_that_no_variable_takes() {
    assertThatIllegalArgumentException()
        .isThrownBy(() -> AllDifferentExcept.of(Views.of(X), 4, 4))
        .withMessage("an excepted value twice: [4, 4]");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Precedence(Views.of(X), Ints.of(1, 2, 1)))
        .withMessage("a preceding value twice: [1, 2, 1]");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Count(Views.of(X), Ints.of(2_000_000_000), Comparison.LE, X))
        .withMessageStartingWith("value 2000000000 is beyond what a variable can take");
  }

  @Test
  void refuses_automata_that_are_not_deterministic_or_name_no_state() {
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Automaton.of(2, Ints.of(1), new int[] {0, 7, 0}, new int[] {0, 7, 1}))
        .withMessage("two transitions from state 0 for value 7: make the automaton deterministic");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Automaton.of(2, Ints.of(2)))
        .withMessage("state 2 is none of the 2 states, counted from 0");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Automaton.of(2, Ints.of(1), new int[] {0, 7, -1}))
        .withMessage("state -1 is none of the 2 states, counted from 0");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> Automaton.of(1, Ints.of(0), new int[] {0, Tuples.ANY, 0}))
        .withMessage("a transition for every value: name the values");
    assertThatIllegalArgumentException().isThrownBy(() -> Automaton.of(0, Ints.of()));
  }

  @Test
  void takes_automata_as_equal_whose_transitions_stand_in_another_order() {
    Automaton one =
        Automaton.of(
            2, Ints.of(1, 0), new int[] {1, 3, 0}, new int[] {0, 5, 1}, new int[] {0, 2, 0});
    Automaton same =
        Automaton.of(
            2,
            Ints.of(0, 1, 1),
            new int[] {0, 2, 0},
            new int[] {0, 5, 1},
            new int[] {1, 3, 0},
            new int[] {0, 2, 0});
    assertThat(same).isEqualTo(one).hasSameHashCodeAs(one);
    assertThat(one.alphabet()).isEqualTo(Ints.of(2, 3, 5));
    assertThat(one.next(0, 5)).hasValue(1);
    assertThat(one.next(1, 5)).isEmpty();
  }
}
