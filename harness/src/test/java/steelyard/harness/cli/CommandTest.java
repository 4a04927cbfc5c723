package steelyard.harness.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.Statement;
import java.time.Instant;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.harness.process.SubProcess;
import steelyard.results.ledger.Holder;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.Observation;
import steelyard.results.ledger.SweepSummary;

/** The commands from what is typed to what is printed, with real workers. */
class CommandTest {
  private static final Path CARTS =
      Path.of("src/test/resources/steelyard/harness/fixture/carts").toAbsolutePath();

  @TempDir Path folder;

  private record Result(int status, String out, String err) {}

  private static Result run(String... args) {
    StringWriter out = new StringWriter();
    StringWriter err = new StringWriter();
    int status =
        Steelyard.commandLine(new PrintWriter(out, true), new PrintWriter(err, true)).execute(args);
    return new Result(status, out.toString(), err.toString());
  }

  private Result sweep(String yaml) throws IOException {
    Path file = folder.resolve("cart night.yaml");
    Files.writeString(file, yaml);
    return run("sweep", file.toString(), "--ledger", folder.resolve("a ledger").toString());
  }

  private static String carts(String variants, String instance) {
    return """
        name: carts
        family: faulty-cart
        variants: %s
        backends: [sat]
        instances: {folder: "%s", names: [%s]}
        limits: {wall: 20 s, memory: 1 GB}
        """
        .formatted(variants, CARTS, instance);
  }

  @Test
  void a_sweep_runs_is_judged_and_reported_and_is_not_run_again_while_unfinished()
      throws IOException {
    Result first = sweep(carts("[plain, plain+lightest-count]", "even"));
    assertThat(first.err()).contains("models built");
    assertThat(first.status()).as(first.err()).isEqualTo(ExitStatus.OK);
    assertThat(first.out()).contains("plain on sat", "plain+lightest-count on sat", "The page:");
    assertThat(first.out().lines()).allMatch(line -> line.length() <= 80 || line.contains("page"));
    Path page = folder.resolve("a ledger/briefs/carts/brief.html");
    assertThat(page).content().contains("plain+lightest-count on sat").doesNotContain("http://");

    try (Ledger ledger = Ledger.read(folder.resolve("a ledger/runs.db"))) {
      SweepSummary sweep = ledger.plans().sweeps().get(0);
      List<Observation> seen = ledger.observations(sweep.id());
      assertThat(sweep.runs()).isEqualTo(sweep.cells());
      assertThat(seen).allMatch(Observation::proved);
      Result again = run("rerun", seen.get(0).run(), "--ledger", ledgerFolder());
      assertThat(again.status()).as(again.out()).isEqualTo(ExitStatus.OK);
      assertThat(again.out()).contains("the same");
      Result shown = run("show", seen.get(0).run().substring(0, 8), "--ledger", ledgerFolder());
      assertThat(shown.out()).contains("outcome    OPTIMAL, COMPLETED", "check      VALID");
    }
    Result brief = run("brief", "carts", "--ledger", ledgerFolder());
    assertThat(brief.status()).isEqualTo(ExitStatus.OK);
  }

  private String ledgerFolder() {
    return folder.resolve("a ledger").toString();
  }

  @Test
  void an_implied_amendment_that_is_wrong_is_found_by_the_claims_that_contradict_each_other()
      throws IOException {
    Result result = sweep(carts("[plain, plain+average-count]", "uneven"));
    assertThat(result.status()).as(result.out()).isEqualTo(ExitStatus.FINDING);
    assertThat(result.out()).containsIgnoringCase("contradict");
  }

  @Test
  void a_variant_that_throws_or_overflows_costs_its_own_runs_only() throws IOException {
    Result result = sweep(carts("[plain, plain+throws, plain+overflows]", "even"));
    assertThat(result.err())
        .contains("family faulty-cart threw")
        .contains("can pass 2^62 - 1")
        .doesNotContain("\tat ");
    assertThat(result.out()).contains("plain on sat");
  }

  @Test
  void a_variant_that_hangs_is_known_within_the_build_limit() throws IOException {
    Result result =
        sweep(
            carts("[plain, plain+hangs, plain+lightest-count]", "even")
                .replace("wall: 20 s", "build: 2 s, wall: 20 s"));
    assertThat(result.err())
        .contains("plain+hangs")
        .contains("its family took more than 2.0 s to read and build it");
    assertThat(result.out()).contains("plain on sat", "plain+light…-count on sat      1/1      1");
  }

