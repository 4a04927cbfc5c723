package steelyard.harness.sweep;

import static java.util.stream.Collectors.joining;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import steelyard.harness.sweep.text.SweepProblem;

class SweepMistakesTests {

  @TempDir Path folder;

  private static final String GOOD =
      """
      name: short
      family: kiln
      variants: plain
      backends: [sat, cpsat]
      """;

  private List<String> linesOf(String yaml) {
    return shown(catchThrowableOfType(SweepProblem.class, () -> Samples.read(folder, yaml)));
  }

  private List<String> shown(SweepProblem problem) {
    return problem.lines().stream().map(line -> line.replace(folder + "/", "")).toList();
  }

  private List<String> linesOf(byte[] bytes) throws IOException {
    Path file = Files.write(folder.resolve("sweep.yaml"), bytes);
    return shown(
        catchThrowableOfType(SweepProblem.class, () -> SweepFile.read(file, Samples.catalogue())));
  }

  /** The good file with one line replaced, and more lines at its end. */
  private List<String> with(String key, String line, String... more) {
    String changed = GOOD.replaceFirst("(?m)^" + key + ":.*$", key + ": " + line);
    return linesOf(changed + String.join("\n", more) + "\n");
  }

  private List<String> withMore(String... more) {
    return linesOf(GOOD + String.join("\n", more) + "\n");
  }

  // The file as a whole

  @Test
  void refuses_whatIsNotThere() {
    SweepProblem problem =
        catchThrowableOfType(
            SweepProblem.class,
            () -> SweepFile.read(folder.resolve("sweep.yaml"), Samples.catalogue()));
    assertThat(shown(problem)).containsExactly("sweep.yaml: no such file");
  }

  @Test
  void refuses_aFolder() {
    SweepProblem problem =
        catchThrowableOfType(SweepProblem.class, () -> SweepFile.read(folder, Samples.catalogue()));
    assertThat(problem.lines()).containsExactly(folder + ": is a folder, not a file");
  }

  @Test
  void refuses_anEmptyFile() {
    assertThat(linesOf("")).containsExactly("sweep.yaml: is empty");
    assertThat(linesOf("# later\n\n")).containsExactly("sweep.yaml: is empty");
  }

  @Test
  void refuses_whatHasNoKeys() {
    assertThat(linesOf("sweep\n"))
        .containsExactly("sweep.yaml:1:1: expected keys with values, found 'sweep'");
    assertThat(linesOf("---\n"))
        .containsExactly("sweep.yaml:2:1: expected keys with values, found nothing");
    assertThat(linesOf("- name: x\n"))
        .containsExactly("sweep.yaml:1:1: expected keys with values, found a list");
  }

  @Test
  void refuses_aLargeFile() {
    assertThat(linesOf(GOOD + "#".repeat(1_000_000)))
        .containsExactly("sweep.yaml: is larger than 1000 kB; is this the file?");
  }

  @Test
  void refuses_whatIsNotUtf8() throws IOException {
    assertThat(linesOf((GOOD + "notes: Töpferei\n").getBytes(StandardCharsets.ISO_8859_1)))
        .containsExactly("sweep.yaml:5: not UTF-8 text; save the file as UTF-8");
    assertThat(linesOf((GOOD + "notes: é").getBytes(StandardCharsets.ISO_8859_1)))
        .containsExactly("sweep.yaml:5: not UTF-8 text; save the file as UTF-8");
  }

  @Test
  void refuses_controlCharacters() {
    assertThat(withMore("notes: a\u0007b"))
        .containsExactly("sweep.yaml:5: a control character (U+0007) does not belong here");
  }

  @Test
  void refuses_tabs() {
    assertThat(withMore("limits:", "\twall: 10 s"))
        .containsExactly("sweep.yaml:6:1: a tab indents this line; YAML takes spaces only");
  }

  @Test
  void refuses_whatIsNotYaml() {
    assertThat(with("backends", "[sat, cpsat"))
        .containsExactly(
            "sweep.yaml:6:1: not YAML: expected ',' or ']', but got <stream end> (while parsing a flow sequence that starts in line 4)");
    assertThat(withMore("seeds: 3: 4"))
        .containsExactly("sweep.yaml:5:9: not YAML: mapping values are not allowed here");
  }

  @Test
  void refuses_aSecondDocument() {
    assertThat(withMore("---", "name: other"))
        .containsExactly(
            "sweep.yaml:5:1: a second document starts here; one file holds one document");
  }

