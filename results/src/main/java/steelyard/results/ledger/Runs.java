package steelyard.results.ledger;

import java.util.List;

/** What ran: records come in, and come out again as they were. */
public final class Runs {

  private static final int MOST_LISTED = 8;

  private final Store store;

  Runs(Store store) {
    this.store = store;
  }

  /**
   * Adds a run unless it is there; durable when this returns.
   *
   * @return whether it is new
   * @throws LedgerProblem if another run has its id
   */
  public boolean collect(RunRecord record) {
    Collecting.Added added = collect(List.of(record)).get(0);
    if (added == Collecting.Added.CLASH) {
      throw clash(record);
    }
    return added == Collecting.Added.FRESH;
  }

  /** Adds runs in one transaction and says of each, in their order, what became of it. */
  List<Collecting.Added> collect(List<RunRecord> records) {
    return store.write(
        handle -> {
          Collecting collecting = new Collecting(handle);
          return records.stream().map(collecting::add).toList();
        });
  }

  static LedgerProblem clash(RunRecord record) {
    return new LedgerProblem(
        "run %s: the ledger has another run of this id".formatted(record.run()),
        "check where the record came from; neither of the two was touched");
  }

  /**
   * The id that a unique beginning stands for.
   *
   * @throws LedgerProblem if no run's id begins so, or several do
   */
  public String resolve(String beginning) {
    List<String> ids =
        store.list(
            "SELECT name FROM run WHERE name >= ? AND name < ? ORDER BY name LIMIT ?",
            row -> row.getString(1),
            beginning,
            beginning + Character.MAX_VALUE,
            MOST_LISTED + 1);
    if (ids.isEmpty()) {
      throw new LedgerProblem(
          "%s: no run's id begins with '%s'".formatted(store.file(), Text.head(beginning, 80)),
          "take an id from the brief");
    }
    if (ids.size() > 1 && !ids.get(0).equals(beginning)) {
      throw new LedgerProblem(
          "several runs' ids begin with '%s': %s".formatted(beginning, listed(ids)),
          "give more of it");
    }
    return ids.get(0);
  }

  private static String listed(List<String> ids) {
    return ids.size() <= MOST_LISTED
        ? String.join(", ", ids)
        : String.join(", ", ids.subList(0, MOST_LISTED)) + " and more";
  }

  /**
   * The whole record of a run.
   *
   * @param beginning a unique beginning of its id
   * @throws LedgerProblem if no run's id begins so, or several do
   */
  public RunRecord record(String beginning) {
    String run = resolve(beginning);
    return store.read(handle -> new StoredRecords(handle).record(run));
  }

  static long idOf(Rows rows, String run) {
    return rows.find("SELECT id FROM run WHERE name = ?", run)
        .orElseThrow(
            () ->
                new LedgerProblem(
                    "run '%s' is not in the ledger".formatted(run), "collect its folder first"));
  }
}
