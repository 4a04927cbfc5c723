package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import steelyard.variants.model.Element;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Table;
import steelyard.variants.model.Table.Polarity;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Implied constraints that tie a tile's kind to its treatments, and to the next tile's kind. */
final class KindTables {
  private KindTables() {}

  /** A slot's kind and all its treatments are a row of the table of kinds. */
  static void rows(GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    int treatments = line.treatments().size();
    List<int[]> rows =
        IntStream.range(0, line.kinds().size())
            .mapToObj(
                k ->
                    IntStream.concat(
                            IntStream.of(k),
                            IntStream.range(0, treatments).map(t -> bit(line, k, t)))
                        .toArray())
            .toList();
    Tuples table = Tuples.of(1 + treatments, rows);
    Group group = change.group("a kind with its treatments");
    for (int slot = 0; slot < line.slots(); slot++) {
      int at = slot;
      Stream<IntVar> needs = IntStream.range(0, treatments).mapToObj(t -> slots.needs(t, at));
      List<IntVar> scope = Stream.concat(Stream.of(slots.kind(slot)), needs).toList();
      group.post(new Table(Views.of(scope), table, Polarity.ALLOWED));
    }
  }

  /**
   * Each treatment is looked up by kind, as in the first model of Dincbas, Simonis &amp; Van
   * Hentenryck (1988), "Solving the Car-Sequencing Problem in Constraint Logic Programming", ECAI,
   * 290-295.
   */
  static void lookup(GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    Group group = change.group("a treatment by kind");
    for (int t = 0; t < line.treatments().size(); t++) {
      int treatment = t;
      int[] bits =
          IntStream.range(0, line.kinds().size()).map(k -> bit(line, k, treatment)).toArray();
      Views column = Views.ofConstants(bits);
      for (int slot = 0; slot < line.slots(); slot++) {
        group.post(new Element(column, slots.kind(slot).view(), slots.needs(t, slot).view()));
      }
    }
  }

  private static int bit(GlazeLine line, int kind, int treatment) {
    return line.kinds().get(kind).needs(treatment) ? 1 : 0;
  }

  /** The kinds of two tiles in a row are a pair that no rule forbids by itself. */
  static void neighbours(GlazeLine line, Change change) {
    int kinds = line.kinds().size();
    List<int[]> pairs = new ArrayList<>();
    for (int one = 0; one < kinds; one++) {
      for (int next = 0; next < kinds; next++) {
        if (canFollow(one, next, line)) {
          pairs.add(new int[] {one, next});
        }
      }
    }
    if (pairs.size() < kinds * kinds) {
      Slots slots = new Slots(line, change::variable);
      Tuples table = Tuples.of(2, pairs);
      Group group = change.group("kinds that can follow each other");
      for (int slot = 1; slot < line.slots(); slot++) {
        Views pair = Views.of(slots.kind(slot - 1), slots.kind(slot));
        group.post(new Table(pair, table, Polarity.ALLOWED));
      }
    }
  }

  private static boolean canFollow(int one, int next, GlazeLine line) {
    Kind kind = line.kinds().get(one);
    Kind after = line.kinds().get(next);
    boolean haveTwo = one != next || kind.tiles() > 1;
    boolean mayRun = line.longestRun() > 1 || kind.glaze() != after.glaze();
    return haveTwo
        && mayRun
        && line.strictTreatments().stream()
            .noneMatch(t -> isApart(line.treatment(t)) && kind.needs(t) && after.needs(t));
  }

  /** Whether no two tiles in a row can get it. */
  private static boolean isApart(Treatment treatment) {
    return treatment.most() == 1 && treatment.window() > 1;
  }
}
