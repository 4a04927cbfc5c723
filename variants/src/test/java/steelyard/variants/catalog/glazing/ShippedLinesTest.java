package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.variants.family.AllSolutions;
import steelyard.variants.family.Variant;

class ShippedLinesTest {
  /** A row of the table of instances. */
  private record Listed(String path, List<String> sets, String type, String known) {
    static Listed of(String row) {
      List<String> cells = List.of(row.split(",", -1));
      return new Listed(
          cells.get(0), List.of(cells.get(1).split(";", -1)), cells.get(2), cells.get(5));
    }

    boolean isMadeUp() {
      return sets.contains("made-up");
    }
  }

  private static List<Listed> listed() throws IOException {
    return Files.readAllLines(Lines.SHIPPED.resolve("instances.csv")).stream()
        .skip(1)
        .map(Listed::of)
        .toList();
  }

  /** The file that the name asks for: recipe, tiles, seed. */
  private static String made(String name) {
    List<String> words = List.of(name.split("-", -1));
    int tiles = Integer.parseInt(words.get(1));
    LineRecipe recipe =
        switch (words.get(0)) {
          case "changes" -> LineRecipe.changes(tiles);
          case "overruns" -> LineRecipe.overruns(tiles);
          case "mixed" -> LineRecipe.mixed(tiles);
          default -> throw new IllegalArgumentException(name);
        };
    long seed = Long.parseLong(words.get(2));
    return LineText.of(
        LineGenerator.of(recipe, seed),
        "Made up: " + words.get(0) + ", " + tiles + " tiles, seed " + seed);
  }

  @Test
  void every_file_is_listed() throws IOException {
    try (Stream<Path> files = Files.list(Lines.SHIPPED)) {
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
  void what_is_made_up_is_what_the_generator_makes() throws IOException {
    for (Listed instance : listed()) {
      if (instance.isMadeUp()) {
        assertThat(Files.readString(Lines.SHIPPED.resolve(instance.path)))
            .as(instance.path)
            .isEqualTo(made(instance.path));
        assertThat(instance.path).startsWith(instance.type + "-");
      }
    }
  }

  /** The nominal load of the treatments, in per cent, is in the class's name; it rises. */
  @Test
  void published_ones_of_a_higher_class_are_loaded_more() throws IOException {
    SortedMap<String, List<Double>> loads = new TreeMap<>();
    for (Listed instance : listed()) {
      if (instance.type.startsWith("load-")) {
        GlazeLine line = Lines.shipped(instance.path);
        assertThat(line.slots()).as(instance.path).isEqualTo(200);
        loads.computeIfAbsent(instance.type, type -> new ArrayList<>()).add(load(line));
      }
    }
    assertThat(loads).hasSize(7);
    assertThat(loads.values().stream().map(ShippedLinesTest::average)).isSorted();
  }

  private static double load(GlazeLine line) {
    return average(
        IntStream.range(0, line.treatments().size())
            .mapToObj(t -> line.tilesWith(t) / (double) line.treatment(t).mostAmong(line.slots()))
            .toList());
  }

  private static double average(List<Double> values) {
    return values.stream().mapToDouble(Double::doubleValue).average().orElseThrow();
  }

  /** Tiles, treatments and kinds as CSPLib lists them (https://www.csplib.org/Problems/prob001). */
  @ParameterizedTest
  @CsvSource({
    "4_72, 100, 22",
    "10_93, 100, 25",
    "16_81, 100, 26",
    "19_71, 100, 23",
    "21_90, 100, 23",
    "41_66, 100, 19",
    "26_82, 100, 24",
    "60-01, 200, 24",
    "90-10, 200, 26"
  })
  void published_ones_are_as_large_as_published(String name, int tiles, int kinds) {
    GlazeLine line = Lines.shipped(name);
    assertThat(line.slots()).isEqualTo(tiles);
    assertThat(line.kinds()).hasSize(kinds);
    assertThat(line.treatments()).hasSize(5).allMatch(Treatment::isStrict);
    assertThat(line.hasCost()).isFalse();
  }

  @Test
  void the_known_cost_of_a_tiny_one_is_the_least_of_all_its_orders() throws IOException {
    GlazeLineFamily family = new GlazeLineFamily();
    for (Listed instance : listed()) {
      if (instance.sets.contains("tiny")) {
        GlazeLine line = Lines.shipped(instance.path);
        assertThat(AllSolutions.minimum(AllSolutions.of(Variant.PLAIN.build(family, line))))
            .as(instance.path)
            .hasValue(Long.parseLong(instance.known));
      }
    }
  }

  @Test
  void no_known_cost_is_below_the_bounds_or_above_a_plan_at_hand() throws IOException {
    for (Listed instance : listed()) {
      if (!instance.known.isEmpty()) {
        GlazeLine line = Lines.shipped(instance.path);
        long known = Long.parseLong(instance.known);
        assertThat(known).as(instance.path).isGreaterThanOrEqualTo(bound(line));
        assertThat(GreedyLine.cost(line).orElse(known)).isGreaterThanOrEqualTo(known);
      }
    }
  }

  private static long bound(GlazeLine line) {
    long overruns =
        line.pricedTreatments().stream()
            .mapToLong(t -> (long) CostBounds.leastOverruns(t, line) * line.treatment(t).excess())
            .sum();
    long runs =
        line.glazes().stream().distinct().mapToLong(g -> CostBounds.leastRuns(g, line)).sum();
    return overruns + line.changeCost() * (runs - 1);
  }
}
