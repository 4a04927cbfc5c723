package steelyard.harness.cli;

import java.io.PrintWriter;
import java.time.Duration;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import me.tongfei.progressbar.DelegatingProgressBarConsumer;
import me.tongfei.progressbar.ProgressBar;
import me.tongfei.progressbar.ProgressBarBuilder;
import me.tongfei.progressbar.ProgressBarStyle;
import steelyard.harness.local.SweepListener;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.RunRecord;

/**
 * Tells how a sweep goes on: a bar with the remaining time and the running candidates on a
 * terminal, else plain lines. Safe for use by several threads.
 */
final class Telling implements SweepListener, AutoCloseable {
  private static final int LINES = 20;

  /** Set by the start script, which knows whether standard error is a terminal. */
  private static final String TERMINAL = "steelyard.terminal";

  private final PrintWriter err;
  private final boolean quiet;
  private final boolean terminal;
  private final Map<String, String> running = new LinkedHashMap<>();
  private Optional<ProgressBar> bar = Optional.empty();
  private long planned;
  private long done;

  private Telling(PrintWriter err, boolean quiet, boolean terminal) {
    this.err = err;
    this.quiet = quiet;
    this.terminal = terminal;
  }

  static Telling on(PrintWriter err, boolean quiet) {
    boolean dumb = "dumb".equals(System.getenv("TERM"));
    return new Telling(err, quiet, Boolean.getBoolean(TERMINAL) && !dumb);
  }

  /** How many models are known of how many. */
  synchronized void models(int known, int all) {
    if (!quiet && (known == all || !terminal)) {
      err.println("models built: " + known + " of " + all);
    }
  }

  synchronized void line(String text) {
    if (!quiet) {
      err.println(Columns.visible(text));
    }
  }

  @Override
  public synchronized void planned(long runs, long finished) {
    planned = runs;
    done = finished;
    if (finished > 0) {
      line(finished + " of " + runs + " runs were finished before");
    }
    if (terminal && !quiet) {
      bar =
          Optional.of(
              new ProgressBarBuilder()
                  .setTaskName("runs")
                  .setInitialMax(runs)
                  .startsFrom(finished, Duration.ZERO)
                  .setStyle(ProgressBarStyle.ASCII)
                  .setConsumer(new DelegatingProgressBarConsumer(this::redraw, 79))
                  .build());
    }
  }

  private void redraw(String text) {
    err.print("\r" + text);
    err.flush();
  }

  @Override
  public synchronized void started(String run, String candidate, String instance) {
    running.put(run, candidate + ", " + instance);
    bar.ifPresent(b -> b.setExtraMessage(String.join("; ", running.values())));
  }

  @Override
  public synchronized void finished(RunRecord record, Check check) {
    running.remove(record.run());
    done++;
    bar.ifPresent(ProgressBar::step);
    boolean wrong = check == Check.INVALID || record.outcome().ending() == Ending.CRASHED;
    if (wrong || (!terminal && isTimeForALine())) {
      List<String> words = new ArrayList<>();
      words.add(done + "/" + planned);
      words.add(record.recipe().instance().name());
      words.add(record.recipe().variant() + " on " + record.backend().name());
      words.add(Summaries.outcome(record, check));
      line((terminal ? "\n" : "") + String.join("  ", words));
    }
  }

  /** About twenty lines in a sweep, and all of a small one. */
  private boolean isTimeForALine() {
    return planned <= LINES || done * LINES / planned != (done - 1) * LINES / planned;
  }

  @Override
  public synchronized void skipped() {
    done++;
    bar.ifPresent(ProgressBar::step);
  }

  @Override
  public synchronized void close() {
    bar.ifPresent(ProgressBar::close);
    if (bar.isPresent()) {
      err.println();
    }
  }
}
