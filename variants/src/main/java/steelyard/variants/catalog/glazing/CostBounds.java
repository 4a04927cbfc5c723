package steelyard.variants.catalog.glazing;

import java.util.OptionalLong;
import java.util.stream.IntStream;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Bounds on what is to pay. */
final class CostBounds {
  private CostBounds() {}

  /** There are at least as many changes of glaze as the runs that the glazes need, but one. */
  static void glazeRuns(GlazeLine line, Change change) {
    if (line.hasGlazes()) {
      int runs = line.glazes().stream().distinct().map(glaze -> leastRuns(glaze, line)).sum();
      Term changes = Term.sum(new Slots(line, change::variable).changes());
      change.group("as many runs as the glazes need").post(changes.ge(runs - 1));
    }
  }

  /**
   * How many runs a glaze needs. No run is longer than allowed. And L tiles in a row hold at most
   * {@code p*L/q + p*(q - p)/q} with a strict treatment of p in q (the most by which {@code p*(L
   * div q) + min(p, L mod q)} passes {@code p*L/q}; it does at L = p), so that j runs of together n
   * tiles, m of which need it, have {@code q*m <= p*n + j*p*(q - p)}.
   */
  static int leastRuns(int glaze, GlazeLine line) {
    int tiles = line.tiles(kind -> kind.glaze() == glaze);
    int least = ceiling(tiles, line.longestRun());
    for (int t : line.strictTreatments()) {
      Treatment treatment = line.treatment(t);
      long most = treatment.most();
      long window = treatment.window();
      if (most < window) {
        long with = line.tiles(kind -> kind.glaze() == glaze && kind.needs(t));
        least = Math.max(least, ceiling(window * with - most * tiles, most * (window - most)));
      }
    }
    return least;
  }

  /** At least so many windows of each treatment have too many. */
  static void overruns(GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    Group group = change.group("as many windows with too many as must be");
    for (int t : line.pricedTreatments()) {
      group.post(slots.overruns(t).ge(leastOverruns(t, line)));
    }
  }

  /**
   * A tile counts in every window that it lies in, so that the windows together count at least what
   * the tiles count in the slots that lie in fewest; a window counts at most its tiles if it has
   * too many, else at most what is allowed.
   */
  static int leastOverruns(int treatment, GlazeLine line) {
    int windows = line.windows(treatment).size();
    if (windows == 0) {
      return 0;
    }
    int length = line.slots() - windows + 1;
    int most = line.treatment(treatment).most();
    long counted =
        IntStream.range(0, line.slots())
            .map(
                slot ->
                    Math.min(Math.min(slot + 1, line.slots() - slot), Math.min(length, windows)))
            .sorted()
            .limit(line.tilesWith(treatment))
            .asLongStream()
            .sum();
    return ceiling(counted - (long) most * windows, length - most);
  }

  /** No dearer than the order that is made without looking ahead, where that breaks no rule. */
  static void greedyCost(GlazeLine line, Change change) {
    OptionalLong cost = GreedyLine.cost(line);
    if (cost.isPresent()) {
      Term toPay = new Slots(line, change::variable).cost();
      change.group("no dearer than the greedy order").post(toPay.le(cost.getAsLong()));
    }
  }

  /** The least whole number, at least 0, that is no less than the quotient. */
  private static int ceiling(long dividend, long divisor) {
    return dividend <= 0 ? 0 : (int) ((dividend + divisor - 1) / divisor);
  }
}
