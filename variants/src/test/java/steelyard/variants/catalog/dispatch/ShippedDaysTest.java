package steelyard.variants.catalog.dispatch;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

class ShippedDaysTest {
  /** Days of more orders take the dynamic program too long for a test. */
  private static final int PROVED_HERE = 12;

  /** A row of the table of instances. */
  private record Listed(String path, List<String> sets, String type, String known) {
    static Listed of(String row) {
      List<String> cells = List.of(row.split(",", -1));
      return new Listed(
          cells.get(0), List.of(cells.get(1).split(";", -1)), cells.get(2), cells.get(5));
    }
  }

  private static List<Listed> listed() throws IOException {
    return Files.readAllLines(Days.SHIPPED.resolve("instances.csv")).stream()
        .skip(1)
        .map(Listed::of)
        .toList();
  }

  /** The file that the name asks for: recipe, orders, seed. */
  private static String made(String name) {
    List<String> words = List.of(name.split("-", -1));
    int orders = Integer.parseInt(words.get(1));
    DayRecipe recipe =
        switch (words.get(0)) {
          case "windows" -> DayRecipe.windows(orders);
          case "county" -> DayRecipe.county(orders);
          case "fleet" -> DayRecipe.fleet(orders);
          case "carriers" -> DayRecipe.carriers(orders);
          case "tiny" -> DayRecipe.tiny(orders);
          default -> throw new IllegalArgumentException(name);
        };
    long seed = Long.parseLong(words.get(2));
    return DispatchText.of(
        DayGenerator.of(recipe, seed),
        "Made up: " + words.get(0) + ", " + orders + " orders, seed " + seed);
  }

  @Test
  void every_file_is_listed() throws IOException {
    try (Stream<Path> files = Files.list(Days.SHIPPED)) {
      assertThat(
              files
                  .filter(Files::isRegularFile)
                  .map(file -> file.getFileName().toString())
                  .filter(name -> !name.contains(".")))
          .containsExactlyInAnyOrderElementsOf(listed().stream().map(Listed::path).toList());
    }
    assertThat(listed()).allMatch(instance -> instance.sets.contains("all"));
  }

  @Test
  void every_file_is_what_the_generator_makes() throws IOException {
    for (Listed instance : listed()) {
      assertThat(Files.readString(Days.SHIPPED.resolve(instance.path)))
          .as(instance.path)
          .isEqualTo(made(instance.path));
      assertThat(instance.path).startsWith(instance.type + "-");
    }
  }

  /** Some ways are longer, and some are dearer, in one direction than in the other. */
  @Test
  void ways_differ_by_direction_and_never_beat_the_shortest() throws IOException {
    int uphill = 0;
    for (Listed instance : listed()) {
      Dispatch day = Days.shipped(instance.path);
      assertThat(day.times()).isEqualTo(day.times().shortest());
      assertThat(day.costs()).isEqualTo(day.costs().shortest());
      for (int stop : day.stops().toArray()) {
        uphill += day.times().get(0, stop) != day.times().get(stop, 0) ? 1 : 0;
      }
    }
    assertThat(uphill).isGreaterThan(20);
  }

  @Test
  void the_known_cost_is_that_of_the_exact_tours() throws IOException {
    for (Listed instance : listed()) {
      Dispatch day = Days.shipped(instance.path);
      if (!instance.known.isEmpty() && day.orders().size() <= PROVED_HERE) {
        assertThat(ExactTours.leastCost(day))
            .as(instance.path)
            .hasValue(Long.parseLong(instance.known));
      }
    }
  }

  /** One is there to be noticed: its orders cannot all be delivered. */
  @Test
  void only_one_has_no_plan() throws IOException {
    assertThat(listed().stream().filter(instance -> instance.known.isEmpty()))
        .extracting(Listed::path)
        .containsExactly("fleet-10-2");
    assertThat(ExactTours.leastCost(Days.shipped("fleet-10-2"))).isEmpty();
  }

  @Test
  void no_known_cost_is_above_that_of_a_plan_at_hand() throws IOException {
    for (Listed instance : listed()) {
      Dispatch day = Days.shipped(instance.path);
      Optional<Plan> greedy = GreedyPlan.of(day);
      if (!instance.known.isEmpty() && greedy.isPresent()) {
        assertThat(Long.parseLong(instance.known))
            .as(instance.path)
            .isBetween(1L, greedy.get().cost(day));
      }
    }
  }
}
