package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import steelyard.variants.model.Ints;

/**
 * Small glazing lines by seed, few enough tiles to try every order: some have no plan, windows
 * longer than the line, kinds of no tiles or a single tile.
 */
final class RandomLine {
  private RandomLine() {}

  /** A line of up to six tiles of up to three kinds. */
  static GlazeLine of(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int treatments = random.nextInt(1, 4);
    List<Treatment> made = new ArrayList<>();
    for (int t = 0; t < treatments; t++) {
      int window = random.nextInt(1, random.nextInt(8) == 0 ? 8 : 5);
      int most = random.nextInt(1, window + 1);
      made.add(new Treatment(most, window, random.nextBoolean() ? 0 : random.nextInt(1, 4)));
    }
    int kinds = random.nextInt(1, 4);
    int[] tiles = new int[kinds];
    for (int i = random.nextInt(1, 7); i > 0; i--) {
      tiles[random.nextInt(kinds)]++;
    }
    List<Kind> ordered =
        IntStream.range(0, kinds).mapToObj(k -> kind(tiles[k], treatments, random)).toList();
    int run = random.nextBoolean() ? 10 : random.nextInt(1, 4);
    return new GlazeLine(made, ordered, random.nextInt(3), run);
  }

  private static Kind kind(int tiles, int treatments, SplittableRandom random) {
    int[] needed = IntStream.range(0, treatments).filter(t -> random.nextInt(5) < 2).toArray();
    return new Kind(tiles, Ints.of(needed), random.nextInt(2));
  }
}
