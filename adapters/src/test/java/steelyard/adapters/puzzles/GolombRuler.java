package steelyard.adapters.puzzles;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Model;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Group;
import steelyard.variants.model.build.ModelBuilder;

/** The shortest ruler on which no distance between two marks comes twice. */
public final class GolombRuler {
  private GolombRuler() {}

  /**
   * With {@code marks} marks, at least 2; {@code mark[i]} ascends from 0 to at most marks squared,
   * below which every shortest ruler of OEIS A003022 stays.
   */
  public static Model of(int marks) {
    return ModelBuilder.of(
        draft -> {
          List<IntVar> at =
              IntStream.range(0, marks)
                  .mapToObj(i -> draft.integer("mark[" + i + "]", i, i == 0 ? 0 : marks * marks))
                  .toList();
          Group ascending = draft.group("marks ascend");
          List<IntVar> distances = new ArrayList<>();
          for (int i = 0; i < marks; i++) {
            for (int j = i + 1; j < marks; j++) {
              distances.add(
                  draft.define("distance[" + i + "," + j + "]", at.get(j).minus(at.get(i))));
            }
            if (i > 0) {
              ascending.post(at.get(i - 1).lt(at.get(i)));
            }
          }
          draft.group("no distance twice").post(new AllDifferent(Views.of(distances)));
          draft.minimize(at.get(marks - 1));
        });
  }
}
