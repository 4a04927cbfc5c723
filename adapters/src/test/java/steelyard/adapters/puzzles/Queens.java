package steelyard.adapters.puzzles;

import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Model;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Group;
import steelyard.variants.model.build.ModelBuilder;

/** Queens that do not attack each other, one a column. */
public final class Queens {
  private Queens() {}

  /** On a board of {@code n} by {@code n}; {@code row[i]} counts from 0. */
  public static Model on(int n) {
    return ModelBuilder.of(
        draft -> {
          List<IntVar> rows =
              IntStream.range(0, n)
                  .mapToObj(i -> draft.integer("row[" + i + "]", 0, n - 1))
                  .toList();
          Group lines = draft.group("one queen a line");
          for (int slope = -1; slope <= 1; slope++) {
            int rise = slope;
            List<View> line =
                IntStream.range(0, n).mapToObj(i -> rows.get(i).shifted(rise * i)).toList();
            lines.post(new AllDifferent(Views.of(line)));
          }
        });
  }
}
