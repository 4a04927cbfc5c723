package steelyard.results.ledger;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.util.List;
import java.util.Optional;

/** The stretches in which sweeps are worked on, and how fast the machine was in them. */
public final class Sessions {

  private final Store store;

  Sessions(Store store) {
    this.store = store;
  }

  /** Adds a session; one that is there stays as it is. */
  public void add(Session session) {
    store.write(handle -> new Ids(new Rows(handle)).session(session));
  }

  /** A session by its id. */
  public Optional<Session> find(String id) {
    return store
        .list(
            """
            SELECT s.name, s.harness, m.class, m.facts, s.launch, s.started
            FROM session s JOIN machine m ON m.id = s.machine WHERE s.name = ?""",
            Sessions::session,
            id)
        .stream()
        .findFirst();
  }

  /** The sessions in which runs of a sweep were made, in order. */
  public List<Session> of(String sweep) {
    return store.list(
        """
        SELECT s.name, s.harness, m.class, m.facts, s.launch, s.started
        FROM session s JOIN machine m ON m.id = s.machine
        WHERE s.id IN
          (SELECT r.session FROM sweep w JOIN block b ON b.sweep = w.id JOIN run r ON r.block = b.id
          WHERE w.name = ?)
        ORDER BY s.id""",
        Sessions::session,
        sweep);
  }

  /**
   * Adds what a calibration in a session gave.
   *
   * @throws LedgerProblem if the session is unknown
   */
  public void addCalibration(String session, Calibration calibration) {
    store.write(
        handle -> {
          Rows rows = new Rows(handle);
          rows.run(
              """
              INSERT INTO calibration (session, at, ns, steal_ns, swapped_pages)
              VALUES (?, ?, ?, ?, ?)""",
              idOf(rows, session),
              calibration.at().toEpochMilli(),
              calibration.nanos(),
              calibration.stealNanos(),
              calibration.swappedPages());
          return null;
        });
  }

  /** What the calibrations of a session gave, in order. */
  public List<Calibration> calibrations(String session) {
    return store.list(
        """
        SELECT c.at, c.ns, c.steal_ns, c.swapped_pages
        FROM calibration c JOIN session s ON s.id = c.session
        WHERE s.name = ? ORDER BY c.id""",
        row ->
            new Calibration(
                Instant.ofEpochMilli(row.getLong(1)),
                row.getLong(2),
                row.getLong(3),
                row.getLong(4)),
        session);
  }

  private static long idOf(Rows rows, String session) {
    return rows.find("SELECT id FROM session WHERE name = ?", session)
        .orElseThrow(
            () ->
                new LedgerProblem(
                    "session '%s' is not in the ledger".formatted(session), "add it first"));
  }

  private static Session session(ResultSet row) throws SQLException {
    return new Session(
        row.getString(1),
        row.getString(2),
        row.getString(3),
        RecordJson.pairs(row.getString(4)),
        RecordJson.pairs(row.getString(5)),
        Instant.ofEpochMilli(row.getLong(6)));
  }
}
