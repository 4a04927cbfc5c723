package steelyard.results.ledger;

import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.sqlite.SQLiteConfig;

/**
 * The store of all runs ever made: one file, append-only, one writer at a time and any number of
 * readers beside it. What a method has added is on the disk when it returns.
 *
 * <p>Every method may throw {@link LedgerProblem}, whose message is one line for people. Use from
 * several threads is safe; they take turns.
 */
public final class Ledger implements AutoCloseable {

  private final Store store;
  private final Optional<WriterLock> lock;

  private Ledger(Store store, Optional<WriterLock> lock) {
    this.store = store;
    this.lock = lock;
  }

  /**
   * Opens a ledger for reading, also while a sweep writes to it.
   *
   * @throws LedgerProblem if it is missing, damaged, not a ledger, of a newer version, or on a
   *     network file system
   */
  public static Ledger read(Path file) {
    return new Ledger(Opening.toRead(file), Optional.empty());
  }

  /**
   * Opens a ledger for writing; makes it if it is not there, and brings it up to date if it is of
   * an older version.
   *
   * @param holder told to whoever else wants to write
   * @throws LedgerProblem if another process writes to it, or as {@link #read}
   */
  public static Ledger write(Path file, Holder holder) {
    return write(file, holder, Opening.config());
  }

  static Ledger write(Path file, Holder holder, SQLiteConfig config) {
    Path real = Opening.forWriting(file);
    WriterLock lock = WriterLock.take(real, holder);
    try {
      return new Ledger(Opening.toWrite(real, config), Optional.of(lock));
    } catch (RuntimeException e) {
      lock.close();
      throw e;
    }
  }

  /** What is to be run. */
  public Plans plans() {
    return new Plans(store);
  }

  /** What recipes build. */
  public Models models() {
    return new Models(store);
  }

  /** Where and when sweeps are worked on. */
  public Sessions sessions() {
    return new Sessions(store);
  }

  /** What of a plan need not be run. */
  public Progress progress() {
    return new Progress(store);
  }

  /** What ran. */
  public Runs runs() {
    return new Runs(store);
  }

  /** What judging said of it. */
  public Judging judging() {
    return new Judging(store);
  }

  /** One observation for each cell of a sweep that a run stands for, in planned order. */
  public List<Observation> observations(String sweep) {
    return Observations.of(store, sweep);
  }

  @Override
  public void close() {
    try {
      store.close();
    } finally {
      lock.ifPresent(WriterLock::close);
    }
  }
}