  @Test
  void refuses_anchorsAliasesAndTags() {
    assertThat(withMore("seeds: &s [1, 2]"))
        .containsExactly("sweep.yaml:5:8: anchors are not taken here; drop &s");
    assertThat(withMore("seeds: *s"))
        .containsExactly("sweep.yaml:5:8: aliases are not taken here; write the value out for *s");
    assertThat(withMore("seeds: !!int 3"))
        .containsExactly("sweep.yaml:5:8: tags are not taken here; drop 'tag:yaml.org,2002:int'");
  }

  @Test
  void refuses_depth() {
    assertThat(withMore("seeds: " + "[".repeat(100) + "]".repeat(100)))
        .containsExactly("sweep.yaml:5:28: nested more than 20 deep");
  }

  @Test
  void refuses_keysThatAreNoWords() {
    assertThat(withMore("[a]: 3")).containsExactly("sweep.yaml:5:1: a key must be a word");
    assertThat(withMore("~: 3")).containsExactly("sweep.yaml:5:1: a key must be a word");
  }

  // Keys

  @Test
  void names_everyMissingKey() {
    assertThat(linesOf("seeds: 3\n"))
        .containsExactly(
            "sweep.yaml:1:1: missing key 'name'",
            "  for example: name: mould-shop-formulations",
            "sweep.yaml:1:1: missing key 'backends'",
            "  for example: backends: [sat, cpsat]",
            "sweep.yaml:1:1: missing key 'family'",
            "  for example: family: workshop",
            "sweep.yaml:1:1: missing key 'variants'",
            "  for example: variants: {one-at-a-time: all}");
  }

  @Test
  void suggests_theKeyThatWasMeant() {
    assertThat(withMore("sede: 3"))
        .containsExactly(
            "sweep.yaml:5:1: unknown key 'sede' (did you mean 'seeds'?)",
            "  known: name, notes, family-jars, families, backends, seeds, limits, tie-margin, penalty,"
                + " cores, block-size, family and 4 more");
    assertThat(withMore("limits:", "  wall: 3 s", "  memmory: 1 GB"))
        .containsExactly(
            "sweep.yaml:7:3: limits: unknown key 'memmory' (did you mean 'memory'?)",
            "  known: wall, work, memory, threads, build");
  }

  @Test
  void refuses_aKeyThatComesTwice() {
    assertThat(withMore("limits:", "  wall: 3 s", "  wall: 4 s"))
        .containsExactly("sweep.yaml:7:3: limits.wall: written twice; first in line 6");
  }

  @Test
  void refuses_valuesOfTheWrongKind() {
    assertThat(with("name", "[a]"))
        .containsExactly("sweep.yaml:1:7: name: expected a text, found a list");
    assertThat(with("name", ""))
        .containsExactly("sweep.yaml:1:6: name: expected a text, found nothing");
    assertThat(with("name", "null"))
        .containsExactly("sweep.yaml:1:7: name: expected a text, found nothing");
    assertThat(with("name", "'  '")).containsExactly("sweep.yaml:1:7: name: an empty text");
    assertThat(withMore("limits: 10s"))
        .containsExactly("sweep.yaml:5:9: limits: expected keys with values, found '10s'");
    assertThat(with("backends", "[]")).containsExactly("sweep.yaml:4:11: backends: an empty list");
    assertThat(withMore("pairs: plain on sat"))
        .containsExactly("sweep.yaml:5:8: pairs: expected a list, found 'plain on sat'");
  }

  @Test
  void refuses_namesThatAreNone() {
    assertThat(with("name", "spring sweep"))
        .containsExactly(
            "sweep.yaml:1:7: name: 'spring sweep' cannot be a name",
            "  a name has letters, digits, '.', '-' and '_', at most 64, a letter or digit first");
  }

  // Numbers

