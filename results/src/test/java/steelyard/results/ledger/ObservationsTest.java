package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import java.util.OptionalLong;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ObservationsTest {

  private static final Digest JUDGE = Sample.digest("judge");

  @TempDir private Path folder;
  private Ledger ledger;

  @BeforeEach
  void open() {
    ledger = Ledger.write(folder.resolve("ledger.db"), LedgerTest.NIGHTLY);
  }

  @AfterEach
  void close() {
    ledger.close();
  }

  @Test
  void say_everything_that_record_and_plan_say() {
    RunRecord record =
        Sample.run("3fa2c9d1").at("sweep-1", 4, 2).seed(11).alias("old").disturbed().record();
    ledger.runs().collect(record);

    assertThat(ledger.observations("sweep-1"))
        .containsExactly(
            new Observation(
                "3fa2c9d1",
                "firing",
                "week-07",
                "winter",
                2.5,
                "plain+load-bound@old",
                "cpsat",
                "default",
                11,
                4,
                record.model().orElseThrow().asBuilt().hex()
                    + record.model().orElseThrow().search().hex(),
                0.5,
                Sample.MINUTE,
                Status.OPTIMAL,
                Ending.COMPLETED,
                Check.UNCHECKED,
                Claim.ALONE,
                true,
                OptionalLong.of(40),
                OptionalLong.of(40),
                123_456_789,
                true));
  }

  @Test
  void are_empty_for_an_unknown_sweep_and_pass_over_cells_without_a_run() {
    ledger.plans().addSweep(PlansTest.sweep("sweep-1", "nightly", 0));
    ledger
        .plans()
        .addBlocks("sweep-1", List.of(new Block(0, 0, List.of(Sample.run("any0").cell(0)))));

    assertThat(ledger.observations("sweep-1")).isEmpty();
    assertThat(ledger.observations("sweep-9")).isEmpty();
  }

  @Test
  void come_in_planned_order_whatever_the_order_of_running() {
    ledger.runs().collect(run("run-2", 1, 0, "c").record());
    ledger.runs().collect(run("run-1", 0, 1, "b").record());
    ledger.runs().collect(run("run-0", 0, 0, "a").record());

    assertThat(runs("sweep-1")).containsExactly("run-0", "run-1", "run-2");
  }

  @Test
  void are_censored_at_the_wall_limit() {
    ledger.runs().collect(run("run-0", 0, 0, "a").times(Sample.times(60_300_000_000L)).record());

    assertThat(ledger.observations("sweep-1")).first().returns(60.0, Observation::seconds);
  }

  @Test
  void leave_foreground_runs_out() {
    ledger.runs().collect(run("run-0", 0, 0, "a").record());
    ledger.runs().collect(Sample.run("run-1").key(Sample.key("a")).inForeground().record());

    assertThat(runs("sweep-1")).containsExactly("run-0");
  }

  @Test
  void take_the_latest_attempt_that_was_not_stopped() {
    ledger.runs().collect(run("run-0", 0, 0, "a").record());
    ledger.runs().collect(run("run-1", 0, 0, "a").attempt(1).record());
    ledger
        .runs()
        .collect(
            run("run-2", 0, 0, "a").attempt(2).outcome(Sample.unknown(Ending.STOPPED)).record());

    assertThat(runs("sweep-1")).containsExactly("run-1");
  }

  @Test
  void take_an_undisturbed_attempt_before_a_disturbed_one() {
    ledger.runs().collect(run("run-0", 0, 0, "a").record());
    ledger.runs().collect(run("run-1", 0, 0, "a").attempt(1).disturbed().record());

    assertThat(runs("sweep-1")).containsExactly("run-0");
  }

  @Test
  void book_the_run_of_an_equal_model_in_the_block_unless_a_cell_has_its_own() {
    ledger.plans().addSweep(PlansTest.sweep("sweep-1", "nightly", 0));
    ledger
        .plans()
        .addBlocks(
            "sweep-1",
            List.of(
                new Block(
                    0,
                    0,
                    List.of(
                        run("any0", 0, 0, "a").plain().cell(0), run("any0", 0, 1, "a").cell(1))),
                new Block(1, 0, List.of(run("any0", 1, 0, "a").cell(0)))));
    ledger.runs().collect(run("run-0", 0, 0, "a").plain().record());

    assertThat(ledger.observations("sweep-1"))
        .extracting(Observation::run, Observation::variant, Observation::block)
        .containsExactly(
            org.assertj.core.groups.Tuple.tuple("run-0", "plain", 0),
            org.assertj.core.groups.Tuple.tuple("run-0", "plain+load-bound", 0));

    ledger.runs().collect(run("run-1", 0, 1, "a").record());
    assertThat(runs("sweep-1")).containsExactly("run-0", "run-1");
  }

  @Test
  void never_hold_two_runs_that_built_nothing_for_equal_models() {
    Outcome crashed = Sample.unknown(Ending.CRASHED);
    ledger.runs().collect(run("run-0", 0, 0, "a").unbuilt().outcome(crashed).record());
    ledger.runs().collect(run("run-1", 0, 1, "b").unbuilt().outcome(crashed).record());

    assertThat(ledger.observations("sweep-1"))
        .allMatch(o -> o.claim() == Claim.NONE)
        .extracting(Observation::model)
        .doesNotHaveDuplicates();
  }

  @Test
  void carry_the_newest_verdict() {
    ledger.runs().collect(run("run-0", 0, 0, "a").record());
    ledger.runs().collect(run("run-1", 0, 1, "b").record());
    judge("run-0", Check.INVALID);
    judge("run-0", Check.VALID);

    assertThat(ledger.observations("sweep-1"))
        .extracting(Observation::check)
        .containsExactly(Check.VALID, Check.UNCHECKED);
  }

  @Test
  void weigh_claims_across_sweeps_variants_and_foreground_runs_of_the_same_problem() {
    ledger.runs().collect(run("run-0", 0, 0, "a").record());
    ledger.runs().collect(Sample.run("run-1").at("sweep-2", 0, 0).backend("sat").plain().record());
    ledger.runs().collect(Sample.run("run-2").inForeground().backend("engine").record());

    assertThat(claims("sweep-1")).containsExactly(Claim.AGREED);
    assertThat(ledger.judging().standing("run-0")).isEqualTo(new Standing(Claim.AGREED, 2));
    assertThat(ledger.judging().standing("run-2")).isEqualTo(new Standing(Claim.AGREED, 2));
  }

  @Test
  void keep_claims_about_other_instances_and_other_plain_models_apart() {
    ledger.runs().collect(run("run-0", 0, 0, "a").record());
    ledger
        .runs()
        .collect(
            run("run-1", 1, 0, "b")
                .backend("sat")
                .instance("week-08")
                .outcome(Sample.optimal(99))
                .record());
    ledger
        .runs()
        .collect(
            run("run-2", 2, 0, "c")
                .backend("sat")
                .code("new code")
                .outcome(Sample.optimal(98))
                .record());

    assertThat(claims("sweep-1")).containsOnly(Claim.ALONE);
  }

  @Test
  void hold_instances_of_equal_content_for_one_problem_whatever_their_names() {
    ledger.runs().collect(run("run-0", 0, 0, "a").record());
    ledger
        .runs()
        .collect(
            run("run-1", 1, 0, "b").backend("sat").instance("week-07-copy", "week-07").record());

    assertThat(claims("sweep-1")).containsExactly(Claim.AGREED, Claim.AGREED);
  }

  @Test
  void show_a_contradiction_once_a_witness_is_judged() {
    ledger.runs().collect(run("run-0", 0, 0, "a").record());
    ledger
        .runs()
        .collect(run("run-1", 0, 1, "b").backend("sat").outcome(Sample.feasible(39)).record());
    assertThat(claims("sweep-1")).containsExactly(Claim.ALONE, Claim.NONE);

    judge("run-1", Check.VALID);

    assertThat(claims("sweep-1")).containsExactly(Claim.CONTRADICTED, Claim.NONE);
  }

  @Test
  void weigh_a_reused_run_in_the_problem_that_it_is_booked_for() {
    Sample before =
        Sample.run("run-0")
            .at("sweep-1", 0, 0)
            .limits(Sample.WORK)
            .instance("week-07", "with a comment");
    ledger.runs().collect(before.record());
    RunRecord there =
        Sample.run("run-1")
            .at("sweep-2", 0, 1)
            .backend("sat")
            .key(Sample.key("b"))
            .outcome(Sample.optimal(41))
            .record();
    ledger.plans().addSweep(PlansTest.sweep("sweep-2", "nightly", 0));
    ledger
        .plans()
        .addBlocks("sweep-2", List.of(new Block(0, 0, List.of(Sample.run("any0").cell(0)))));
    ledger
        .models()
        .remember(
            Sample.run("any0").recipe().key(), Models.Memo.built(there.model().orElseThrow()));
    assertThat(ledger.progress().reuse("sweep-2", Sample.NIGHT.machineClass())).isOne();
    ledger.runs().collect(there);

    assertThat(claims("sweep-2")).containsExactly(Claim.CONTRADICTED, Claim.CONTRADICTED);
    assertThat(claims("sweep-1")).containsExactly(Claim.ALONE);
  }

  @Test
  void name_what_was_never_judged() {
    ledger.runs().collect(run("run-0", 0, 0, "a").record());
    ledger.runs().collect(run("run-1", 0, 1, "b").outcome(Sample.feasible(50)).record());
    ledger.runs().collect(run("run-2", 0, 2, "c").outcome(Sample.infeasible()).record());
    ledger.runs().collect(Sample.run("run-3").inForeground().record());
    judge("run-0", Check.VALID);

    assertThat(ledger.judging().unjudged("sweep-1", JUDGE)).containsExactly("run-1");
    assertThat(ledger.judging().unjudged("sweep-1", Sample.digest("newer judge")))
        .containsExactly("run-0", "run-1");
    assertThat(ledger.judging().verdicts("run-0")).hasSize(1);
  }

  private static Sample run(String id, int block, int position, String key) {
    return Sample.run(id).at("sweep-1", block, position).key(Sample.key(key));
  }

  private void judge(String run, Check check) {
    ledger.judging().add(new Verdict(run, JUDGE, check, "", Sample.MIDNIGHT));
  }

  private List<String> runs(String sweep) {
    return ledger.observations(sweep).stream().map(Observation::run).toList();
  }

  private List<Claim> claims(String sweep) {
    return ledger.observations(sweep).stream().map(Observation::claim).toList();
  }
}
