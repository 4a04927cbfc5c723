package steelyard.variants.model;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Objects;
import java.util.OptionalInt;
import java.util.Set;
import java.util.stream.IntStream;

/**
 * A deterministic finite automaton: reads a row of values from the state {@code start}, goes by the
 * transition for each value, and accepts the row if it ends in a state of {@code accepting}. Where
 * a state has no transition for a value, the row is not accepted. Two automata are equal where they
 * have the same states and transitions, in whatever order those were given.
 *
 * @param states how many there are; they are called 0, 1, and so on
 * @param accepting distinct states, ascending
 * @param transitions rows of three, ascending: state, value, next state; no two for one state and
 *     value
 */
public record Automaton(int states, int start, Ints accepting, Tuples transitions) {
  private static final int FROM = 0;
  private static final int VALUE = 1;
  private static final int TO = 2;

  /** States and transitions in any order; a transition that stands there twice counts once. */
  public Automaton {
    Objects.requireNonNull(accepting, "accepting");
    if (transitions.arity() != 3) {
      throw new IllegalArgumentException("a transition is a state, a value and a state");
    }
    requireState(start, states);
    accepting.stream().forEach(state -> requireState(state, states));
    accepting = Ints.of(accepting.stream().sorted().distinct().toArray());
    transitions = sorted(transitions);
    for (int t = 0; t < transitions.size(); t++) {
      requireState(transitions.get(t, FROM), states);
      requireState(transitions.get(t, TO), states);
      requireOneWay(transitions, t);
    }
  }

  /**
   * An automaton that starts in state 0.
   *
   * @param transitions each a state, a value and the next state
   */
  public static Automaton of(int states, Ints accepting, int[]... transitions) {
    return new Automaton(states, 0, accepting, Tuples.of(3, transitions));
  }

  private static void requireState(int state, int states) {
    if (state < 0 || state >= states) {
      throw new IllegalArgumentException(
          "state " + state + " is none of the " + states + " states, counted from 0");
    }
  }

  private static Tuples sorted(Tuples transitions) {
    List<int[]> rows = new ArrayList<>();
    for (int t = 0; t < transitions.size(); t++) {
      int row = t;
      rows.add(IntStream.range(0, 3).map(column -> transitions.get(row, column)).toArray());
    }
    rows.sort(Comparator.comparingInt((int[] r) -> r[FROM]).thenComparingInt(r -> r[VALUE]));
    Set<Ints> seen = new HashSet<>();
    rows.removeIf(row -> !seen.add(Ints.of(row)));
    return Tuples.of(3, rows);
  }

  private static void requireOneWay(Tuples sorted, int t) {
    int value = sorted.get(t, VALUE);
    if (value == Tuples.ANY) {
      throw new IllegalArgumentException("a transition for every value: name the values");
    }
    if (t > 0
        && sorted.get(t - 1, FROM) == sorted.get(t, FROM)
        && sorted.get(t - 1, VALUE) == value) {
      throw new IllegalArgumentException(
          "two transitions from state "
              + sorted.get(t, FROM)
              + " for value "
              + value
              + ": make the automaton deterministic");
    }
  }

  /** The state after {@code value} in {@code state}; empty where the row is lost. */
  public OptionalInt next(int state, int value) {
    int low = 0;
    int high = transitions.size() - 1;
    while (low <= high) {
      int middle = (low + high) >>> 1;
      int order = Integer.compare(transitions.get(middle, FROM), state);
      order = order != 0 ? order : Integer.compare(transitions.get(middle, VALUE), value);
      if (order == 0) {
        return OptionalInt.of(transitions.get(middle, TO));
      }
      if (order < 0) {
        low = middle + 1;
      } else {
        high = middle - 1;
      }
    }
    return OptionalInt.empty();
  }

  /** The values for which some state has a transition, ascending. */
  public Ints alphabet() {
    return Ints.of(
        IntStream.range(0, transitions.size())
            .map(t -> transitions.get(t, VALUE))
            .sorted()
            .distinct()
            .toArray());
  }

  /** Whether a row may end in {@code state}. */
  public boolean accepts(int state) {
    return accepting.stream().anyMatch(each -> each == state);
  }
}