  @Test
  void refuses_numbersThatAreNoneOrOutOfRange() {
    assertThat(withMore("seeds: 3.7"))
        .containsExactly("sweep.yaml:5:8: seeds: '3.7' is not a whole number");
    assertThat(withMore("seeds: 3.0"))
        .containsExactly("sweep.yaml:5:8: seeds: '3.0' is not a whole number");
    assertThat(withMore("seeds: '3'"))
        .containsExactly(
            "sweep.yaml:5:8: seeds: '3' is a text here; write a whole number without quotes");
    assertThat(withMore("seeds: 0")).containsExactly("sweep.yaml:5:8: seeds: 0 is not in 1..1000");
    assertThat(withMore("seeds: [1, -1]"))
        .containsExactly("sweep.yaml:5:12: seeds[1]: -1 is not in 0..9223372036854775807");
    assertThat(withMore("seeds: [1, 2, 1]"))
        .containsExactly("sweep.yaml:5:15: seeds[2]: seed 1 comes twice");
    assertThat(withMore("penalty: 0.5"))
        .containsExactly("sweep.yaml:5:10: penalty: 0.5 is less than 1");
    assertThat(withMore("penalty: much"))
        .containsExactly("sweep.yaml:5:10: penalty: 'much' is not a number");
    assertThat(withMore("block-size: 1"))
        .containsExactly("sweep.yaml:5:13: block-size: 1 is not in 2..64");
    assertThat(withMore("tie-margin: 5"))
        .containsExactly(
            "sweep.yaml:5:13: tie-margin: '5' has no unit; write a number and a unit (%): 5 %");
    assertThat(withMore("cores: 1", "limits: {threads: 2}"))
        .containsExactly("sweep.yaml:5:8: cores: 1 is fewer than the 2 threads of one run");
  }

  @Test
  void refuses_quantitiesWithoutAUnitThatFits() {
    assertThat(withMore("limits: {wall: 10, memory: 2 GS}"))
        .containsExactly(
            "sweep.yaml:5:16: limits.wall: '10' has no unit; write a number and a unit (ms, s, min,"
                + " h): 10 s",
            "sweep.yaml:5:28: limits.memory: unknown unit 'GS' (did you mean 'GB'?); write a number"
                + " and a unit (kB, MB, GB, KiB, MiB, GiB): 2 GB");
  }

  // Families and variants

  @Test
  void suggests_theFamilyThatWasMeant() {
    assertThat(with("family", "kilns"))
        .containsExactly(
            "sweep.yaml:2:9: family: unknown family 'kilns' (did you mean 'kiln'?)",
            "  known: kiln, yard");
  }

  @Test
  void refuses_aFamilysKeysOutsideItsEntry() {
    assertThat(
            linesOf(
                """
                name: both
                backends: sat
                variants: plain
                families:
                  - {family: kiln, variants: plain}
                  - {family: kiln, variants: plain, seeds: 3}
                """))
        .containsExactly(
            "sweep.yaml:3:1: variants: belongs into the entries of families here",
            "sweep.yaml:6:37: families[1]: unknown key 'seeds'",
            "  known: family, variants, instances, in-service, pairs");
  }

  @Test
  void refuses_aFamilyThatComesTwice() {
    assertThat(
            linesOf(
                """
                name: both
                backends: sat
                families:
                  - {family: kiln, variants: plain}
                  - {family: kiln, variants: plain}
                """))
        .containsExactly("sweep.yaml:5:5: families[1]: a family comes twice");
  }

  @Test
  void suggests_theAmendmentThatWasMeant() {
    assertThat(with("variants", "[plain, plain+load-bond]"))
        .containsExactly(
            "sweep.yaml:3:19: variants[1]: unknown amendment 'load-bond' (did you mean"
                + " 'load-bound'?)",
            "  known: load-bound, kiln-order, shelf-table, glaze-first");
    assertThat(with("variants", "{all-subsets-of: [load-bound, ordr]}"))
        .containsExactly(
            "sweep.yaml:3:41: variants.all-subsets-of[1]: unknown amendment 'ordr'",
            "  known: load-bound, kiln-order, shelf-table, glaze-first");
  }

  @Test
  void refuses_combinationsThatTheFamilyRulesOut_whereTheyAreNamed() {
    assertThat(with("variants", "[plain+glaze-first, plain+kiln-order+shelf-table]"))
        .containsExactly(
            "sweep.yaml:3:12: variants[0]: plain+glaze-first is no variant: glaze-first requires"
                + " load-bound",
            "sweep.yaml:3:31: variants[1]: plain+kiln-order+shelf-table is no variant: shelf-table"
                + " excludes kiln-order");
    assertThat(with("variants", "{one-at-a-time: [shelf-table], onto: plain+kiln-order}"))
        .containsExactly(
            "sweep.yaml:3:27: variants.one-at-a-time: plain+kiln-order+shelf-table is no variant:"
                + " shelf-table excludes kiln-order");
  }

