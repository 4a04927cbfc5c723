package steelyard.variants.catalog.glazing;

import java.io.IOException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.IntStream;
import steelyard.variants.catalog.text.Row;
import steelyard.variants.catalog.text.Rows;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.Ints;

/**
 * Reads the text format of CSPLib's car-sequencing instances: a line {@code tiles treatments
 * kinds}; the most tiles of each treatment's window; the windows' lengths; then for each kind its
 * number from 0, its tiles and a 0 or 1 for each treatment. Lines that start with {@code #} and
 * empty lines are skipped. After the kinds may follow, each at most once:
 *
 * <pre>
 * glaze   2 0 1 ...   the glaze of each kind; of 0 where the line is missing
 * change  4           what a change of glaze costs; 0 where the line is missing
 * run     6           at most so many tiles of one glaze in a row
 * excess  0 3 ...     for each treatment what a window with too many costs; 0: not allowed
 * </pre>
 *
 * @see <a href="https://www.csplib.org/Problems/prob001">Smith, "Car Sequencing", CSPLib problem
 *     1</a>
 */
final class GlazeLineReader {
  private static final String GLAZE = "glaze";
  private static final String CHANGE = "change";
  private static final String RUN = "run";
  private static final String EXCESS = "excess";

  private final Rows rows;

  private int tiles;
  private int treatments;
  private int kinds;
  private Optional<Ints> glazes = Optional.empty();
  private Optional<Ints> excess = Optional.empty();
  private int changeCost;
  private Optional<Integer> longestRun = Optional.empty();

  private GlazeLineReader(Rows rows) {
    this.rows = rows;
  }

  /**
   * The instance in {@code source}.
   *
   * @throws InstanceException if there is none; names the line and says what to do
   */
  static GlazeLine read(InstanceSource source) throws IOException {
    return new GlazeLineReader(Rows.of(source)).line();
  }

  private GlazeLine line() {
    Row counts = rows.next("how many tiles, treatments and kinds there are, such as '100 5 22'");
    readCounts(counts);
    Ints most = row("the most tiles of each treatment's window");
    Row windowRow = rows.next("the length of each treatment's window");
    Ints windows = windowRow.numbersFrom(0, treatments, "the length of each treatment's window");
    requireRoom(most, windows, windowRow);
    List<Ints> kindRows = kindRows();
    long ordered = kindRows.stream().mapToLong(kind -> kind.get(1)).sum();
    if (ordered != tiles) {
      throw counts.mistake(
          tiles + " tiles, but the kinds add up to " + ordered + "; correct one of them");
    }
    readExtras();
    return new GlazeLine(
        treatments(most, windows), kinds(kindRows), changeCost, longestRun.orElse(tiles));
  }

  private void readCounts(Row row) {
    Ints counts = row.numbersFrom(0, 3, "tiles, treatments and kinds");
    if (counts.stream().anyMatch(count -> count < 1)) {
      throw row.mistake("at least one tile, one treatment and one kind are needed");
    }
    tiles = counts.get(0);
    treatments = counts.get(1);
    kinds = counts.get(2);
  }

  private Ints row(String meant) {
    return rows.next(meant).numbersFrom(0, treatments, meant);
  }

  private void requireRoom(Ints most, Ints windows, Row row) {
    for (int t = 0; t < treatments; t++) {
      if (most.get(t) < 1 || most.get(t) > windows.get(t)) {
        throw row.mistake(
            "treatment "
                + t
                + " for at most "
                + most.get(t)
                + " of "
                + windows.get(t)
                + " tiles; at least 1, and no more than the window is long");
      }
    }
  }

  private List<Ints> kindRows() {
    String meant = "number, tiles and a 0 or 1 for each treatment";
    List<Ints> read = new ArrayList<>();
    while (read.size() < kinds) {
      Row row = rows.next("kind " + read.size() + " of " + kinds + ": " + meant);
      Ints numbers = row.numbersFrom(0, 2 + treatments, meant);
      if (numbers.get(0) != read.size()) {
        throw row.mistake("kind " + numbers.get(0) + " where kind " + read.size() + " comes next");
      }
      if (numbers.stream().skip(2).anyMatch(bit -> bit > 1)) {
        throw row.mistake("a kind needs a treatment or not: 1 or 0 for each");
      }
      read.add(numbers);
    }
    return read;
  }

  private void readExtras() {
    Set<String> seen = new HashSet<>();
    while (rows.hasNext()) {
      Row row = rows.next("");
      if (!seen.add(row.first())) {
        throw row.mistake("a second line '" + Row.shown(row.first()) + "'; one is enough");
      }
      readExtra(row);
    }
  }

  private void readExtra(Row row) {
    switch (row.first()) {
      case GLAZE -> glazes = Optional.of(row.numbersFrom(1, kinds, "the glaze of each kind"));
      case EXCESS ->
          excess = Optional.of(row.numbersFrom(1, treatments, "a price for each treatment"));
      case CHANGE -> changeCost = row.numbersFrom(1, 1, "what a change costs").get(0);
      case RUN -> {
        longestRun = Optional.of(row.numbersFrom(1, 1, "the longest run of one glaze").get(0));
        if (longestRun.get() < 1) {
          throw row.mistake("a run of one glaze has at least 1 tile");
        }
      }
      default ->
          throw row.mistake(
              "'"
                  + Row.shown(row.first())
                  + "' after the last of "
                  + kinds
                  + " kinds; here may stand "
                  + String.join(", ", GLAZE, CHANGE, RUN, EXCESS));
    }
  }

  private List<Treatment> treatments(Ints most, Ints windows) {
    return IntStream.range(0, treatments)
        .mapToObj(
            t -> new Treatment(most.get(t), windows.get(t), excess.map(e -> e.get(t)).orElse(0)))
        .toList();
  }

  private List<Kind> kinds(List<Ints> kindRows) {
    return IntStream.range(0, kinds)
        .mapToObj(k -> kind(kindRows.get(k), glazes.map(g -> g.get(k)).orElse(0)))
        .toList();
  }

  private Kind kind(Ints row, int glaze) {
    int[] needed = IntStream.range(0, treatments).filter(t -> row.get(2 + t) == 1).toArray();
    return new Kind(row.get(1), Ints.of(needed), glaze);
  }
}
