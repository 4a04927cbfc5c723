package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CollectorTest {

  @TempDir private Path folder;
  private Path runs;
  private Ledger ledger;

  @BeforeEach
  void open() throws IOException {
    runs = Files.createDirectory(folder.resolve("runs"));
    ledger = Ledger.write(folder.resolve("ledger.db"), LedgerTest.NIGHTLY);
  }

  @AfterEach
  void close() {
    ledger.close();
  }

  @Test
  void collects_what_is_finished_and_names_the_folders() throws IOException {
    Path first = write("run-0");
    Path second = write("run-1");

    Collector.Collected collected = new Collector(ledger).collect(runs);

    assertThat(collected.fresh()).isEqualTo(2);
    assertThat(collected.collected()).containsExactly(first, second);
    assertThat(collected.problems()).isEmpty();
    assertThat(ledger.runs().record("run-1").run()).isEqualTo("run-1");
  }

  @Test
  void collects_once_given_it_was_killed_before_the_folders_were_removed() throws IOException {
    Path first = write("run-0");
    new Collector(ledger).collect(runs);
    Path second = write("run-1");

    Collector.Collected again = new Collector(ledger).collect(runs);

    assertThat(again.fresh()).isOne();
    assertThat(again.collected()).containsExactly(first, second);
  }

  @Test
  void collects_a_record_that_was_written_before_the_harness_was_killed() throws IOException {
    write("run-0");
    ledger.close();
    ledger = Ledger.write(folder.resolve("ledger.db"), LedgerTest.NIGHTLY);

    assertThat(new Collector(ledger).collect(runs).fresh()).isOne();
  }

  @Test
  void passes_over_runs_that_have_not_finished() throws IOException {
    Path unfinished = Files.createDirectory(runs.resolve("run-0"));
    Files.writeString(unfinished.resolve("record.json.tmp"), "{\"form\":1,\"record\":{\"ru");
    Files.createFile(runs.resolve("note.txt"));
    Files.createDirectory(runs.resolve("run-1"));

    Collector.Collected collected = new Collector(ledger).collect(runs);

    assertThat(collected.collected()).isEmpty();
    assertThat(collected.problems()).isEmpty();
  }

  @Test
  void tells_of_records_that_cannot_be_read_and_collects_the_others() throws IOException {
    Path torn = Files.createDirectory(runs.resolve("run-0"));
    Files.writeString(torn.resolve("record.json"), "{\"form\":1,\"record\":{\"ru");
    Path good = write("run-1");
    Path misnamed = Files.createDirectory(runs.resolve("run-2"));
    RunRecords.write(misnamed, Sample.run("run-7").record());

    Collector.Collected collected = new Collector(ledger).collect(runs);

    assertThat(collected.collected()).containsExactly(good);
    assertThat(collected.problems()).hasSize(2);
    assertThat(collected.problems().get(0))
        .startsWith(torn.resolve("record.json") + ": not a run's record: ");
    assertThat(collected.problems().get(1))
        .startsWith(misnamed.resolve("record.json") + ": is the record of run run-7; ");
  }

  @Test
  void tells_of_an_id_that_another_run_has_and_collects_the_others() throws IOException {
    ledger.runs().collect(Sample.run("run-0").seed(5).record());
    Path taken = write("run-0");
    Path good = write("run-1");

    Collector.Collected collected = new Collector(ledger).collect(runs);

    assertThat(collected.fresh()).isOne();
    assertThat(collected.collected()).containsExactly(good).doesNotContain(taken);
    assertThat(collected.problems())
        .containsExactly(
            "run run-0: the ledger has another run of this id; check where the record came from;"
                + " neither of the two was touched");
  }

  @Test
  void collects_more_than_one_transaction_holds() throws IOException {
    for (int i = 1_000; i < 1_450; i++) {
      write("run-" + i);
    }

    assertThat(new Collector(ledger).collect(runs).fresh()).isEqualTo(450);
    assertThat(new Collector(ledger).collect(runs).collected()).hasSize(450);
  }

  @Test
  void says_so_given_no_folder() {
    Path absent = folder.resolve("absent");

    assertThatThrownBy(() -> new Collector(ledger).collect(absent))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith(absent + ": no such folder or file; ");
  }

  private Path write(String run) throws IOException {
    Path own = Files.createDirectory(runs.resolve(run));
    RunRecords.write(own, Sample.run(run).record());
    return own;
  }
}