  @Test
  void refuses_variantsThatAreNone() {
    assertThat(with("variants", "[load-bound, other]"))
        .containsExactly(
            "sweep.yaml:3:12: variants[0]: a variant's name starts with 'plain', 'load-bound' does"
                + " not; write plain+load-bound",
            "sweep.yaml:3:24: variants[1]: a variant's name starts with 'plain', 'other' does not");
    assertThat(with("variants", "plain+load-bound+load-bound"))
        .containsExactly("sweep.yaml:3:11: variants: an amendment comes twice");
    assertThat(with("variants", "{onto: plain}"))
        .containsExactly(
            "sweep.yaml:3:11: variants: says neither all-subsets-of nor one-at-a-time");
    assertThat(with("variants", "{one-at-a-time: some}"))
        .containsExactly(
            "sweep.yaml:3:27: variants.one-at-a-time: expected 'all' or a list of amendments, found"
                + " 'some'");
  }

  // Backends

  @Test
  void suggests_theBackendThatWasMeant() {
    assertThat(with("backends", "[sat, {name: cpsatt}, choco]"))
        .containsExactly(
            "sweep.yaml:4:24: backends[1].name: unknown backend 'cpsatt' (did you mean 'cpsat'?)",
            "  known: sat, cpsat, engine",
            "sweep.yaml:4:33: backends[2]: backend 'choco' cannot run here: its library is not on"
                + " the class path");
  }

  @Test
  void refuses_optionsThatTheBackendHasNot() {
    assertThat(
            with(
                "backends",
                "[{name: a, backend: cpsat, options: {presolv: true, linearization: 5}},"
                    + " {name: b, backend: engine, options: {restarts: lubby, decay: fast}}]"))
        .containsExactly(
            "sweep.yaml:4:48: backends[0].options: unknown key 'presolv' (did you mean"
                + " 'presolve'?)",
            "  known: linearization, presolve, threads",
            "sweep.yaml:4:78: backends[0].options.linearization: 5 is not in 0..2",
            "sweep.yaml:4:130: backends[1].options.restarts: 'lubby' is not one of none, luby",
            "sweep.yaml:4:144: backends[1].options.decay: 'fast' is not a number");
  }

  @Test
  void asksForAName_whereOptionsHaveNone() {
    assertThat(with("backends", "[{backend: cpsat, options: {presolve: false}}]"))
        .containsExactly(
            "sweep.yaml:4:12: backends[0]: options and threads need a name of their own",
            "  for example: {name: cpsat-2, backend: cpsat, options: ...}",
            "  or several under settings: {cpsat-a: {...}, ...}");
    assertThat(with("backends", "[sat, {name: sat, backend: cpsat}]"))
        .containsExactly(
            "sweep.yaml:4:24: backends[1].name: 'sat' is the name of another backend; choose one of"
                + " its own");
    assertThat(with("backends", "[sat, sat]"))
        .containsExactly(
            "sweep.yaml:4:17: backends[1]: 'sat' comes twice",
            "  give each entry a name of its own, with name:");
    assertThat(with("backends", "[{threads: 2}]"))
        .containsExactly(
            "sweep.yaml:4:12: backends[0]: names no backend",
            "  for example: {name: cpsat-2, backend: cpsat}");
  }

  @Test
  void keepsDefault_forTheSettingThatChangesNothing() {
    assertThat(with("backends", "[{backend: cpsat, settings: {default: {presolve: false}}}]"))
        .containsExactly(
            "sweep.yaml:4:49: backends[0].settings.default: the setting 'default' has no options of"
                + " its own; give it another name");
    assertThat(
            with(
                "backends",
                "[{backend: cpsat, options: {presolve: false}, settings: {default: {}, b: {}}}]"))
        .containsExactly(
            "sweep.yaml:4:77: backends[0].settings.default: 'default' under the backend's own name"
                + " has no options; name the entry");
    assertThat(with("backends", "[{backend: cpsat, settings: {a/b: {}}}]"))
        .containsExactly(
            "sweep.yaml:4:40: backends[0].settings.a/b: 'a/b' cannot be a name",
            "  a name has letters, digits, '.', '-' and '_', at most 64, a letter or digit first");
  }

