package steelyard.harness.sweep;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import steelyard.harness.sweep.text.SweepProblem;

/** Several versions of one family in a sweep, and on the command line. */
class FamilyVersionsTests {
  @TempDir Path folder;

  private static Catalogue.Family version(String alias, String... amendments) {
    List<Catalogue.Amendment> all = new ArrayList<>();
    for (String name : amendments) {
      all.add(
          new Catalogue.Amendment(
              name, "implied", "", new TreeSet<>(Set.of()), new TreeSet<>(Set.of())));
    }
    return new Catalogue.Family(
        "carts", Optional.of(alias), "", Samples.digest(alias), Optional.empty(), all);
  }

  private static Catalogue catalogue(Catalogue.Family... families) {
    return new Catalogue(List.of(families), Samples.catalogue().backends(), List.of());
  }

  private Sweep read(Catalogue catalogue, String variants) throws IOException {
    Files.createDirectories(folder.resolve("data"));
    Files.writeString(folder.resolve("data/one"), "1");
    Path file = folder.resolve("sweep.yaml");
    Files.writeString(
        file,
        """
        name: versions
        family: carts
        variants: %s
        backends: [sat]
        instances: {folder: data}
        in-service: plain@old on sat
        """
            .formatted(variants));
    return SweepFile.read(file, catalogue);
  }

  @Test
  void versions_areCandidatesSideBySide_withTheCodeOfEach() throws IOException {
    Catalogue catalogue = catalogue(version("old", "a"), version("new", "a", "b"));
    Contest contest =
        read(catalogue, "[plain@old, plain@new, {one-at-a-time: all, onto: plain@new}]")
            .contests()
            .get(0);
    assertThat(contest.candidates())
        .extracting(Candidate::name)
        .containsExactly(
            "plain@old on sat", "plain@new on sat", "plain+a@new on sat", "plain+b@new on sat");
    Instance instance = contest.instances().get(0);
    assertThat(contest.recipe(contest.inService(), instance).familyCode())
        .isEqualTo(Samples.digest("old"));
    assertThat(contest.recipe(contest.candidates().get(3), instance))
        .satisfies(
            recipe -> {
              assertThat(recipe.familyCode()).isEqualTo(Samples.digest("new"));
              assertThat(recipe.alias()).hasValue("new");
              assertThat(recipe.variant()).isEqualTo("plain+b@new");
            });
  }

  @Test
  void a_version_thatIsNotThere_orNotNamed_isAMistake() {
    Catalogue catalogue = catalogue(version("old", "a"), version("new", "a", "b"));
    assertThatThrownBy(() -> read(catalogue, "[plain@odl]"))
        .isInstanceOf(SweepProblem.class)
        .hasMessageContaining("unknown version 'odl'\n  known: old, new");
    assertThatThrownBy(() -> read(catalogue, "[plain]"))
        .hasMessageContaining("which version of carts? write plain@old");
    assertThatThrownBy(() -> read(catalogue, "[plain+b@old]"))
        .hasMessageContaining("unknown amendment 'b'");
    assertThatThrownBy(() -> SingleChoice.variant(catalogue, "carts", "plain@odl"))
        .hasMessageContaining("unknown version of carts 'odl'");
    assertThatThrownBy(() -> SingleChoice.variant(catalogue, "carts", "plain"))
        .hasMessageContaining("which version of carts? give --variant plain@old");
  }

  @Test
  void the_only_version_needsNoAlias() {
    Catalogue catalogue = catalogue(version("old", "a"));
    assertThat(SingleChoice.variant(catalogue, "carts", "plain+a").family().alias())
        .hasValue("old");
  }

  @Test
  void jars_comeFromTheCommandLine_andFromTheFile() throws IOException {
    Path old = Files.createFile(folder.resolve("old.jar"));
    Path today = Files.createFile(folder.resolve("today.jar"));
    FamilyJars given = FamilyJars.of(List.of("new=" + today, old.toString()));
    assertThat(given.byAlias())
        .isEqualTo(new TreeMap<>(Map.of("new", List.of(today), "", List.of(old))));

    Path file = folder.resolve("sweep.yaml");
    Files.writeString(file, "name: x\nfamily-jars: {old: old.jar, new: [today.jar]}\n");
    assertThat(SweepFile.familyJars(file).byAlias())
        .isEqualTo(new TreeMap<>(Map.of("old", List.of(old), "new", List.of(today))));
    Files.writeString(file, "name: x\nfamily-jars: old.jar\n");
    assertThat(SweepFile.familyJars(file).with(given).byAlias()).isEqualTo(given.byAlias());
    Files.writeString(file, "name: x\nfamily-jars: {old: gone.jar}\n");
    assertThatThrownBy(() -> SweepFile.familyJars(file))
        .isInstanceOf(SweepProblem.class)
        .hasMessageContaining("sweep.yaml:2:20")
        .hasMessageContaining("there is no jar");
  }
}
