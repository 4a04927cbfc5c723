package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalLong;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.AllSolutions;
import steelyard.variants.family.Variant;

/**
 * The campaigns that ship are what the generator makes from their seeds. Run with {@code
 * -Dsteelyard.regenerate=true} to write them anew.
 */
class ShippedCampaignsTest {
  /** A row of the table of instances. */
  private record Listed(String path, List<String> sets, String kind, String known) {
    static Listed of(String row) {
      List<String> cells = List.of(row.split(",", -1));
      return new Listed(
          cells.get(0), List.of(cells.get(1).split(";", -1)), cells.get(2), cells.get(5));
    }
  }

  private static List<Listed> listed() throws IOException {
    return Files.readAllLines(Campaigns.SHIPPED.resolve("instances.csv")).stream()
        .skip(1)
        .map(Listed::of)
        .toList();
  }

  @BeforeAll
  static void regenerate() throws IOException {
    if (Boolean.getBoolean("steelyard.regenerate")) {
      for (ShippedCampaigns.Shipped campaign : ShippedCampaigns.all()) {
        Files.writeString(Campaigns.SHIPPED.resolve(campaign.name()), campaign.text());
      }
    }
  }

  @Test
  void every_file_is_what_the_generator_makes() throws IOException {
    for (ShippedCampaigns.Shipped campaign : ShippedCampaigns.all()) {
      assertThat(Campaigns.SHIPPED.resolve(campaign.name())).content().isEqualTo(campaign.text());
    }
  }

  @Test
  void every_file_is_listed_under_its_class() throws IOException {
    try (Stream<Path> files = Files.list(Campaigns.SHIPPED)) {
      assertThat(
              files
                  .filter(Files::isRegularFile)
                  .map(file -> file.getFileName().toString())
                  .filter(name -> !name.contains(".")))
          .containsExactlyInAnyOrderElementsOf(listed().stream().map(Listed::path).toList());
    }
    assertThat(listed().stream().map(row -> row.path + " " + row.kind))
        .containsExactlyElementsOf(
            ShippedCampaigns.all().stream().map(c -> c.name() + " " + c.kind()).toList());
    assertThat(listed()).allMatch(row -> row.sets.contains("all"));
    assertThat(listed()).allMatch(row -> row.sets.contains(row.kind));
  }

  @Test
  void the_largest_have_more_than_a_hundred_lots_and_the_smallest_two_or_three() {
    assertThat(lots("large")).allMatch(lots -> lots > 100);
    assertThat(lots("tiny")).allMatch(lots -> lots == 2 || lots == 3);
  }

  private static Stream<Integer> lots(String kind) {
    return ShippedCampaigns.all().stream()
        .filter(campaign -> campaign.kind().equals(kind))
        .map(campaign -> Campaigns.shipped(campaign.name()).lots().size());
  }

  @Test
  void known_optima_of_tiny_ones_are_the_cheapest_of_all_their_plans() throws IOException {
    for (Listed row : listed()) {
      if (row.kind.equals("tiny")) {
        OptionalLong cheapest =
            AllSolutions.minimum(
                AllSolutions.of(
                    Variant.PLAIN.build(new KilnFamily(), Campaigns.shipped(row.path))));
        assertThat(cheapest)
            .as(row.path)
            .isEqualTo(OptionalLong.of(row.known.isEmpty() ? -1 : Long.parseLong(row.known)));
      }
    }
  }

  /** No known optimum is above a plan at hand. */
  @Test
  void known_optima_cost_no_more_than_the_greedy_plan() throws IOException {
    for (Listed row : listed()) {
      Campaign campaign = Campaigns.shipped(row.path);
      Plan greedy = GreedyPlan.of(campaign).orElseThrow();
      long cost = Campaigns.answer(campaign, greedy).objective().orElseThrow();
      assertThat(row.known.isEmpty() ? 0 : Long.parseLong(row.known))
          .as(row.path)
          .isLessThanOrEqualTo(cost);
    }
  }
}
