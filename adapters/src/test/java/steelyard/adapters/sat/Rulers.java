package steelyard.adapters.sat;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Model;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.ModelBuilder;

/**
 * Golomb rulers: marks of which no two pairs are the same distance apart; the shortest is wanted.
 */
final class Rulers {
  private Rulers() {}

  static Model of(int n) {
    return ModelBuilder.of(
        draft -> {
          List<IntVar> marks =
              IntStream.range(0, n)
                  .mapToObj(i -> draft.integer("m" + i, Domain.between(0, n * n)))
                  .toList();
          draft.group("first").post(marks.get(0).eq(0));
          List<IntVar> distances = new ArrayList<>();
          for (int i = 0; i < n; i++) {
            for (int j = i + 1; j < n; j++) {
              draft.group("order").post(marks.get(i).lt(marks.get(j)));
              distances.add(draft.define("d" + i + "." + j, marks.get(j).minus(marks.get(i))));
            }
          }
          draft.group("distances").post(Formula.holds(new AllDifferent(Views.of(distances))));
          draft.minimize(marks.get(n - 1));
        });
  }
}