  @Test
  void limitsEveryBackendByWork_orNone() {
    assertThat(withMore("limits: {work: {sat: 10 conflicts}}"))
        .containsExactly(
            "sweep.yaml:5:16: limits.work: no amount for 'cpsat'",
            "  a sweep limits every backend by work or none; its units: deterministic-seconds,"
                + " conflicts");
    assertThat(
            with("backends", "[{backend: engine, settings: {a: {}, b: {}}}]", "limits: {work: {}}"))
        .containsExactly(
            "sweep.yaml:5:16: limits.work: no amount for 'engine'",
            "  a sweep limits every backend by work or none; its units: nodes");
    assertThat(withMore("limits: {work: {sat: 10 nodes, cpsat: 0 conflicts, engin: 3 nodes}}"))
        .containsExactly(
            "sweep.yaml:5:22: limits.work.sat: unknown unit 'nodes'; write a number and a unit"
                + " (conflicts): 1000 conflicts",
            "sweep.yaml:5:39: limits.work.cpsat: '0 conflicts' is no work at all");
    assertThat(withMore("limits: {work: {sat: 1 conflicts, cpsat: 1 conflicts, cpsa: 3 nodes}}"))
        .containsExactly(
            "sweep.yaml:5:55: limits.work.cpsa: unknown backend 'cpsa' (did you mean 'cpsat'?)",
            "  in this sweep: sat, cpsat");
    assertThat(withMore("limits: {work: [sat]}"))
        .containsExactly("sweep.yaml:5:16: limits.work: expected keys with values, found a list");
  }

  // Candidates

  @Test
  void suggests_theCandidateThatWasMeant() {
    assertThat(withMore("in-service: plain on cpsatt"))
        .containsExactly(
            "sweep.yaml:5:13: in-service: unknown candidate 'plain on cpsatt' (did you mean 'plain"
                + " on cpsat'?)",
            "  known: plain on sat, plain on cpsat");
    assertThat(withMore("pairs:", "  - [plain on sat, plain+load-bound on sat]"))
        .containsExactly(
            "sweep.yaml:6:20: pairs[0][1]: unknown candidate 'plain+load-bound on sat'",
            "  known: plain on sat, plain on cpsat");
  }

  @Test
  void saysNothingOfCandidates_whileBackendsOrVariantsAreWrong() {
    assertThat(with("backends", "[sat, cpsatt]", "in-service: plain on cpsat")).hasSize(2);
    assertThat(with("variants", "[plain, plain+x]", "in-service: plain+x on sat")).hasSize(2);
  }

  @Test
  void refuses_pairsThatAreNone() {
    assertThat(
            withMore(
                "pairs:", "  - [plain on sat]", "  - [plain on sat, plain on sat]", "  - plain"))
        .containsExactly(
            "sweep.yaml:6:5: pairs[0]: a pair has two candidates, before and after, found 1",
            "  for example: [plain on sat, plain on cpsat]",
            "sweep.yaml:7:5: pairs[1]: plain on sat is paired with itself",
            "sweep.yaml:8:5: pairs[2]: expected a list, found 'plain'");
  }

  @Test
  void refuses_moreThanAnybodyCanRun() {
    String settings =
        IntStream.range(0, 200).mapToObj(i -> "s" + i + ": {}").collect(joining(", "));
    String backends = "[{backend: engine, settings: {" + settings + "}}";
    String all = GOOD.replace("plain", "{one-at-a-time: all}") + "seeds: 1000\n";

    assertThat(linesOf(all.replace("[sat, cpsat]", backends + "]")))
        .containsExactly("sweep.yaml:1:1: makes 6000000 runs; at most 2000000 in one sweep");
    assertThat(linesOf(all.replace("[sat, cpsat]", backends + ", sat]")))
        .contains(
            "sweep.yaml:3:11: variants: 5 variants on 201 backend settings are 1005 candidates; at"
                + " most 1000");
  }

  // Instances

  @Test
  void suggests_theInstancesThatWereMeant() {
    assertThat(withMore("instances: [spring/a9, {set: sprin, class: huge}]"))
        .containsExactly(
            "sweep.yaml:5:13: instances[0]: unknown instance 'spring/a9' (did you mean"
                + " 'spring/a1'?)",
            "  known: autumn/11, autumn/12, autumn/20, spring/a1, spring/a2, spring/b1",
            "sweep.yaml:5:30: instances[1].set: unknown set 'sprin' (did you mean 'spring'?)",
            "  known: autumn, spring, trouble");
    assertThat(withMore("instances: {class: [large, midling]}"))
        .containsExactly(
            "sweep.yaml:5:28: instances.class[1]: unknown class 'midling'",
            "  known: large, small");
  }

