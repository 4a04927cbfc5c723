package steelyard.harness.sweep;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import steelyard.adapters.spi.Description;
import steelyard.adapters.spi.Goal;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.results.ledger.RunKey;

class JsonFilesTests {

  @TempDir Path folder;

  private static final RunKey KEY = RunKey.parse("00112233445566778899aabbccddeeff");

  private static BlockFile block() {
    Sweep sweep = SweepFile.read(Samples.resource("example.yaml"), Samples.catalogue());
    return BlockFile.of(
        Plan.of(sweep).blocks().get(3),
        "k3f9",
        "kiln plan \u00e9t\u00e9",
        Path.of("/shared/runs of spring"),
        candidate ->
            candidate.variant().name().equals("plain") ? Optional.of(KEY) : Optional.empty());
  }

  private List<String> problem(String json) throws IOException {
    Path file = Files.writeString(folder.resolve("block.json"), json);
    return catchThrowableOfType(SweepProblem.class, () -> BlockFile.read(file)).lines().stream()
        .map(line -> line.replace(folder + "/", ""))
        .toList();
  }

  private static String json(BlockFile block) {
    return Json.write(block);
  }

  @Test
  void readsBack_theBlockThatWasWritten() throws IOException {
    Path file = folder.resolve("block.json");
    block().write(file);

    assertThat(BlockFile.read(file)).isEqualTo(block());
    try (Stream<Path> files = Files.list(folder)) {
      assertThat(files).containsExactly(file);
    }
  }

  @Test
  void writesOver_anOlderBlock() throws IOException {
    Path file = folder.resolve("block.json");
    Files.writeString(file, "old");
    block().write(file);

    assertThat(BlockFile.read(file)).isEqualTo(block());
  }

  @Test
  void saysEverythingThatARunNeeds() {
    assertThat(json(block()))
        .contains("\"kind\" : \"variant\"")
        .contains("\"path\" : \"" + Samples.resource("kiln/"))
        .contains("\"into\" : \"/shared/runs of spring\"")
        .contains("\"linearization\" : \"0\"")
        .contains("\"wallSeconds\" : 90.0")
        .contains("\"key\" : \"" + KEY.hex() + "\"");
  }

  @Test
  void refuses_whatItDoesNotKnow() throws IOException {
    String good = json(block());

    assertThat(problem(good.replaceFirst("\"seed\"", "\"sede\" : 1, \"seed\"")))
        .containsExactly("block.json: sede: not known here");
    assertThat(problem(good.replaceFirst("\"variant\",", "\"wish\",")).get(0))
        .startsWith("block.json:12:16: runs[0].recipe: Could not resolve type id 'wish'");
    assertThat(problem(good.replaceFirst("\"form\" : 1", "\"form\" : 2")).get(0))
        .endsWith(": a block file of form 2; this version reads form 1");
  }

  @Test
  void refuses_whatIsLeftOutOrTwiceThereOrOfTheWrongKind() throws IOException {
    String good = json(block());

    assertThat(problem(good.replaceFirst("  \"seed\" : 0,\n", "")))
        .containsExactly("block.json: seed: missing");
    assertThat(problem(good.replaceFirst("\"seed\" : 0", "\"seed\" : 0, \"seed\" : 1")).get(0))
        .contains("Duplicate field 'seed'");
    assertThat(problem(good.replaceFirst("\"seed\" : 0", "\"seed\" : 0.5")).get(0))
        .contains("seed: ");
    assertThat(problem(good.replaceFirst("\"seed\" : 0", "\"seed\" : \"0\"")).get(0))
        .contains("seed: ");
    assertThat(problem(good.replaceFirst("\"seed\" : 0", "\"seed\" : null")).get(0))
        .contains("seed: ");
    assertThat(problem(good.replaceFirst("\"into\" : \"/", "\"into\" : \"")).get(0))
        .endsWith(": into must be absolute, was shared/runs of spring");
    assertThat(problem(good + "{}").get(0)).contains("Trailing token");
    assertThat(problem("null")).containsExactly("block.json: holds nothing");
    assertThat(problem("")).hasSize(1);
    assertThat(problem(good.substring(0, good.length() / 2))).hasSize(1);
  }

  @Test
  void readsBack_theCatalogueThatWasWritten() {
    Catalogue catalogue = Samples.catalogue();

    assertThat(Catalogue.ofJson(catalogue.toJson(), "cache")).isEqualTo(catalogue);
  }

  @Test
  void refuses_aCatalogueThatContradictsItself() {
    String twice =
        Samples.catalogue().toJson().replaceFirst("\"name\" : \"choco\"", "\"name\" : \"sat\"");

    assertThat(
            catchThrowableOfType(SweepProblem.class, () -> Catalogue.ofJson(twice, "cache"))
                .lines())
        .first()
        .asString()
        .endsWith("a backend is described twice: [sat, cpsat, engine, sat]");
    assertThatIllegalArgumentException()
        .isThrownBy(
            () ->
                new Catalogue.Family(
                    "f",
                    Optional.empty(),
                    "",
                    Samples.digest("f"),
                    Optional.empty(),
                    List.of(
                        new Catalogue.Amendment(
                            "a", "implied", "", new TreeSet<>(Set.of("b")), new TreeSet<>()))))
        .withMessage("family f: amendment a requires or excludes one that does not exist: [b]");
  }

  @Test
  void takesABackend_asItDescribesItself() {
    Description description =
        new Description(
            "sat",
            "2.3.6",
            false,
            true,
            Set.of(Goal.Satisfy.class, Goal.Optimise.class),
            List.of("conflicts"),
            List.of(),
            0.85);

    Catalogue.Backend backend = Catalogue.Backend.of(description, Samples.digest("sat"));
    assertThat(backend.goals()).containsExactly("optimise", "satisfy");
    assertThat(backend.workUnits()).containsExactly("conflicts");
    assertThat(backend.heapShare()).isEqualTo(0.85);
  }
}
