package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.IntStream;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;

/**
 * An order of the tiles made slot by slot without looking ahead: of the kinds that are left, one
 * that breaks fewest rules comes next; of several, one that costs least there; of several, one
 * whose treatments are most in demand among the tiles that are left; then the lower number. The
 * last but one is the dynamic sum of utilisation rates of Gottlieb, Puchta &amp; Solnon (2003), "A
 * study of greedy, local search, and ant colony optimization approaches for car sequencing
 * problems", EvoWorkshops, LNCS 2611:246-257.
 */
final class GreedyLine {
  private final GlazeLine line;
  private final int[] left;
  private final List<Integer> kinds = new ArrayList<>();
  private int run;

  private GreedyLine(GlazeLine line) {
    this.line = line;
    this.left = line.kinds().stream().mapToInt(Kind::tiles).toArray();
  }

  /** The kind in each slot. */
  static List<Integer> of(GlazeLine line) {
    GreedyLine greedy = new GreedyLine(line);
    while (greedy.kinds.size() < line.slots()) {
      greedy.place(greedy.next());
    }
    return List.copyOf(greedy.kinds);
  }

  /** What the order costs; empty if it breaks a rule or nothing is to pay. */
  static OptionalLong cost(GlazeLine line) {
    List<Integer> kinds = of(line);
    SortedMap<String, Integer> values = new TreeMap<>();
    IntStream.range(0, kinds.size()).forEach(slot -> values.put(Names.kind(slot), kinds.get(slot)));
    Check check = GlazeLineChecker.check(line, new Answer(values, OptionalLong.empty()));
    return check.isRight() ? check.objective() : OptionalLong.empty();
  }

  private int next() {
    return IntStream.range(0, left.length)
        .filter(kind -> left[kind] > 0)
        .mapToObj(this::choice)
        .min(Choice.BEST_FIRST)
        .orElseThrow()
        .kind();
  }

  /** What speaks against and for a kind. */
  private record Choice(int kind, int broken, long cost, double demand) {
    static final Comparator<Choice> BEST_FIRST =
        Comparator.comparingInt(Choice::broken)
            .thenComparingLong(Choice::cost)
            .thenComparing(Comparator.comparingDouble(Choice::demand).reversed())
            .thenComparingInt(Choice::kind);
  }

  private Choice choice(int kind) {
    int broken = 0;
    long cost = 0;
    double demand = 0;
    for (int t : line.kinds().get(kind).treatments().toArray()) {
      Treatment treatment = line.treatment(t);
      if (recent(t) >= treatment.most()) {
        broken += treatment.isStrict() ? 1 : 0;
        cost += treatment.excess();
      }
      demand += (double) leftWith(t) * treatment.window() / treatment.most();
    }
    boolean changes = run > 0 && !isLastGlaze(kind);
    broken += !changes && run == line.longestRun() ? 1 : 0;
    cost += changes ? line.changeCost() : 0;
    return new Choice(kind, broken, cost, demand);
  }

  /** Tiles with the treatment among those that share a window with the next one. */
  private int recent(int treatment) {
    int start = Math.max(0, kinds.size() - line.treatment(treatment).window() + 1);
    return (int)
        kinds.subList(start, kinds.size()).stream()
            .filter(k -> line.kinds().get(k).needs(treatment))
            .count();
  }

  private long leftWith(int treatment) {
    return line.kindsWith(treatment).stream().mapToLong(k -> left[k]).sum();
  }

  private boolean isLastGlaze(int kind) {
    int last = kinds.get(kinds.size() - 1);
    return line.kinds().get(kind).glaze() == line.kinds().get(last).glaze();
  }

  private void place(int kind) {
    run = run > 0 && isLastGlaze(kind) ? run + 1 : 1;
    kinds.add(kind);
    left[kind]--;
  }
}
