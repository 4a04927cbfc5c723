package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class ProgressTest {

  private static final String HERE = Sample.NIGHT.machineClass();
  private static final String ELSEWHERE = "glaze-house";

  @TempDir private Path folder;
  private Ledger ledger;
  private Progress progress;

  @BeforeEach
  void open() {
    ledger = Ledger.write(folder.resolve("ledger.db"), LedgerTest.NIGHTLY);
    progress = ledger.progress();
  }

  @AfterEach
  void close() {
    ledger.close();
  }

  @Test
  void holds_a_cell_finished_given_a_run_of_its_block_and_key() {
    plan("sweep-1", "a", "b");
    ledger.runs().collect(Sample.run("run-0").key(Sample.key("a")).record());

    assertThat(progress.finished("sweep-1")).containsExactly(new CellId(0, 0));
  }

  @Test
  void holds_equal_models_of_a_block_finished_by_one_run() {
    plan("sweep-1", "a", "b", "a");
    ledger.runs().collect(Sample.run("run-0").key(Sample.key("a")).record());

    assertThat(progress.finished("sweep-1")).containsExactly(new CellId(0, 0), new CellId(0, 2));
  }

  @Test
  void never_holds_a_cell_finished_by_a_stopped_run() {
    plan("sweep-1", "a");
    ledger.runs().collect(work("run-0", Ending.STOPPED));

    assertThat(progress.finished("sweep-1")).isEmpty();
    assertThat(progress.reusableKeys(HERE)).isEmpty();

    ledger
        .runs()
        .collect(Sample.run("run-1").attempt(1).limits(Sample.WORK).key(Sample.key("a")).record());
    assertThat(progress.finished("sweep-1")).containsExactly(new CellId(0, 0));
    assertThat(progress.reusableKeys(HERE)).containsExactly(Sample.key("a"));
  }

  @Test
  void counts_the_attempts_at_a_cell() {
    plan("sweep-1", "a", "b");
    ledger.runs().collect(work("run-0", Ending.STOPPED));
    ledger.runs().collect(Sample.run("run-1").attempt(1).key(Sample.key("a")).record());

    assertThat(progress.attempts("sweep-1")).containsExactly(Map.entry(new CellId(0, 0), 2));
  }

  @Test
  void reuses_no_run_that_was_limited_by_wall_time() {
    ledger.runs().collect(Sample.run("run-0").key(Sample.key("a")).record());
    plan("sweep-2", "a");

    assertThat(progress.reusableKeys(HERE)).isEmpty();
    assertThat(progress.reuse("sweep-2", HERE)).isZero();
    assertThat(progress.finished("sweep-2")).isEmpty();
  }

  @ParameterizedTest
  @EnumSource(
      value = Ending.class,
      names = {"COMPLETED", "WORK_LIMIT"})
  void reuses_what_ends_alike_everywhere_on_any_machine(Ending ending) {
    ledger.runs().collect(work("run-0", ending));

    assertThat(progress.reusableKeys(HERE)).containsExactly(Sample.key("a"));
    assertThat(progress.reusableKeys(ELSEWHERE)).containsExactly(Sample.key("a"));
  }

  @ParameterizedTest
  @EnumSource(
      value = Ending.class,
      names = {"TIME_LIMIT", "MEMORY_LIMIT", "CRASHED", "UNSUPPORTED"})
  void reuses_what_depends_on_the_machine_on_its_class_only(Ending ending) {
    ledger.runs().collect(work("run-0", ending));
    plan("sweep-2", "a");

    assertThat(progress.reusableKeys(HERE)).containsExactly(Sample.key("a"));
    assertThat(progress.reusableKeys(ELSEWHERE)).isEmpty();
    assertThat(progress.reuse("sweep-2", ELSEWHERE)).isZero();
    assertThat(progress.reuse("sweep-2", HERE)).isOne();
  }

  @Test
  void lets_cells_without_a_run_take_the_latest_reusable_one_once() {
    ledger.runs().collect(work("run-0", Ending.COMPLETED));
    ledger.runs().collect(work("run-1", Ending.COMPLETED));
    plan("sweep-2", "a", "b");

    assertThat(progress.reuse("sweep-2", HERE)).isOne();
    assertThat(progress.reuse("sweep-2", HERE)).isZero();

    assertThat(progress.finished("sweep-2")).containsExactly(new CellId(0, 0));
    assertThat(ledger.observations("sweep-2"))
        .extracting(Observation::run)
        .containsExactly("run-1");
  }

  @Test
  void knows_the_machine_class_by_the_session() {
    Session other =
        new Session(
            "session-2", "0.1.0", ELSEWHERE, new TreeMap<>(), new TreeMap<>(), Sample.MIDNIGHT);
    ledger
        .runs()
        .collect(
            Sample.run("run-0")
                .limits(Sample.WORK)
                .session(other)
                .outcome(Sample.unknown(Ending.MEMORY_LIMIT))
                .record());

    assertThat(progress.reusableKeys(HERE)).isEmpty();
    assertThat(progress.reusableKeys(ELSEWHERE)).hasSize(1);
  }

  private static RunRecord work(String run, Ending ending) {
    return Sample.run(run)
        .at("sweep-1", 0, 0)
        .limits(Sample.WORK)
        .key(Sample.key("a"))
        .outcome(ending == Ending.COMPLETED ? Sample.optimal(40) : Sample.unknown(ending))
        .record();
  }

  private void plan(String sweep, String... keys) {
    List<Cell> cells = new ArrayList<>();
    for (int i = 0; i < keys.length; i++) {
      cells.add(Sample.run("any0").key(Sample.key(keys[i])).cell(i));
    }
    ledger.plans().addSweep(PlansTest.sweep(sweep, "nightly", 0));
    ledger.plans().addBlocks(sweep, List.of(new Block(0, 0, cells)));
  }
}
