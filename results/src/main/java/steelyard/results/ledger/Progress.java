package steelyard.results.ledger;

import java.util.Collections;
import java.util.HashSet;
import java.util.Set;
import java.util.SortedMap;
import java.util.SortedSet;
import java.util.TreeMap;
import java.util.TreeSet;

/** What of a plan need not be run, because it was. */
public final class Progress {

  /** Solved or cut by work: the same on every machine. Other endings depend on the machine. */
  private static final String REUSABLE =
      """
      l.work_unit <> '' AND (r.ending IN (%d, %d) OR (r.ending <> %d AND m.class = ?1))"""
          .formatted(
              Codes.ENDING.of(Ending.COMPLETED),
              Codes.ENDING.of(Ending.WORK_LIMIT),
              Codes.ENDING.of(Ending.STOPPED));

  private static final String WITH_MACHINE =
      """
      run r JOIN limits l ON l.id = r.limits JOIN session s ON s.id = r.session
        JOIN machine m ON m.id = s.machine""";

  private static final String HAS_RUN =
      """
      EXISTS (SELECT 1 FROM run r WHERE r.block = c.block AND r.key = c.key AND r.ending <> %d)"""
          .formatted(Codes.ENDING.of(Ending.STOPPED));

  private static final String IS_REUSED =
      "EXISTS (SELECT 1 FROM reuse u WHERE u.block = c.block AND u.position = c.position)";

  private final Store store;

  Progress(Store store) {
    this.store = store;
  }

  /**
   * The keys under which a run is at hand that need not be made again: limited by work, ended
   * otherwise than by being stopped. An ending that depends on the machine counts on its class
   * only.
   */
  public Set<RunKey> reusableKeys(String machineClass) {
    Set<RunKey> keys = new HashSet<>();
    store.scan(
        "SELECT DISTINCT r.key FROM %s WHERE %s".formatted(WITH_MACHINE, REUSABLE),
        row -> keys.add(RunKey.of(row.getBytes(1))),
        machineClass);
    return Collections.unmodifiableSet(keys);
  }

  /**
   * Lets each cell of a sweep that has no run take the latest reusable run of its key.
   *
   * @return how many cells took one
   */
  public int reuse(String sweep, String machineClass) {
    return store.write(
        handle ->
            handle.execute(
                """
                INSERT INTO reuse (block, position, run)
                SELECT block, position, found FROM (
                  SELECT c.block, c.position,
                    (SELECT max(r.id) FROM %s WHERE r.key = c.key AND %s) AS found
                  FROM sweep w JOIN block b ON b.sweep = w.id JOIN cell c ON c.block = b.id
                  WHERE w.name = ?2 AND NOT %s AND NOT %s)
                WHERE found IS NOT NULL"""
                    .formatted(WITH_MACHINE, REUSABLE, HAS_RUN, IS_REUSED),
                machineClass,
                sweep));
  }

  /** The cells of a sweep that a run stands for. */
  public SortedSet<CellId> finished(String sweep) {
    SortedSet<CellId> cells = new TreeSet<>();
    store.scan(
        """
        SELECT b.number, c.position
        FROM sweep w JOIN block b ON b.sweep = w.id JOIN cell c ON c.block = b.id
        WHERE w.name = ? AND (%s OR %s)"""
            .formatted(HAS_RUN, IS_REUSED),
        row -> cells.add(new CellId(row.getInt(1), row.getInt(2))),
        sweep);
    return cells;
  }

  /**
   * How many runs each cell of a sweep has had, stopped ones included; cells without are left out.
   */
  public SortedMap<CellId, Integer> attempts(String sweep) {
    SortedMap<CellId, Integer> attempts = new TreeMap<>();
    store.scan(
        """
        SELECT b.number, r.position, count(*)
        FROM sweep w JOIN block b ON b.sweep = w.id JOIN run r ON r.block = b.id
        WHERE w.name = ? GROUP BY b.id, r.position""",
        row -> attempts.put(new CellId(row.getInt(1), row.getInt(2)), row.getInt(3)),
        sweep);
    return attempts;
  }
}
