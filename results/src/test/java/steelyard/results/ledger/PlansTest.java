package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class PlansTest {

  @TempDir private Path folder;
  private Ledger ledger;
  private Plans plans;

  @BeforeEach
  void open() {
    ledger = Ledger.write(folder.resolve("ledger.db"), LedgerTest.NIGHTLY);
    plans = ledger.plans();
  }

  @AfterEach
  void close() {
    ledger.close();
  }

  @Test
  void gives_a_sweep_and_its_blocks_back() {
    Sweep sweep = sweep("sweep-1", "nightly", 0);
    Block second = new Block(1, 7, List.of(Sample.run("any0").seed(7).instance("week-08").cell(3)));
    Block first =
        new Block(
            0,
            0,
            List.of(
                Sample.run("any0").plain().key(Sample.key("p")).cell(0),
                Sample.run("any0").alias("old").setting("tight").key(Sample.key("q")).cell(1)));
    plans.addSweep(sweep);
    plans.addBlocks("sweep-1", List.of(second, first));

    assertThat(plans.find("sweep-1")).contains(sweep);
    assertThat(plans.blocks("sweep-1")).containsExactly(first, second);
  }

  @Test
  void takes_what_is_there_already_again() {
    Sweep sweep = sweep("sweep-1", "nightly", 0);
    List<Block> blocks = List.of(new Block(0, 0, List.of(Sample.run("any0").cell(0))));
    for (int i = 0; i < 2; i++) {
      plans.addSweep(sweep);
      plans.addBlocks("sweep-1", blocks);
    }

    assertThat(plans.blocks("sweep-1")).isEqualTo(blocks);
  }

  @Test
  void refuses_another_run_at_a_planned_place_and_adds_none_of_the_blocks() {
    plans.addSweep(sweep("sweep-1", "nightly", 0));
    plans.addBlocks("sweep-1", List.of(new Block(0, 0, List.of(Sample.run("any0").cell(0)))));
    Block fresh = new Block(1, 0, List.of(Sample.run("any0").cell(0)));
    Block changed = new Block(0, 0, List.of(Sample.run("any0").key(Sample.key("other")).cell(0)));

    assertThatThrownBy(() -> plans.addBlocks("sweep-1", List.of(fresh, changed)))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith("block 0, position 0: the sweep has another run planned there");
    assertThat(plans.blocks("sweep-1")).hasSize(1);
  }

  @Test
  void refuses_blocks_of_an_unknown_sweep() {
    List<Block> blocks = List.of(new Block(0, 0, List.of(Sample.run("any0").cell(0))));

    assertThatThrownBy(() -> plans.addBlocks("sweep-9", blocks))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith("sweep 'sweep-9' is not in the ledger");
    assertThat(plans.find("sweep-9")).isEmpty();
    assertThat(plans.blocks("sweep-9")).isEmpty();
  }

  @Test
  void finds_the_newest_sweep_of_a_name_whatever_the_order_of_adding() {
    plans.addSweep(sweep("sweep-1", "nightly", 10));
    plans.addSweep(sweep("sweep-3", "nightly", 30));
    plans.addSweep(sweep("sweep-2", "nightly", 20));
    plans.addSweep(sweep("sweep-4", "weekly", 40));

    assertThat(plans.latest("nightly")).map(Sweep::id).contains("sweep-3");
    assertThat(plans.latest("monthly")).isEmpty();
    assertThat(plans.sweeps())
        .extracting(SweepSummary::id)
        .containsExactly("sweep-1", "sweep-2", "sweep-3", "sweep-4");
  }

  @Test
  void sums_a_sweep_up() {
    plans.addSweep(sweep("sweep-1", "nightly", 0));
    plans.addBlocks(
        "sweep-1",
        List.of(
            new Block(
                0,
                0,
                List.of(
                    Sample.run("any0").cell(0),
                    Sample.run("any0").key(Sample.key("b")).cell(1),
                    Sample.run("any0").key(Sample.key("c")).cell(2)))));
    ledger.runs().collect(Sample.run("run-0").record());
    ledger
        .runs()
        .collect(
            Sample.run("run-1")
                .at("sweep-1", 0, 1)
                .key(Sample.key("b"))
                .outcome(Sample.unknown(Ending.STOPPED))
                .record());
    ledger.runs().collect(Sample.run("run-2").at("sweep-0", 0, 0).record());

    Instant end = Sample.MIDNIGHT.plusSeconds(90);
    assertThat(plans.sweeps())
        .containsExactly(
            new SweepSummary(
                "sweep-1", "nightly", Optional.of(Sample.MIDNIGHT), 3, 1, Optional.of(end)),
            new SweepSummary("sweep-0", "nightly", Optional.empty(), 1, 1, Optional.of(end)));
  }

  @Test
  void fills_in_the_plan_given_the_runs_came_first() {
    ledger.runs().collect(Sample.run("run-0").record());
    Sweep sweep = sweep("sweep-1", "nightly", 0);

    plans.addSweep(sweep);

    assertThat(plans.find("sweep-1")).contains(sweep);
    assertThat(plans.blocks("sweep-1"))
        .containsExactly(new Block(0, 0, List.of(Sample.run("any0").cell(0))));
  }

  @Test
  void gives_sessions_and_their_calibrations_back() {
    Sessions sessions = ledger.sessions();
    Calibration before = new Calibration(Sample.MIDNIGHT, 98_000_000, 0, 0);
    Calibration after =
        new Calibration(Sample.MIDNIGHT.plusSeconds(60), 104_000_000, 10_000_000, 3);
    sessions.add(Sample.NIGHT);
    sessions.add(Sample.NIGHT);
    sessions.addCalibration(Sample.NIGHT.id(), before);
    sessions.addCalibration(Sample.NIGHT.id(), after);

    assertThat(sessions.find(Sample.NIGHT.id())).contains(Sample.NIGHT);
    assertThat(sessions.calibrations(Sample.NIGHT.id())).containsExactly(before, after);
    assertThat(sessions.of("sweep-1")).isEmpty();
    ledger.runs().collect(Sample.run("run-0").record());
    assertThat(sessions.of("sweep-1")).containsExactly(Sample.NIGHT);
    assertThat(sessions.find("session-9")).isEmpty();
    assertThatThrownBy(() -> sessions.addCalibration("session-9", before))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith("session 'session-9' is not in the ledger");
  }

  static Sweep sweep(String id, String name, int minutes) {
    return new Sweep(
        id,
        name,
        Sample.MIDNIGHT.plusSeconds(60L * minutes),
        Sample.digest("plan of " + name),
        Optional.of("plain on cpsat"),
        "sweep: " + name + "\n");
  }
}
