package steelyard.results.ledger;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;

/** Puts the plan's names, the runs' facts and what is said of them together. */
final class Observations {

  private record Names(String family, String variant, String backend, String setting) {}

  private record Task(
      int number, String instance, String instanceClass, double weight, long seed) {}

  private final Map<Long, Names> candidates = new HashMap<>();
  private final Map<Long, Task> blocks = new HashMap<>();
  private final Map<Long, Limits> limits = new HashMap<>();

  private Observations() {}

  /** One observation for each cell of a sweep that a run stands for, in planned order. */
  static List<Observation> of(Store store, String sweep) {
    SortedMap<CellId, Bookings.Booking> bookings = Bookings.of(store, sweep);
    Evidence evidence = Evidence.aboutSweep(store, sweep);
    bookings.values().forEach(b -> evidence.add(b.problem(), b.answer()));
    Observations names = new Observations();
    names.load(store, sweep);
    List<Observation> observations = new ArrayList<>(bookings.size());
    for (Bookings.Booking booking : bookings.values()) {
      Standing standing =
          booking.problem() == 0
              ? new Standing(Claim.NONE, 0)
              : evidence.standing(booking.problem(), booking.answer());
      observations.add(names.observation(booking, standing.claim()));
    }
    return observations;
  }

  private void load(Store store, String sweep) {
    store.scan(
        """
        SELECT n.id, n.family, n.variant, n.backend, n.setting
        FROM sweep s JOIN candidate n ON n.sweep = s.id WHERE s.name = ?""",
        row ->
            candidates.put(
                row.getLong(1),
                new Names(row.getString(2), row.getString(3), row.getString(4), row.getString(5))),
        sweep);
    store.scan(
        """
        SELECT b.id, b.number, i.name, b.class, b.weight, b.seed
        FROM sweep s JOIN block b ON b.sweep = s.id JOIN instance i ON i.id = b.instance
        WHERE s.name = ?""",
        row -> blocks.put(row.getLong(1), task(row)),
        sweep);
    store.scan(
        "SELECT id, wall_seconds, work_unit, work_amount, memory_bytes FROM limits",
        row -> limits.put(row.getLong(1), limits(row)));
  }

  private static Task task(ResultSet row) throws SQLException {
    return new Task(
        row.getInt(2), row.getString(3), row.getString(4), row.getDouble(5), row.getLong(6));
  }

  private static Limits limits(ResultSet row) throws SQLException {
    String unit = row.getString(3);
    Optional<Limits.Work> work =
        unit.isEmpty() ? Optional.empty() : Optional.of(new Limits.Work(unit, row.getDouble(4)));
    return new Limits(row.getDouble(2), work, row.getLong(5));
  }

  private Observation observation(Bookings.Booking booking, Claim claim) {
    Names names = candidates.get(booking.candidate());
    Task task = blocks.get(booking.block());
    Limits allowed = limits.get(booking.limits());
    Claims.Answer answer = booking.answer();
    return new Observation(
        booking.run(),
        names.family(),
        task.instance(),
        task.instanceClass(),
        task.weight(),
        names.variant(),
        names.backend(),
        names.setting(),
        task.seed(),
        task.number(),
        booking.model(),
        Math.min(booking.limitedNanos() / 1e9, allowed.wallSeconds()),
        allowed,
        answer.status(),
        booking.ending(),
        answer.check(),
        claim,
        answer.minimize(),
        answer.objective(),
        answer.bound(),
        booking.peakBytes(),
        booking.disturbed());
  }
}
