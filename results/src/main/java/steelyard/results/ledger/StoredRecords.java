package steelyard.results.ledger;

import java.io.IOException;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import org.jdbi.v3.core.Handle;

/** The records as a whole, compressed by the first of their session. */
final class StoredRecords {

  private final Handle handle;
  private final Map<Long, String> bases = new HashMap<>();

  /** For one transaction. */
  StoredRecords(Handle handle) {
    this.handle = handle;
  }

  void add(long run, long session, String json) {
    Optional<Long> basis =
        handle
            .select("SELECT run FROM session_basis WHERE session = ?", session)
            .map((row, context) -> row.getLong(1))
            .findOne();
    handle.execute(
        "INSERT INTO record (run, basis, zlib) VALUES (?, ?, ?)",
        run,
        basis.orElse(null),
        Packed.pack(json, basis.map(this::basisJson).orElse("")));
    if (basis.isEmpty()) {
      handle.execute("INSERT INTO session_basis (session, run) VALUES (?, ?)", session, run);
    }
  }

  private String basisJson(long run) {
    return bases.computeIfAbsent(run, this::json);
  }

  /**
   * A run's record as it came in.
   *
   * @throws LedgerProblem if it is damaged
   */
  RunRecord record(String run) {
    long id =
        handle
            .select("SELECT id FROM run WHERE name = ?", run)
            .map((row, context) -> row.getLong(1))
            .one();
    return RunRecords.fromJson(json(id), "run " + run);
  }

  private String json(long run) {
    return handle
        .select(
            """
            SELECT r.zlib, b.zlib, n.name
            FROM record r JOIN run n ON n.id = r.run LEFT JOIN record b ON b.run = r.basis
            WHERE r.run = ?""",
            run)
        .map((row, context) -> unpack(row.getBytes(1), row.getBytes(2), row.getString(3)))
        .one();
  }

  /** Unpacks a record; the basis is null where it was compressed by itself. */
  private static String unpack(byte[] packed, byte[] basis, String run) {
    try {
      return Packed.unpack(packed, basis == null ? "" : Packed.unpack(basis, ""));
    } catch (IOException e) {
      throw new LedgerProblem(
          "run %s: its record is damaged".formatted(run), "put back a copy of the ledger", e);
    }
  }
}