  @Test
  void a_ledger_that_cannot_be_used_is_refused_in_one_line() throws Exception {
    assertThat(sweep(carts("[plain]", "even")).status()).isEqualTo(ExitStatus.OK);
    Path file = folder.resolve("a ledger/runs.db");
    try (Ledger held = Ledger.write(file, new Holder(7, "sweep other", Instant.EPOCH))) {
      assertRefused(sweep(carts("[plain]", "even")), "in use by process 7, sweep other, since");
      assertThat(held.plans().sweeps()).hasSize(1);
    }
    try (Connection connection = DriverManager.getConnection("jdbc:sqlite:" + file);
        Statement statement = connection.createStatement()) {
      statement.execute("PRAGMA user_version = 99");
    }
    assertRefused(sweep(carts("[plain]", "even")), "written by a newer version (schema 99");
    assertRefused(run("brief", "--ledger", ledgerFolder()), "written by a newer version");
    Path sweep = folder.resolve("cart night.yaml");
    assertRefused(
        run("sweep", sweep.toString(), "--ledger", "/proc/ledger"),
        "cannot make the ledger's folder /proc/ledger: ");
    assertRefused(
        run("sweep", sweep.toString(), "--ledger", sweep.toString()),
        "a file stands where a folder is needed");
  }

  private static void assertRefused(Result result, String why) {
    assertThat(result.status()).as(result.err()).isEqualTo(ExitStatus.BAD_INPUT);
    assertThat(result.err()).contains(why).doesNotContain("\tat ");
    assertThat(result.out()).isEmpty();
  }

  @Test
  void an_instance_that_is_none_is_refused_in_one_line() throws IOException {
    Path file = folder.resolve("cart that is none");
    Files.writeString(file, "seven sacks of clay\n");
    assertRefused(
        run("solve", "faulty-cart", file.toString(), "--backend", "sat"), "cart that is none");
    assertRefused(
        run("solve", "faulty-cart", folder.toString(), "--backend", "sat"), "unknown instance");
  }

  @Test
  void solves_in_the_foreground_and_prints_one_json_object() {
    Result result =
        run("solve", "faulty-cart", CARTS.resolve("even").toString(), "--backend", "sat", "--json");
    assertThat(result.status()).as(result.err()).isEqualTo(ExitStatus.OK);
    assertThat(result.out().lines()).hasSize(1);
    assertThat(result.out())
        .contains(
            "\"status\":\"OPTIMAL\"",
            "\"ending\":\"COMPLETED\"",
            "\"check\":\"VALID\"",
            "\"claim\":\"ALONE\"",
            "\"wallSeconds\":",
            "\"counters\":{");
  }

  private static final String SOLVERS =
      """
      name: solvers
      family: faulty-cart
      variants: [plain]
      backends:
        - name: of-debian
          backend: program
          settings:
            one: {command: "%s --seed={seed} {cnf}"}
            two: {command: "%s -s {seed} {cnf}"}
      instances: {folder: "%s", names: [even]}
      limits: {wall: 20 s, memory: 1 GB}
      """;

  @Test
  void a_sweep_compares_solver_programs() throws IOException {
    Assumptions.assumeTrue(SubProcess.find("cadical").isPresent(), "cadical is not installed");
    Assumptions.assumeTrue(SubProcess.find("picosat").isPresent(), "picosat is not installed");
    Result result = sweep(SOLVERS.formatted("cadical", "picosat", CARTS));
    assertThat(result.status()).as(result.err()).isEqualTo(ExitStatus.OK);
    assertThat(result.out()).contains("plain on of-debian/one", "plain on of-debian/two");
    try (Ledger ledger = Ledger.read(folder.resolve("a ledger/runs.db"))) {
      List<Observation> seen = ledger.observations(ledger.plans().sweeps().get(0).id());
      assertThat(seen).hasSize(2).allMatch(Observation::proved);
      assertThat(seen.stream().map(o -> ledger.runs().record(o.run()).backend().version()))
          .doesNotContain("any", "unknown");
      assertThat(seen.stream().map(o -> ledger.runs().record(o.run()).backend().code()))
          .doesNotHaveDuplicates();
      assertThat(ledger.runs().record(seen.get(0).run()).counters()).containsKey("calls");
    }
  }

  @Test
  void a_solver_program_that_is_not_there_isAMistakeAtItsPlace() throws IOException {
    Result result = sweep(SOLVERS.formatted("cadicall", "picosatt", CARTS));
    assertThat(result.status()).isEqualTo(ExitStatus.BAD_INPUT);
    assertThat(result.err())
        .contains("yaml:8:", "program 'cadicall' is not on the search path; install it, or")
        .contains("yaml:9:", "program 'picosatt' is not on the search path");
  }

