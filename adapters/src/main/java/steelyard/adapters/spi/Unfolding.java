package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.TreeSet;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Tuples;

/**
 * An automaton unrolled over letters of given domains: the states that can be reached after each
 * letter and from which the end can still be accepted, the others joined in one that is called
 * {@link #sink}. Pesant (2004), "A Regular Language Membership Constraint for Finite Sequences of
 * Variables", CP, LNCS 3258:482-495, section 3.
 */
final class Unfolding {
  private final Automaton automaton;
  private final List<Domain> letters;

  /** By number of letters read: the states that matter. */
  private final List<Set<Integer>> live = new ArrayList<>();

  private Unfolding(Automaton automaton, List<Domain> letters) {
    this.automaton = automaton;
    this.letters = letters;
  }

  /**
   * One letter's part.
   *
   * @param states after the letter
   * @param rows state before, letter, state after
   */
  record Step(Domain states, Tuples rows) {}

  /** Total: each step has a row for each state and letter. */
  static List<Step> total(Automaton automaton, List<Domain> letters) {
    return of(automaton, letters).steps();
  }

  /** Steps that lead to what is accepted; none where nothing is. */
  static Optional<List<Step>> accepted(Automaton automaton, List<Domain> letters) {
    Unfolding it = of(automaton, letters);
    boolean isEmpty = it.live.stream().anyMatch(Set::isEmpty);
    return isEmpty ? Optional.empty() : Optional.of(it.liveSteps());
  }

  private static Unfolding of(Automaton automaton, List<Domain> letters) {
    Unfolding it = new Unfolding(automaton, letters);
    it.reach();
    it.retain();
    return it;
  }

  /** Stands for every state from which nothing can be accepted any more. */
  static int sink(Automaton automaton) {
    return automaton.states();
  }

  private void reach() {
    live.add(new TreeSet<>(List.of(automaton.start())));
    for (int i = 0; i < letters.size(); i++) {
      Set<Integer> reached = new TreeSet<>();
      for (int state : live.get(i)) {
        letters.get(i).stream().forEach(v -> automaton.next(state, v).ifPresent(reached::add));
      }
      live.add(reached);
    }
  }

  private void retain() {
    live.get(letters.size()).removeIf(state -> !automaton.accepts(state));
    for (int i = letters.size() - 1; i > 0; i--) {
      int at = i;
      live.get(i)
          .removeIf(
              state ->
                  letters.get(at).stream().allMatch(v -> after(at, state, v) == sink(automaton)));
    }
  }

  private List<Step> steps() {
    List<Step> steps = new ArrayList<>();
    boolean lost = false;
    for (int i = 0; i < letters.size(); i++) {
      List<int[]> rows = rows(i);
      if (lost) {
        rows.add(new int[] {sink(automaton), Tuples.ANY, sink(automaton)});
      }
      Domain states = Domain.of(rows.stream().mapToInt(row -> row[2]));
      lost = states.contains(sink(automaton));
      steps.add(new Step(states, Tuples.of(3, rows)));
    }
    return steps;
  }

  private List<Step> liveSteps() {
    List<Step> steps = new ArrayList<>();
    for (int i = 0; i < letters.size(); i++) {
      List<int[]> rows = rows(i);
      rows.removeIf(row -> row[2] == sink(automaton));
      Domain states = Domain.of(live.get(i + 1).stream().mapToInt(Integer::intValue));
      steps.add(new Step(states, Tuples.of(3, rows)));
    }
    return steps;
  }

  private List<int[]> rows(int i) {
    List<int[]> rows = new ArrayList<>();
    for (int state : live.get(i)) {
      letters.get(i).stream().forEach(v -> rows.add(new int[] {state, v, after(i, state, v)}));
    }
    return rows;
  }

  private int after(int i, int state, int value) {
    OptionalInt next = automaton.next(state, value);
    return next.isPresent() && live.get(i + 1).contains(next.getAsInt())
        ? next.getAsInt()
        : sink(automaton);
  }
}
