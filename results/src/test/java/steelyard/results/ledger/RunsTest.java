package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class RunsTest {

  @TempDir private Path folder;
  private Ledger ledger;
  private Runs runs;

  @BeforeEach
  void open() {
    ledger = Ledger.write(folder.resolve("ledger.db"), LedgerTest.NIGHTLY);
    runs = ledger.runs();
  }

  @AfterEach
  void close() {
    ledger.close();
  }

  @Test
  void collects_a_run_once() {
    RunRecord record = Sample.run("3fa2c9d1").record();

    assertThat(runs.collect(record)).isTrue();
    assertThat(runs.collect(record)).isFalse();

    assertThat(ledger.plans().sweeps()).hasSize(1).first().returns(1L, SweepSummary::runs);
  }

  @Test
  void gives_the_whole_record_back() {
    RunRecord built = Sample.run("3fa2c9d1").record();
    RunRecord unbuilt =
        Sample.run("77b0")
            .inForeground()
            .unbuilt()
            .outcome(Sample.unknown(Ending.CRASHED))
            .record();
    runs.collect(built);
    runs.collect(unbuilt);

    assertThat(runs.record("3fa2c9d1")).isEqualTo(built);
    assertThat(runs.record("77b0")).isEqualTo(unbuilt);
  }

  @Test
  void gives_the_whole_record_back_whatever_session_it_is_of() {
    Session later =
        new Session(
            "session-2",
            "0.1.0",
            "kiln-house",
            Sample.NIGHT.machine(),
            Sample.NIGHT.launch(),
            Sample.MIDNIGHT.plusSeconds(86_400));
    List<RunRecord> records = new ArrayList<>();
    for (int i = 0; i < 6; i++) {
      records.add(
          Sample.run("run-" + i).seed(i).session(i % 2 == 0 ? Sample.NIGHT : later).record());
    }
    records.forEach(runs::collect);

    assertThat(records).allSatisfy(r -> assertThat(runs.record(r.run())).isEqualTo(r));
  }

  @Test
  void keeps_the_first_given_another_run_of_the_same_id() {
    RunRecord first = Sample.run("3fa2c9d1").record();
    runs.collect(first);

    assertThatThrownBy(() -> runs.collect(Sample.run("3fa2c9d1").seed(5).record()))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith("run 3fa2c9d1: the ledger has another run of this id; ");
    assertThat(runs.record("3fa2c9d1")).isEqualTo(first);
  }

  @Test
  void resolves_a_unique_beginning() {
    runs.collect(Sample.run("3fa2c9d1").record());
    runs.collect(Sample.run("3fb0c9d1").record());

    assertThat(runs.resolve("3fa")).isEqualTo("3fa2c9d1");
    assertThat(runs.resolve("3fb0c9d1")).isEqualTo("3fb0c9d1");
  }

  @Test
  void resolves_a_whole_id_although_another_begins_with_it() {
    runs.collect(Sample.run("3fa2c9d1").record());
    runs.collect(Sample.run("3fa2").record());

    assertThat(runs.resolve("3fa2")).isEqualTo("3fa2");
  }

  @Test
  void lists_what_an_ambiguous_beginning_may_mean() {
    for (int i = 10; i < 19; i++) {
      runs.collect(Sample.run("3fa2-" + i).record());
    }

    assertThatThrownBy(() -> runs.resolve("3fa2"))
        .isInstanceOf(LedgerProblem.class)
        .hasMessage(
            "several runs' ids begin with '3fa2': 3fa2-10, 3fa2-11, 3fa2-12, 3fa2-13, 3fa2-14,"
                + " 3fa2-15, 3fa2-16, 3fa2-17 and more; give more of it");
    runs.collect(Sample.run("77b0-1").record());
    runs.collect(Sample.run("77b0-2").record());
    assertThatThrownBy(() -> runs.record("7"))
        .hasMessage("several runs' ids begin with '7': 77b0-1, 77b0-2; give more of it");
  }

  @Test
  void says_so_given_a_beginning_of_no_run() {
    assertThatThrownBy(() -> runs.record("3fa%"))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageContaining("ledger.db: no run's id begins with '3fa%'");
  }

  @Test
  void keeps_two_group_lists_of_one_model_apart() {
    RunRecord first = Sample.run("3fa2c9d1").record();
    ModelFacts one = first.model().orElseThrow();
    ModelFacts other =
        new ModelFacts(
            one.asBuilt(),
            one.search(),
            one.canonical(),
            one.plainCanonical(),
            one.variables(),
            one.postings(),
            Sample.model("week-07", "kiln-order").groups());
    RunRecord second = Sample.run("77b0").amendments("kiln-order").model(other).record();
    runs.collect(first);
    runs.collect(second);

    assertThat(ledger.models().find(first.recipe().key())).contains(Models.Memo.built(one));
    assertThat(ledger.models().find(second.recipe().key())).contains(Models.Memo.built(other));
  }
}
