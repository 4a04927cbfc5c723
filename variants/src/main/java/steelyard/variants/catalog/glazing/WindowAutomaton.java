package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Tuples;

/**
 * Accepts the rows of 0 and 1 in which no window has too many 1s. A state is what the window's last
 * entries but one were; before the first entry they are 0, so that the windows that are not full
 * yet are no stricter than those that are.
 */
final class WindowAutomaton {
  private static final int MOST_STATES = 2000;

  private final int most;
  private final long mask;
  private final Map<Long, Integer> states = new LinkedHashMap<>();
  private final List<Long> open = new ArrayList<>();
  private final List<int[]> transitions = new ArrayList<>();

  private WindowAutomaton(Treatment treatment) {
    most = treatment.most();
    mask = (1L << (treatment.window() - 1)) - 1;
  }

  /** The automaton; empty where it would have more than 2000 states. */
  static Optional<Automaton> of(Treatment treatment) {
    if (treatment.window() >= Long.SIZE) {
      return Optional.empty();
    }
    return new WindowAutomaton(treatment).build();
  }

  private Optional<Automaton> build() {
    state(0L);
    for (int at = 0; at < open.size() && open.size() <= MOST_STATES; at++) {
      long past = open.get(at);
      step(at, past, 0);
      if (Long.bitCount(past) < most) {
        step(at, past, 1);
      }
    }
    if (open.size() > MOST_STATES) {
      return Optional.empty();
    }
    Ints all = Ints.of(IntStream.range(0, open.size()).toArray());
    return Optional.of(new Automaton(open.size(), 0, all, Tuples.of(3, transitions)));
  }

  private void step(int from, long past, int entry) {
    transitions.add(new int[] {from, entry, state(((past << 1) | entry) & mask)});
  }

  private int state(long past) {
    Integer known = states.putIfAbsent(past, open.size());
    if (known == null) {
      open.add(past);
    }
    return states.get(past);
  }
}
