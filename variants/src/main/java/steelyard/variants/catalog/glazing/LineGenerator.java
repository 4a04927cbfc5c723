package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import steelyard.variants.model.Ints;

/**
 * Makes up glazing lines. Kinds are made first, then tiles pass in an order that keeps every strict
 * rule, and what has passed is what is ordered: every line that is made has a plan.
 */
final class LineGenerator {
  /** Most, window; the first for strict treatments, from the other end for priced ones. */
  private static final List<Ints> ROOMS =
      List.of(
          Ints.of(1, 2),
          Ints.of(2, 3),
          Ints.of(1, 3),
          Ints.of(2, 5),
          Ints.of(1, 5),
          Ints.of(2, 7),
          Ints.of(1, 4),
          Ints.of(3, 8),
          Ints.of(2, 6));

  private final LineRecipe recipe;
  private final SplittableRandom random;
  private final List<Treatment> treatments = new ArrayList<>();
  private final List<Kind> kinds = new ArrayList<>();
  private final List<Integer> passed = new ArrayList<>();

  private LineGenerator(LineRecipe recipe, long seed) {
    this.recipe = recipe;
    this.random = new SplittableRandom(seed);
  }

  /**
   * A line by the recipe.
   *
   * @param seed equal seeds give equal lines
   */
  static GlazeLine of(LineRecipe recipe, long seed) {
    LineGenerator generator = new LineGenerator(recipe, seed);
    generator.treatments();
    generator.kinds();
    while (generator.passed.size() < recipe.tiles()) {
      generator.passed.add(generator.next());
    }
    return generator.line();
  }

  /**
   * A line with few tiles. Now and then one of its rules is stricter than those that its tiles were
   * made to keep, so that it may have no plan.
   *
   * @param seed equal seeds give equal lines
   */
  static GlazeLine smallest(long seed) {
    GlazeLine line = of(LineRecipe.smallest(seed), seed);
    if (new SplittableRandom(~seed).nextInt(4) > 0) {
      return line;
    }
    List<Treatment> stricter = new ArrayList<>(line.treatments());
    Treatment first = stricter.get(0);
    stricter.set(0, new Treatment(first.most(), first.window() + 1, first.excess()));
    return new GlazeLine(stricter, line.kinds(), line.changeCost(), line.longestRun());
  }

  private void treatments() {
    for (int t = 0; t < recipe.strict() + recipe.priced(); t++) {
      boolean isStrict = t < recipe.strict();
      int row = isStrict ? t : recipe.strict() + recipe.priced() - 1 - t;
      Ints room = ROOMS.get(isStrict ? row % ROOMS.size() : ROOMS.size() - 1 - row % ROOMS.size());
      treatments.add(new Treatment(room.get(0), room.get(1), isStrict ? 0 : 1 + random.nextInt(5)));
    }
  }

  /** The first ones, one of each glaze, need nothing that is strict: one can always follow. */
  private void kinds() {
    for (int k = 0; k < recipe.kinds(); k++) {
      boolean isEasy = k < recipe.glazes();
      int[] needed =
          IntStream.range(0, treatments.size())
              .filter(t -> !(isEasy && treatments.get(t).isStrict()) && random.nextInt(5) < 2)
              .toArray();
      int glaze = isEasy ? k : random.nextInt(recipe.glazes());
      kinds.add(new Kind(0, Ints.of(needed), glaze));
    }
  }

  /** Of two that can come next, the one that needs more. */
  private int next() {
    List<Integer> fitting = IntStream.range(0, kinds.size()).filter(this::fits).boxed().toList();
    int one = fitting.get(random.nextInt(fitting.size()));
    int other = fitting.get(random.nextInt(fitting.size()));
    return kinds.get(one).treatments().size() >= kinds.get(other).treatments().size() ? one : other;
  }

  private boolean fits(int kind) {
    Kind wanted = kinds.get(kind);
    return wanted.treatments().stream().allMatch(this::hasRoom)
        && last(recipe.longestRun()).stream().filter(k -> k.glaze() == wanted.glaze()).count()
            < recipe.longestRun();
  }

  private boolean hasRoom(int number) {
    Treatment treatment = treatments.get(number);
    return !treatment.isStrict()
        || last(treatment.window() - 1).stream().filter(k -> k.needs(number)).count()
            < treatment.most();
  }

  private List<Kind> last(int tiles) {
    return passed.subList(Math.max(0, passed.size() - tiles), passed.size()).stream()
        .map(kinds::get)
        .toList();
  }

  private GlazeLine line() {
    List<Kind> ordered = new ArrayList<>();
    for (int k = 0; k < kinds.size(); k++) {
      int kind = k;
      int tiles = (int) passed.stream().filter(p -> p == kind).count();
      if (tiles > 0) {
        ordered.add(new Kind(tiles, kinds.get(k).treatments(), kinds.get(k).glaze()));
      }
    }
    return new GlazeLine(treatments, ordered, recipe.changeCost(), recipe.longestRun());
  }
}
