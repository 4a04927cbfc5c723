package steelyard.results.ledger;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;

/**
 * Brings the records of finished runs from their folders into a ledger.
 *
 * <p>It may be killed at any point and started again: a record is either not there yet, or there
 * and not in the ledger, or in both, and collecting twice is collecting once. When it returns, the
 * folders of the runs that it names as collected are no longer needed.
 */
public final class Collector {

  /** Records in one transaction: few enough to lose little, many enough to wait seldom. */
  private static final int BATCH = 200;

  private final Runs runs;

  /** Collects into a ledger that is open for writing. */
  public Collector(Ledger ledger) {
    this.runs = ledger.runs();
  }

  /**
   * What a collection did.
   *
   * @param fresh how many runs are new in the ledger
   * @param collected the folders whose runs are in the ledger now, in order of name
   * @param problems one line for each record that could not be collected
   */
  public record Collected(int fresh, List<Path> collected, List<String> problems) {
    public Collected {
      collected = List.copyOf(collected);
      problems = List.copyOf(problems);
    }
  }

  /**
   * Collects every record in a folder of run folders. Folders without a record are runs that have
   * not finished: they are passed over.
   *
   * @throws LedgerProblem if the folder cannot be read or the ledger cannot be written; a record
   *     that cannot be read is told in the result instead
   */
  public Collected collect(Path folder) {
    Collection collection = new Collection();
    for (Path run : folders(folder)) {
      collection.take(run);
    }
    collection.flush();
    return collection.result();
  }

  private static List<Path> folders(Path folder) {
    try (Stream<Path> entries = Files.list(folder)) {
      return entries
          .filter(run -> Files.isRegularFile(run.resolve(RunRecords.FILE_NAME)))
          .sorted()
          .toList();
    } catch (IOException e) {
      throw Problems.of(folder, e);
    }
  }

  /** One pass over a folder. */
  private final class Collection {

    private final List<Path> pending = new ArrayList<>();
    private final List<RunRecord> records = new ArrayList<>();
    private final List<Path> collected = new ArrayList<>();
    private final List<String> problems = new ArrayList<>();
    private int fresh;

    void take(Path run) {
      try {
        records.add(read(run));
        pending.add(run);
      } catch (LedgerProblem e) {
        problems.add(e.getMessage());
      }
      if (records.size() == BATCH) {
        flush();
      }
    }

    private RunRecord read(Path run) {
      Path file = run.resolve(RunRecords.FILE_NAME);
      RunRecord record = RunRecords.read(file);
      if (!record.run().equals(run.getFileName().toString())) {
        throw new LedgerProblem(
            "%s: is the record of run %s".formatted(file, record.run()),
            "give the folder the run's id as its name");
      }
      return record;
    }

    void flush() {
      List<Collecting.Added> added = runs.collect(records);
      for (int i = 0; i < added.size(); i++) {
        switch (added.get(i)) {
          case FRESH -> fresh++;
          case KNOWN -> {}
          case CLASH -> problems.add(Runs.clash(records.get(i)).getMessage());
        }
        if (added.get(i) != Collecting.Added.CLASH) {
          collected.add(pending.get(i));
        }
      }
      records.clear();
      pending.clear();
    }

    Collected result() {
      return new Collected(fresh, collected, problems);
    }
  }
}
