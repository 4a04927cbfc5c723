package steelyard.variants.catalog.kilns;

import java.util.List;
import java.util.stream.LongStream;
import java.util.stream.Stream;

/** The campaigns that ship with the tool, class by class. */
final class ShippedCampaigns {
  private ShippedCampaigns() {}

  /**
   * One of them.
   *
   * @param kind its class
   */
  record Shipped(String kind, Recipe recipe, long seed) {
    String name() {
      return kind + "-" + seed;
    }

    /** The instance file's text. */
    String text() {
      return CampaignText.of(
          CampaignGenerator.of(recipe, seed), "class " + kind + ", made up from seed " + seed);
    }
  }

  static List<Shipped> all() {
    return Stream.of(
            of("tiny", new Recipe(3, 2, 2, 2, 3, 40, 4, 3, 30, 50, 30, 20, 60, 0), 1, 2, 3, 4, 5),
            of("small", new Recipe(8, 2, 1, 3, 4, 30, 6, 4, 30, 50, 15, 20, 60, 1), 1, 2, 3, 4, 5),
            of("medium", new Recipe(14, 2, 2, 3, 5, 30, 8, 5, 30, 50, 25, 15, 60, 1), 1, 2, 3, 4),
            of("large", new Recipe(104, 5, 2, 4, 6, 25, 14, 6, 30, 50, 15, 10, 70, 0), 1, 2, 3, 4),
            of(
                "tight-shelves",
                new Recipe(12, 2, 2, 2, 3, 20, 10, 6, 40, 40, 10, 10, 200, 0),
                1,
                2,
                3,
                4),
            of(
                "many-glazes",
                new Recipe(12, 2, 1, 2, 9, 60, 8, 3, 20, 50, 15, 10, 120, 0),
                1,
                2,
                3,
                4),
            of(
                "tight-days",
                new Recipe(12, 3, 2, 3, 4, 30, 8, 4, 30, 50, 10, 15, 15, 0),
                1,
                2,
                3,
                4))
        .flatMap(shipped -> shipped)
        .toList();
  }

  private static Stream<Shipped> of(String kind, Recipe recipe, long... seeds) {
    return LongStream.of(seeds).mapToObj(seed -> new Shipped(kind, recipe, seed));
  }
}
