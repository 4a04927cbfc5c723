package steelyard.adapters.puzzles;

import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Model;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.Group;
import steelyard.variants.model.build.ModelBuilder;

/** Pigeons of which no two share a hole: possible if and only if there are as many holes. */
public final class Pigeonholes {
  private Pigeonholes() {}

  /** Said of all of them at once. */
  public static Model together(int pigeons, int holes) {
    return ModelBuilder.of(
        draft ->
            draft
                .group("one a hole")
                .post(new AllDifferent(Views.of(pigeons(draft, pigeons, holes)))));
  }

  /** Said of each two. */
  public static Model byPairs(int pigeons, int holes) {
    return ModelBuilder.of(
        draft -> {
          List<IntVar> in = pigeons(draft, pigeons, holes);
          Group group = draft.group("one a hole");
          for (int i = 0; i < pigeons; i++) {
            for (int j = i + 1; j < pigeons; j++) {
              group.post(in.get(i).ne(in.get(j)));
            }
          }
        });
  }

  private static List<IntVar> pigeons(Draft draft, int pigeons, int holes) {
    return IntStream.range(0, pigeons)
        .mapToObj(i -> draft.integer("hole[" + i + "]", 0, holes - 1))
        .toList();
  }
}
