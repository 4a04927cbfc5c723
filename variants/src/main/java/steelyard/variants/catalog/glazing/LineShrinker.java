package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import steelyard.variants.model.Ints;

/**
 * Smaller lines. Each has fewer tiles, kinds or treatments than the one that it is made from, or
 * nothing to say of glazes any more, and no more of anything.
 */
final class LineShrinker {
  private final GlazeLine line;

  private LineShrinker(GlazeLine line) {
    this.line = line;
  }

  /** The boldest step first. */
  static Stream<GlazeLine> of(GlazeLine line) {
    LineShrinker it = new LineShrinker(line);
    return Stream.of(
            it.halfOfEach(),
            it.withoutKinds(),
            it.withoutGlazes(),
            it.withoutTreatments(),
            it.withoutATile())
        .flatMap(smaller -> smaller);
  }

  private Stream<GlazeLine> halfOfEach() {
    boolean isPossible = line.kinds().stream().anyMatch(kind -> kind.tiles() > 1);
    List<Kind> half =
        line.kinds().stream().map(kind -> withTiles(kind, (kind.tiles() + 1) / 2)).toList();
    return isPossible ? Stream.of(withKinds(half)) : Stream.empty();
  }

  private Stream<GlazeLine> withoutKinds() {
    return indices(line.kinds())
        .filter(out -> line.tiles(kind -> true) > line.kinds().get(out).tiles())
        .mapToObj(out -> withKinds(without(out, line.kinds())));
  }

  private Stream<GlazeLine> withoutGlazes() {
    List<Kind> plain =
        line.kinds().stream().map(kind -> new Kind(kind.tiles(), kind.treatments(), 0)).toList();
    return line.hasGlazes()
        ? Stream.of(new GlazeLine(line.treatments(), plain, 0, line.slots()))
        : Stream.empty();
  }

  private Stream<GlazeLine> withoutTreatments() {
    return line.treatments().size() > 1
        ? indices(line.treatments()).mapToObj(this::withoutTreatment)
        : Stream.empty();
  }

  private GlazeLine withoutTreatment(int out) {
    List<Kind> kinds =
        line.kinds().stream()
            .map(kind -> new Kind(kind.tiles(), without(out, kind.treatments()), kind.glaze()))
            .toList();
    List<Treatment> left = without(out, line.treatments());
    return new GlazeLine(left, kinds, line.changeCost(), line.longestRun());
  }

  /** The treatments that are left, by their new numbers. */
  private static Ints without(int out, Ints treatments) {
    return Ints.of(
        treatments.stream().filter(t -> t != out).map(t -> t > out ? t - 1 : t).toArray());
  }

  private Stream<GlazeLine> withoutATile() {
    return indices(line.kinds())
        .filter(k -> line.kinds().get(k).tiles() > 1)
        .mapToObj(
            k -> {
              List<Kind> kinds = new ArrayList<>(line.kinds());
              kinds.set(k, withTiles(kinds.get(k), kinds.get(k).tiles() - 1));
              return withKinds(kinds);
            });
  }

  private GlazeLine withKinds(List<Kind> kinds) {
    return new GlazeLine(line.treatments(), kinds, line.changeCost(), line.longestRun());
  }

  private static Kind withTiles(Kind kind, int tiles) {
    return new Kind(tiles, kind.treatments(), kind.glaze());
  }

  private static IntStream indices(List<?> list) {
    return IntStream.range(0, list.size());
  }

  private static <T> List<T> without(int out, List<T> list) {
    return indices(list).filter(index -> index != out).<T>mapToObj(list::get).toList();
  }
}