  static Stream<Arguments> mistakes() {
    String even = CARTS.resolve("even").toString();
    return Stream.of(
        Arguments.of(
            List.of("solve", "faulty-cat", even), "unknown family 'faulty-cat' (did you mean"),
        Arguments.of(
            List.of("solve", "faulty-cart", "no such file", "--backend", "sat"),
            "unknown instance 'no such file'"),
        Arguments.of(
            List.of("solve", "faulty-cart", even, "--backend", "satt"),
            "unknown backend 'satt' (did you mean 'sat'?)"),
        Arguments.of(
            List.of("solve", "faulty-cart", even, "--backend", "sat", "--variant", "plain+thros"),
            "unknown amendment 'thros' (did you mean 'throws'?)"),
        Arguments.of(
            List.of("solve", "faulty-cart", even, "--backend", "sat", "--set", "solver=x"),
            "option solver of sat: 'x' is not one of"),
        Arguments.of(
            List.of("solve", "faulty-cart", even, "--backend", "sat", "--wall", "soon"), "--wall:"),
        Arguments.of(
            List.of("solve", "faulty-cart", even, "--backend", "sat", "--work", "5 lemons"),
            "--work:"),
        Arguments.of(
            List.of("solve", "faulty-cart", even, "--backend", "sat", "--variant", "plain+throws"),
            "family faulty-cart threw"),
        Arguments.of(
            List.of("solve", "faulty-cart", even, "--backend", "sat", "--variant", "plain+exits"),
            "ended without an answer"),
        Arguments.of(
            List.of(
                "solve",
                "faulty-cart",
                even,
                "--backend",
                "sat",
                "--variant",
                "plain+hangs",
                "--build",
                "2s"),
            "reading the instance or building the model took longer than allowed"),
        Arguments.of(
            List.of(
                "solve", "faulty-cart", even, "--backend", "sat", "--variant", "plain+overflows"),
            "can pass 2^62 - 1"),
        Arguments.of(
            List.of(
                "solve",
                "faulty-cart",
                even,
                "--backend",
                "program",
                "--set",
                "command=no-such-solver --seed={seed} {cnf}"),
            "backend program: program 'no-such-solver' is not on the search path"),
        Arguments.of(
            List.of(
                "solve", "faulty-cart", even, "--backend", "program", "--set", "command=cat {cnf}"),
            "the program does not answer a trial formula as the SAT competitions ask: cat: it"),
        Arguments.of(List.of("sweep", "no such.yaml"), "no such file"),
        Arguments.of(List.of("brief", "--ledger", "no ledger"), "there is no ledger"),
        Arguments.of(List.of("show", "abcd", "--ledger", "no ledger"), "there is no ledger"),
        Arguments.of(List.of("weigh"), "Unmatched argument"),
        Arguments.of(List.of(), "a command is missing"));
  }

  @ParameterizedTest
  @MethodSource("mistakes")
  void a_mistake_gets_a_clear_line_and_status_2(List<String> args, String line) {
    Result result = run(args.toArray(String[]::new));
    assertThat(result.err()).contains(line).doesNotContain("\tat ");
    assertThat(result.err().lines().findFirst().orElse("")).isNotBlank();
    assertThat(result.status()).isEqualTo(ExitStatus.BAD_INPUT);
  }

  @Test
  void compares_two_variants_group_by_group() {
    Result result =
        run(
            "compare",
            "plain",
            "plain+lightest-count",
            CARTS.resolve("even").toString(),
            "--family",
            "faulty-cart");
    assertThat(result.status()).as(result.err()).isEqualTo(ExitStatus.OK);
    assertThat(result.out())
        .contains("lightest-count/no more lots than fit: added")
        .containsPattern("0 +1  lightest-count/no more")
        .containsPattern("loaded\\[0\\] \\+ loaded\\[1\\]")
        .contains("(objective): the same")
        .doesNotContain("withdrawn");
    assertThat(run("compare", "plain", "plain", "nowhere").err())
        .contains("no family ships an instance 'nowhere'");
  }

  @Test
  void help_of_every_command_has_examples_and_fits_80_columns() {
    for (String command :
        List.of("sweep", "brief", "list", "lower", "compare", "show", "rerun", "solve")) {
      Result result = run(command, "--help");
      assertThat(result.status()).isEqualTo(ExitStatus.OK);
      assertThat(result.out()).as(command).contains("Examples:", "steelyard " + command);
      assertThat(result.out().lines()).as(command).allMatch(line -> line.length() <= 80);
    }
  }
}
