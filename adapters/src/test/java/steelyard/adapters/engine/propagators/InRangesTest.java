package steelyard.adapters.engine.propagators;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Stop;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.search.Limits;
import steelyard.adapters.engine.search.Ordered;
import steelyard.adapters.engine.search.Search;
import steelyard.adapters.engine.search.ValueOrder;
import steelyard.adapters.engine.search.VariableOrder;

class InRangesTest {
  static Stream<Integer> seeds() {
    return IntStream.range(0, 40).boxed();
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void leavesExactlyTheRanges(int seed) {
    Random random = new Random(seed);
    int count = 1 + random.nextInt(4);
    int[] from = new int[count];
    int[] to = new int[count];
    int next = random.nextInt(3);
    for (int r = 0; r < count; r++) {
      from[r] = next;
      to[r] = next + random.nextInt(3);
      next = to[r] + 2 + random.nextInt(3);
    }
    Store s = new Store();
    int h = s.variable(-3, 30);
    Network network = new Network(s);
    network.post(new InRanges(h, from, to), 0);
    int barred = random.nextInt(12);
    network.clause(0, Atom.ne(h, barred));
    int[] expected =
        IntStream.range(0, count)
            .flatMap(r -> IntStream.rangeClosed(from[r], to[r]))
            .filter(v -> v != barred)
            .toArray();
    ValueOrder pick = seed % 2 == 0 ? ValueOrder.MIN : ValueOrder.UPPER_HALF;
    int[] found = new int[expected.length + 1];
    int[] size = {0};
    new Search(network, new Ordered(network, Scope.of(h), VariableOrder.INPUT, pick, 0))
        .onSolution(
            solution -> {
              found[size[0]++] = solution.min(h);
              return true;
            })
        .run(Limits.NONE, Stop.NEVER);
    assertThat(IntStream.of(found).limit(size[0]).sorted()).containsExactly(box(expected));
  }

  private static Integer[] box(int[] values) {
    return IntStream.of(values).boxed().toArray(Integer[]::new);
  }
}
