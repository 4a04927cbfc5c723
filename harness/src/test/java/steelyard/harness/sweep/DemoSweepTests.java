package steelyard.harness.sweep;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.ServiceLoader;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.Amendment;
import steelyard.variants.family.Family;

/** The sweep that ships reads against the families that ship, and ends in time. */
class DemoSweepTests {

  private static final Path DEMO = Path.of("src/main/dist/share/sweeps/demo.yaml");
  private static final Path INSTANCES = Path.of("../variants/src/main/share/instances");

  private static Catalogue catalogue() {
    List<Catalogue.Family> families = new ArrayList<>();
    for (Family<?> family : ServiceLoader.load(Family.class)) {
      families.add(
          new Catalogue.Family(
              family.name(),
              Optional.empty(),
              family.summary(),
              Samples.digest(family.name()),
              Optional.of(INSTANCES.resolve(family.name())),
              family.amendments().stream().map(DemoSweepTests::described).toList()));
    }
    return new Catalogue(families, Samples.catalogue().backends(), List.of());
  }

  private static Catalogue.Amendment described(Amendment<?> amendment) {
    return new Catalogue.Amendment(
        amendment.name(),
        "of any role",
        amendment.summary(),
        new TreeSet<>(amendment.requires()),
        new TreeSet<>(amendment.excludes()));
  }

  @Test
  void readsTheSweepThatShips() {
    Sweep sweep = SweepFile.read(DEMO, catalogue());

    assertThat(sweep.remarks()).isEmpty();
    assertThat(sweep.contests())
        .extracting(Contest::family)
        .containsExactly("workshop", "kiln-campaigns", "glaze-line");
    assertThat(sweep.contests())
        .extracting(contest -> contest.inService().name())
        .containsOnly("plain on cpsat");
    assertThat(Plan.of(sweep).blocks())
        .as("each candidate meets each")
        .hasSize(sweep.contests().stream().mapToInt(c -> c.instances().size()).sum());
  }

  @Test
  void endsWithinFiveMinutes_whateverTheSolversDo() {
    Plan.Summary summary = Plan.of(SweepFile.read(DEMO, catalogue())).summary();

    double startingHours = summary.runs() * 2.0 / 3600 / 2;
    assertThat(summary.hoursAtWorst() + startingHours)
        .as("with 2 s for starting and ending each process, on 2 cores")
        .isLessThan(5.0 / 60);
  }
}