  @Test
  void refuses_foldersThatAreNotThereOrEmpty() throws IOException {
    assertThat(withMore("instances: {folder: data}"))
        .containsExactly("sweep.yaml:5:21: instances.folder: no such folder: data");
    Files.createDirectory(folder.resolve("data"));
    Files.writeString(folder.resolve("data/README.md"), "where these are from");
    assertThat(withMore("instances: {folder: data}"))
        .containsExactly("sweep.yaml:5:21: instances.folder: no instances in data");
    assertThat(with("family", "yard"))
        .containsExactly(
            "sweep.yaml:1:1: family 'yard' ships no instances",
            "  give a folder, for example: instances: {folder: data}");
  }

  @Test
  void refuses_aSelectionOfNothing() {
    assertThat(withMore("instances: [{set: autumn, class: small, names: 'autumn/2*'}]"))
        .containsExactly(
            "sweep.yaml:5:48: instances[0].names: no instance matches 'autumn/2*'",
            "  known: autumn/11");
  }

  @Test
  void reports_everyMistakeOfAnIndex() throws IOException {
    Path data = Files.createDirectory(folder.resolve("data"));
    Files.writeString(data.resolve("a.txt"), "1");
    Files.writeString(data.resolve("a.json"), "1");
    Files.writeString(
        data.resolve("instances.csv"),
        """
        path,weight,date,known
        a.txt,0,2026-13-01,1.5
        b.txt,1,,

        a.json,-1,yesterday,many
        a.txt,1
        ../sweep.yaml,1,,
        "a.txt",1,,
        """);
    assertThat(withMore("instances: {folder: data}"))
        .containsExactly(
            "data/instances.csv:2: weight: '0' is not a positive number",
            "data/instances.csv:2: date: '2026-13-01' is not a date such as 2026-03-31",
            "data/instances.csv:2: known: '1.5' is not a whole number",
            "data/instances.csv:3: path: no such file: 'b.txt'",
            "data/instances.csv:5: weight: '-1' is not a positive number",
            "data/instances.csv:5: date: 'yesterday' is not a date such as 2026-03-31",
            "data/instances.csv:5: known: 'many' is not a whole number",
            "data/instances.csv:5: path: two files give the name 'a': a.txt and a.json",
            "data/instances.csv:6: has 2 values, the header 4",
            "data/instances.csv:7: path: '../sweep.yaml' is not inside this folder",
            "data/instances.csv:8: path: two files give the name 'a': a.txt and a.txt");
  }

  @Test
  void reports_aWrongHeader() throws IOException {
    Path data = Files.createDirectory(folder.resolve("data"));
    Path index = data.resolve("instances.csv");
    Files.writeString(index, "file,clas\na,b\n");
    assertThat(withMore("instances: {folder: data}"))
        .containsExactly(
            "data/instances.csv:1: unknown column 'file'",
            "  known: path, set, class, weight, date, known",
            "data/instances.csv:1: unknown column 'clas' (did you mean 'class'?)",
            "  known: path, set, class, weight, date, known",
            "data/instances.csv:1: no column 'path'",
            "  known: path, set, class, weight, date, known");
    Files.writeString(index, "path,path\na,b\n");
    assertThat(withMore("instances: {folder: data}"))
        .hasSize(1)
        .first()
        .asString()
        .contains("path");
    Files.writeString(index, "path,set\n\"a,b\n");
    assertThat(withMore("instances: {folder: data}"))
        .hasSize(1)
        .first()
        .asString()
        .startsWith("data/instances.csv: not a table: ");
    Files.writeString(index, "");
    assertThat(withMore("instances: {folder: data}")).hasSize(2);
  }

  @Test
  void refuses_twoInstancesOfOneName() throws IOException {
    for (String name : List.of("old", "new")) {
      Files.createDirectory(folder.resolve(name));
      Files.writeString(folder.resolve(name).resolve("a.txt"), name);
    }
    assertThat(withMore("instances: [{folder: old}, {folder: new}]"))
        .containsExactly("sweep.yaml:5:28: instances[1]: two instances are named 'a'");
  }

  // All together

  @Test
  void reports_allMistakesInTheirOrder_upToTwenty() {
    String many = "seeds: [" + "x, ".repeat(30) + "x]";
    List<String> lines = withMore(many, "penalty: no", "seed: 1");

    assertThat(lines).hasSize(21);
    assertThat(lines.get(0)).isEqualTo("sweep.yaml:5:9: seeds[0]: 'x' is not a whole number");
    assertThat(lines.get(19)).startsWith("sweep.yaml:5:66: seeds[19]");
    assertThat(lines.get(20)).isEqualTo("and 13 more mistakes");
  }
}
