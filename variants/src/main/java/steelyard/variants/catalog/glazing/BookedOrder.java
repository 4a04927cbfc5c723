package steelyard.variants.catalog.glazing;

import java.io.IOException;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.variants.catalog.text.Row;
import steelyard.variants.catalog.text.Rows;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.KnownSolution;

/**
 * An order of tiles as the line books it: the numbers of the kinds, on as many lines as wanted, and
 * where something was to pay a last line {@code cost 42}. Lines that start with {@code #} are
 * skipped.
 */
final class BookedOrder {
  private static final String COST = "cost";

  private BookedOrder() {}

  /**
   * The order in {@code file}.
   *
   * @throws InstanceException if there is none of that line; names the line and says what to do
   */
  static KnownSolution read(GlazeLine line, InstanceSource file) throws IOException {
    Rows rows = Rows.of(file);
    SortedMap<String, Integer> kinds = new TreeMap<>();
    while (kinds.size() < line.slots()) {
      String meant = "the kind of the tile in slot " + kinds.size() + " of " + line.slots();
      add(rows.next(meant), line, kinds);
    }
    OptionalLong cost = OptionalLong.empty();
    if (rows.hasNext()) {
      Row row = rows.next("");
      if (!row.first().equals(COST) || rows.hasNext()) {
        throw row.mistake("after the last tile only '" + COST + "' with a number may stand");
      }
      cost = OptionalLong.of(row.numbersFrom(1, 1, "what the order costs").get(0));
    }
    return new KnownSolution(kinds, cost);
  }

  private static void add(Row row, GlazeLine line, SortedMap<String, Integer> kinds) {
    row.numbers().stream()
        .forEach(
            kind -> {
              if (kind >= line.kinds().size()) {
                int last = line.kinds().size() - 1;
                throw row.mistake("no kind " + kind + "; the kinds count from 0 to " + last);
              }
              if (kinds.size() == line.slots()) {
                throw row.mistake("more than " + line.slots() + " tiles; leave out the others");
              }
              kinds.put(Names.kind(kinds.size()), kind);
            });
  }
}
