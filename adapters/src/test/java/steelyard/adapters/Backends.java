package steelyard.adapters;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.ServiceLoader;
import java.util.stream.Stream;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.provider.Arguments;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.variants.model.Model;
import steelyard.variants.model.judge.Evaluator.Judgement;

/** The backends on the class path, for tests that ask the same of each. */
final class Backends {
  private Backends() {}

  static List<Backend> all() {
    List<Backend> backends = new ArrayList<>();
    ServiceLoader.load(Backend.class).forEach(backends::add);
    return backends;
  }

  /** Each row once for each backend, which comes before it and is shown by its name. */
  static Stream<Arguments> onEach(Object[]... rows) {
    return all().stream()
        .flatMap(
            backend ->
                Stream.of(rows)
                    .map(
                        row -> {
                          List<Object> arguments = new ArrayList<>(List.of(row));
                          arguments.add(0, Named.of(backend.describe().name(), backend));
                          return Arguments.of(arguments.toArray());
                        }));
  }

  static Object[] row(Object... cells) {
    return cells;
  }

  /**
   * All solutions of the model, each of which is valid and comes once.
   *
   * @param seconds a safety net: no answer takes nearly as long
   */
  static List<Judgement> solutions(Backend backend, Model model, long seconds) {
    Goal all = new Goal.Enumerate(model.variables().decisions(), Long.MAX_VALUE);
    Told told = Told.by(backend, model, all, 0, seconds);
    assertThat(told.outcome().ended()).isEqualTo(Why.EXHAUSTED);
    assertThat(told.solutions()).allMatch(Judgement::isValid);
    assertThat(told.solutions().stream().map(Judgement::complete)).doesNotHaveDuplicates();
    return told.solutions();
  }
}
