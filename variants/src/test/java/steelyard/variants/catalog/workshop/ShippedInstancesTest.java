package steelyard.variants.catalog.workshop;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.AllSolutions;
import steelyard.variants.family.Variant;

class ShippedInstancesTest {
  /** A row of the table of instances. */
  private record Listed(String path, List<String> sets, String size, String known) {
    static Listed of(String row) {
      List<String> cells = List.of(row.split(",", -1));
      return new Listed(
          cells.get(0), List.of(cells.get(1).split(";", -1)), cells.get(2), cells.get(5));
    }
  }

  private static List<Listed> listed() throws IOException {
    return Files.readAllLines(Workshops.SHIPPED.resolve("instances.csv")).stream()
        .skip(1)
        .map(Listed::of)
        .toList();
  }

  @Test
  void every_file_is_listed_under_its_size() throws IOException {
    try (Stream<Path> files = Files.list(Workshops.SHIPPED)) {
      assertThat(files.map(file -> file.getFileName().toString()).filter(f -> !f.contains(".")))
          .containsExactlyInAnyOrderElementsOf(listed().stream().map(Listed::path).toList());
    }
    for (Listed instance : listed()) {
      Workshop workshop = Workshops.shipped(instance.path);
      assertThat(workshop.moulds().size() + "x" + workshop.stations())
          .as(instance.path)
          .isEqualTo(instance.size);
      assertThat(instance.sets).as(instance.path).contains("all");
    }
  }

  /** No known optimum is below the bounds that anyone can compute, or above a plan at hand. */
  @Test
  void known_optima_lie_between_the_bounds_and_the_greedy_plan() throws IOException {
    for (Listed instance : listed()) {
      Workshop workshop = Workshops.shipped(instance.path);
      if (!instance.known.isEmpty()) {
        assertThat(Integer.parseInt(instance.known))
            .as(instance.path)
            .isBetween(lowerBound(workshop), GreedyPlan.of(workshop).makespan());
      }
    }
  }

  private static int lowerBound(Workshop workshop) {
    int station =
        IntStream.range(0, workshop.stations())
            .map(s -> JacksonBound.of(workshop.visits(s)))
            .max()
            .orElseThrow();
    int route =
        workshop.moulds().stream().mapToInt(m -> m.minutes(0) + m.tail(0)).max().orElseThrow();
    return Math.max(station, route);
  }

  @Test
  void the_known_optimum_of_a_made_up_one_is_the_shortest_of_all_its_left_shifted_plans() {
    WorkshopFamily family = new WorkshopFamily();
    Variant leftShifted = Variant.of(family, List.of("left-shifted"));
    assertThat(
            AllSolutions.minimum(
                AllSolutions.of(leftShifted.build(family, Workshops.shipped("floor-3x3")))))
        .hasValue(14);
  }
}
