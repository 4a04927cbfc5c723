package steelyard.results.ledger;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.Comparator;
import java.util.HashMap;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * Which run stands for each planned cell of a sweep.
 *
 * <p>First its own; else one of its block under the same key, since equal models run once; else one
 * that was taken over from elsewhere. Of several, an undisturbed one, then the latest. A stopped
 * run stands for nothing.
 */
final class Bookings {

  private static final String QUERY =
      """
      WITH booked (block, position, candidate, recipe, run, nearness) AS (
        SELECT c.block, c.position, c.candidate, c.recipe, r.id, 1 + (r.position = c.position)
        FROM sweep s JOIN block b ON b.sweep = s.id JOIN cell c ON c.block = b.id
          JOIN run r ON r.block = c.block AND r.key = c.key
        WHERE s.name = ?1 AND r.ending <> %d
        UNION ALL
        SELECT c.block, c.position, c.candidate, c.recipe, u.run, 0
        FROM sweep s JOIN block b ON b.sweep = s.id JOIN cell c ON c.block = b.id
          JOIN reuse u ON u.block = c.block AND u.position = c.position
        WHERE s.name = ?1)
      SELECT b.number, k.position, k.block, k.candidate, coalesce(p.problem, r.problem, 0),
        k.nearness, r.id, r.name, r.attempt, r.disturbed,
        r.model, m.as_built, m.search,
        r.lower_ns + r.solve_ns + r.answer_ns, r.limits, r.ending, r.rss, a.adapter,
        r.status, r.minimize, r.objective, r.bound, %s
      FROM booked k JOIN block b ON b.id = k.block JOIN run r ON r.id = k.run
        JOIN backend_build a ON a.id = r.backend_build
        LEFT JOIN recipe_model p ON p.recipe = k.recipe
        LEFT JOIN model m ON m.id = r.model"""
          .formatted(Codes.ENDING.of(Ending.STOPPED), Evidence.CHECK);

  /**
   * One cell and the run that stands for it.
   *
   * @param block the block's row
   * @param candidate the candidate's row
   * @param problem the row of the problem that the cell poses; 0 if it is not known
   * @param nearness 2 for the cell's own run, 1 for one of its block, 0 for one taken over
   * @param model digests of the model as built and of its branching and hint, one after the other;
   *     a text of its own where none was built
   * @param limits the row of the limits
   */
  record Booking(
      CellId cell,
      long block,
      long candidate,
      long problem,
      int nearness,
      long runRow,
      String run,
      int attempt,
      boolean disturbed,
      String model,
      long limitedNanos,
      long limits,
      Ending ending,
      long peakBytes,
      Claims.Answer answer) {}

  private static final Comparator<Booking> BETTER =
      Comparator.comparingInt(Booking::nearness)
          .thenComparing(Booking::disturbed, Comparator.reverseOrder())
          .thenComparingInt(Booking::attempt)
          .thenComparingLong(Booking::runRow);

  private final SortedMap<CellId, Booking> best = new TreeMap<>();
  private final Map<Long, String> models = new HashMap<>();

  private Bookings() {}

  /** The bookings of a sweep, by cell; cells without a run are left out. */
  static SortedMap<CellId, Booking> of(Store store, String sweep) {
    Bookings bookings = new Bookings();
    store.scan(QUERY, bookings::take, sweep);
    return bookings.best;
  }

  private void take(ResultSet row) throws SQLException {
    Booking booking = booking(row);
    best.merge(
        booking.cell(), booking, (old, other) -> BETTER.compare(old, other) < 0 ? other : old);
  }

  private Booking booking(ResultSet row) throws SQLException {
    String run = row.getString(8);
    return new Booking(
        new CellId(row.getInt(1), row.getInt(2)),
        row.getLong(3),
        row.getLong(4),
        row.getLong(5),
        row.getInt(6),
        row.getLong(7),
        run,
        row.getInt(9),
        row.getBoolean(10),
        model(row, run),
        row.getLong(14),
        row.getLong(15),
        Codes.ENDING.word(row.getInt(16)),
        row.getLong(17),
        Evidence.answer(row, 18));
  }

  private String model(ResultSet row, String run) throws SQLException {
    long id = row.getLong(11);
    if (row.wasNull()) {
      return "none:" + run;
    }
    String known = models.get(id);
    if (known == null) {
      known = Digest.of(row.getBytes(12)).hex() + Digest.of(row.getBytes(13)).hex();
      models.put(id, known);
    }
    return known;
  }
}
