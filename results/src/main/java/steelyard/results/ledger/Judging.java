package steelyard.results.ledger;

import java.time.Instant;
import java.util.List;

/** What judging said of runs, and how their claims stand. */
public final class Judging {

  private final Store store;

  Judging(Store store) {
    this.store = store;
  }

  /**
   * Adds what judging said; it stands until something newer is said.
   *
   * @throws LedgerProblem if the run is unknown
   */
  public void add(Verdict verdict) {
    store.write(
        handle -> {
          Rows rows = new Rows(handle);
          rows.run(
              "INSERT INTO verdict (run, judge, verdict, detail, at) VALUES (?, ?, ?, ?, ?)",
              Runs.idOf(rows, verdict.run()),
              verdict.judge().bytes(),
              Codes.VERDICT.of(verdict.check()),
              verdict.detail(),
              verdict.at().toEpochMilli());
          return null;
        });
  }

  /** Everything that judging said of a run, the oldest first. */
  public List<Verdict> verdicts(String run) {
    return store.list(
        """
        SELECT v.judge, v.verdict, v.detail, v.at
        FROM verdict v JOIN run r ON r.id = v.run WHERE r.name = ? ORDER BY v.id""",
        row ->
            new Verdict(
                run,
                Digest.of(row.getBytes(1)),
                Codes.VERDICT.word(row.getInt(2)),
                row.getString(3),
                Instant.ofEpochMilli(row.getLong(4))),
        run);
  }

  /** The runs that stand for a sweep's cells, have a solution, and were never judged by a judge. */
  public List<String> unjudged(String sweep, Digest judge) {
    return store.list(
        """
        WITH block_of (id) AS
          (SELECT b.id FROM sweep s JOIN block b ON b.sweep = s.id WHERE s.name = ?)
        SELECT r.name FROM run r
        WHERE r.id IN (SELECT o.id FROM block_of b JOIN run o ON o.block = b.id
            UNION SELECT u.run FROM block_of b JOIN reuse u ON u.block = b.id)
          AND r.status IN (%d, %d)
          AND NOT EXISTS (SELECT 1 FROM verdict v WHERE v.run = r.id AND v.judge = ?)
        ORDER BY r.id"""
            .formatted(Codes.STATUS.of(Status.OPTIMAL), Codes.STATUS.of(Status.FEASIBLE)),
        row -> row.getString(1),
        sweep,
        judge.bytes());
  }

  /** How a run's claim stands beside all others of its problem. */
  public Standing standing(String run) {
    return Evidence.standingOf(store, run);
  }
}
