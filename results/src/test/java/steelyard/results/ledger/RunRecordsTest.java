package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.TreeMap;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class RunRecordsTest {

  @TempDir private Path folder;

  @Test
  void reads_what_was_written() {
    RunRecord record = Sample.run("3fa2c9d1").record();

    Path file = RunRecords.write(folder, record);

    assertThat(file).hasFileName("record.json");
    assertThat(RunRecords.read(file)).isEqualTo(record);
  }

  @Test
  void reads_what_was_written_given_extreme_values() {
    RunRecord record = extreme();

    assertThat(RunRecords.read(RunRecords.write(folder, record))).isEqualTo(record);
    assertThat(RunRecords.fromJson(RunRecords.toJson(record), "text")).isEqualTo(record);
  }

  @Test
  void leaves_nothing_beside_the_record_and_replaces_an_unfinished_one() throws IOException {
    Files.writeString(folder.resolve("record.json.tmp"), "{\"form\":1,\"rec");

    RunRecords.write(folder, Sample.run("3fa2c9d1").record());

    try (var files = Files.list(folder)) {
      assertThat(files).containsExactly(folder.resolve("record.json"));
    }
  }

  @Test
  void writes_ascii_only_whatever_the_text_holds() throws IOException {
    Path file = RunRecords.write(folder, extreme());

    assertThat(StandardCharsets.US_ASCII.newEncoder().canEncode(Files.readString(file))).isTrue();
  }

  @Test
  void exports_integers_beyond_2_to_the_53_as_strings_and_others_as_numbers() {
    long exact = 1L << 53;
    RunRecord record =
        Sample.run("3fa2c9d1")
            .counters(
                SortedMapOf.counters(
                    "a", exact, "b", exact + 1, "c", -exact, "d", -exact - 1, "e", Long.MIN_VALUE))
            .outcome(Sample.optimal((1L << 62) - 1))
            .record();

    assertThat(RunRecords.export(record))
        .contains("\"a\" : 9007199254740992,")
        .contains("\"b\" : \"9007199254740993\"")
        .contains("\"c\" : -9007199254740992,")
        .contains("\"d\" : \"-9007199254740993\"")
        .contains("\"e\" : \"-9223372036854775808\"")
        .contains("\"objective\" : \"4611686018427387903\"");
    assertThat(RunRecords.toJson(record)).contains("\"objective\":4611686018427387903");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          "seed":0            | "sede":0                | record.conditions.seed: missing
          "seed":0            | "seed":0,"sede":1       | unknown property 'sede'
          "seed":0            | "seed":"0"              | record.conditions.seed
          "seed":0            | "seed":3.7              | record.conditions.seed
          "seed":0            | "seed":null             | record.conditions.seed: missing, or null
          "seed":0            | "seed":0,"seed":1       | seed
          "seed":0            | "seed":9223372036854775808 | seed
          "attempt":0,        |                         | attempt
          "variables":48      | "variables":-48         | variables and postings must be at least 0
          "status":"OPTIMAL"  | "status":"BEST"         | BEST
          "status":"OPTIMAL"  | "status":0              | status
          "status":"OPTIMAL"  | "status":"UNKNOWN"      | a run that is UNKNOWN has no objective
          "run":"3fa2c9d1"    | "run":"../3fa2c9d1"     | run must be 4 to 64 lowercase letters
          "disturbed":false   | "disturbed":"no"        | disturbed
          "decisions":120     | "decisions":null        | decisions
          2026-03-02T00:01:30 | yesterday               | yesterday
          """)
  void refuses_a_record_that_is_not_exactly_one_given_an_edit(
      String old, String edited, String expected) {
    String json = RunRecords.toJson(Sample.run("3fa2c9d1").record());
    assertThat(json).contains(old);

    String broken = json.replace(old, edited == null ? "" : edited);

    assertThatThrownBy(() -> RunRecords.fromJson(broken, "runs/3fa2c9d1/record.json"))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith("runs/3fa2c9d1/record.json: not a run's record: line 1: ")
        .hasMessageContaining(expected)
        .hasMessageNotContaining("\n");
  }

  @Test
  void refuses_a_torn_record_and_one_with_something_behind_it() {
    String json = RunRecords.toJson(Sample.run("3fa2c9d1").record());

    assertThatThrownBy(() -> RunRecords.fromJson(json.substring(0, 500), "torn"))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith("torn: not a run's record: line 1: ");
    assertThatThrownBy(() -> RunRecords.fromJson(json + "{}", "two"))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith("two: not a run's record: line 1: ");
    assertThatThrownBy(() -> RunRecords.fromJson("", "empty")).isInstanceOf(LedgerProblem.class);
    assertThatThrownBy(() -> RunRecords.fromJson("null", "null")).isInstanceOf(LedgerProblem.class);
  }

  @Test
  void says_which_version_wrote_it_given_a_newer_form() {
    String json =
        RunRecords.toJson(Sample.run("3fa2c9d1").record())
            .replace("\"form\":1", "\"form\":2")
            .replace("\"attempt\"", "\"renamed\"");

    assertThatThrownBy(() -> RunRecords.fromJson(json, "record"))
        .hasMessageStartingWith("record: record of form 2, this version reads up to form 1");
  }

  @Test
  void says_so_given_no_file_or_no_folder() {
    assertThatThrownBy(() -> RunRecords.read(folder.resolve("record.json")))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageContaining("there is no record");
    RunRecord record = Sample.run("3fa2c9d1").record();
    assertThatThrownBy(() -> RunRecords.write(folder.resolve("absent"), record))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageContaining("absent/record.json: the run's record cannot be written: no such");
  }

  private static RunRecord extreme() {
    TreeMap<Times.Phase, Times.Span> phases = new TreeMap<>();
    for (Times.Phase phase : Times.Phase.values()) {
      phases.put(phase, new Times.Span(Long.MAX_VALUE, OptionalLong.of(0)));
    }
    String nasty = "\u0000\t\"\\\u2028 \ud83d\udd25 lone \ud83d";
    TreeMap<String, ModelFacts.Group> groups = new TreeMap<>();
    String odd = "\"\\ \ud83d\udd25 ü";
    groups.put(odd, new ModelFacts.Group(Sample.digest("g"), 0));
    return new RunRecord(
        "0".repeat(64),
        new RunKey(Long.MIN_VALUE, -1),
        Integer.MAX_VALUE,
        Optional.of(new Place("swee", odd, Integer.MAX_VALUE, Integer.MAX_VALUE)),
        new Recipe(
            "firing",
            Optional.of("old"),
            Digest.of(new byte[16]),
            new Recipe.Instance(odd, "", Digest.of(new byte[64]), "-", Double.MIN_VALUE),
            List.of(),
            "plain"),
        Optional.of(
            new ModelFacts(
                Sample.digest("a"),
                Sample.digest("b"),
                Sample.digest("c"),
                Sample.digest("d"),
                Integer.MAX_VALUE,
                Integer.MAX_VALUE,
                groups)),
        new BackendBuild("b", "a", "", Sample.digest("e")),
        new Setting("s", new TreeMap<>()),
        new Conditions(
            Long.MIN_VALUE,
            Integer.MAX_VALUE,
            Goal.enumerate(List.of(nasty), Long.MAX_VALUE),
            new Limits(
                Double.MAX_VALUE,
                Optional.of(new Limits.Work("units", Double.MIN_VALUE)),
                Long.MAX_VALUE),
            new TreeSet<>(List.of("drup")),
            Conditions.Mode.WARM),
        new Session("session-1", "", "m", new TreeMap<>(), new TreeMap<>(), Instant.MIN),
        new Times(phases, Long.MAX_VALUE),
        new Outcome(
            Status.FEASIBLE,
            Ending.CRASHED,
            Optional.of(""),
            Optional.of(nasty),
            Optional.of("x".repeat(10_000)),
            false,
            OptionalLong.of(Long.MIN_VALUE),
            OptionalLong.of(Long.MAX_VALUE)),
        new PeakMemory(Long.MAX_VALUE, "none"),
        SortedMapOf.counters("", Long.MIN_VALUE, nasty, Long.MAX_VALUE),
        Optional.empty(),
        new Trace(
            Long.MAX_VALUE,
            List.of(
                new Trace.Solution(
                    Long.MIN_VALUE,
                    OptionalLong.empty(),
                    Decisions.of(Integer.MIN_VALUE, Integer.MAX_VALUE)),
                new Trace.Solution(0, OptionalLong.of(Long.MAX_VALUE), Decisions.of())),
            Long.MAX_VALUE,
            List.of(new Trace.Bound(Long.MAX_VALUE, Long.MIN_VALUE))),
        new Exit(OptionalInt.of(Integer.MIN_VALUE), nasty.repeat(2_000)),
        true,
        Instant.MAX);
  }
}
