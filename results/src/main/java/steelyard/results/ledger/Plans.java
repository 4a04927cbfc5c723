package steelyard.results.ledger;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.time.Instant;
import java.util.List;
import java.util.Optional;

/** What is to be run: sweeps and their blocks. */
public final class Plans {

  private static final String SUMMARIES =
      """
      SELECT s.name, s.title, p.planned,
        (SELECT count(*) FROM block b JOIN cell c ON c.block = b.id WHERE b.sweep = s.id),
        count(r.id), max(r.finished), coalesce(p.planned, min(r.finished)) AS began
      FROM sweep s
        LEFT JOIN sweep_plan p ON p.sweep = s.id
        LEFT JOIN block b ON b.sweep = s.id
        LEFT JOIN run r ON r.block = b.id AND r.ending <> %d
      GROUP BY s.id
      ORDER BY began, s.id"""
          .formatted(Codes.ENDING.of(Ending.STOPPED));

  private static final String PLANS =
      """
      SELECT s.name, s.title, p.planned, p.plan, p.in_service, p.file
      FROM sweep s JOIN sweep_plan p ON p.sweep = s.id
      WHERE %s = ? ORDER BY p.planned DESC, s.id DESC""";

  private final Store store;

  Plans(Store store) {
    this.store = store;
  }

  /** Adds a sweep; one that is there stays as it is. */
  public void addSweep(Sweep sweep) {
    store.write(
        handle -> {
          Rows rows = new Rows(handle);
          rows.run(
              """
              INSERT INTO sweep_plan (sweep, planned, plan, in_service, file)
              VALUES (?, ?, ?, ?, ?) ON CONFLICT (sweep) DO NOTHING""",
              new Ids(rows).sweep(sweep.id(), sweep.name()),
              sweep.planned().toEpochMilli(),
              sweep.plan().bytes(),
              sweep.inService().orElse(null),
              sweep.file());
          return null;
        });
  }

  /**
   * Adds blocks to a sweep, all or none; blocks that are there stay as they are.
   *
   * @throws LedgerProblem if the sweep is unknown, or a place in it is planned otherwise already
   */
  public void addBlocks(String sweep, List<Block> blocks) {
    store.write(
        handle -> {
          Rows rows = new Rows(handle);
          long id = idOf(rows, sweep);
          blocks.forEach(block -> addBlock(rows, id, block));
          return null;
        });
  }

  /** Every sweep, the oldest first. */
  public List<SweepSummary> sweeps() {
    return store.list(SUMMARIES, Plans::summary);
  }

  /** The plan of a sweep; empty if it is unknown or only its runs are known. */
  public Optional<Sweep> find(String sweep) {
    return store.list(PLANS.formatted("s.name"), Plans::plan, sweep).stream().findFirst();
  }

  /** The plan of the newest sweep of a name. */
  public Optional<Sweep> latest(String name) {
    return store.list(PLANS.formatted("s.title"), Plans::plan, name).stream().findFirst();
  }

  /** The blocks of a sweep by number, their cells by position; empty for an unknown sweep. */
  public List<Block> blocks(String sweep) {
    return PlannedBlocks.of(store, sweep);
  }

  private static void addBlock(Rows rows, long sweep, Block block) {
    Ids ids = new Ids(rows);
    long id = ids.block(sweep, block.number(), block.seed(), block.cells().get(0).recipe());
    for (Cell cell : block.cells()) {
      addCell(rows, ids, sweep, id, cell);
      boolean asPlanned =
          rows.find(
                  "SELECT 1 FROM cell WHERE block = ? AND position = ? AND key = ?",
                  id,
                  cell.position(),
                  cell.key().bytes())
              .isPresent();
      if (!asPlanned) {
        throw new LedgerProblem(
            "block %d, position %d: the sweep has another run planned there"
                .formatted(block.number(), cell.position()),
            "plan it as a new sweep");
      }
    }
  }

  /** Adds a cell unless its place is taken. */
  static void addCell(Rows rows, Ids ids, long sweep, long block, Cell cell) {
    rows.run(
        """
        INSERT INTO cell (block, position, candidate, recipe, backend_build, settings, key)
        VALUES (?, ?, ?, ?, ?, ?, ?) ON CONFLICT (block, position) DO NOTHING""",
        block,
        cell.position(),
        ids.candidate(sweep, cell.recipe(), cell.backend(), cell.setting()),
        ids.recipe(cell.recipe().key()),
        ids.backendBuild(cell.backend()),
        ids.settings(cell.setting()),
        cell.key().bytes());
  }

  private static long idOf(Rows rows, String sweep) {
    return rows.find("SELECT id FROM sweep WHERE name = ?", sweep)
        .orElseThrow(
            () ->
                new LedgerProblem(
                    "sweep '%s' is not in the ledger".formatted(sweep), "add it first"));
  }

  private static Sweep plan(ResultSet row) throws SQLException {
    return new Sweep(
        row.getString(1),
        row.getString(2),
        Instant.ofEpochMilli(row.getLong(3)),
        Digest.of(row.getBytes(4)),
        Optional.ofNullable(row.getString(5)),
        row.getString(6));
  }

  private static SweepSummary summary(ResultSet row) throws SQLException {
    return new SweepSummary(
        row.getString(1),
        row.getString(2),
        instant(row, 3),
        row.getLong(4),
        row.getLong(5),
        instant(row, 6));
  }

  private static Optional<Instant> instant(ResultSet row, int column) throws SQLException {
    long millis = row.getLong(column);
    return row.wasNull() ? Optional.empty() : Optional.of(Instant.ofEpochMilli(millis));
  }
}
