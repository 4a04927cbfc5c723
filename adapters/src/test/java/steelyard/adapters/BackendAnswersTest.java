package steelyard.adapters;

import static org.assertj.core.api.Assertions.assertThat;
import static steelyard.adapters.Backends.onEach;
import static steelyard.adapters.Backends.row;

import java.io.IOException;
import java.io.InputStream;
import java.net.URL;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.OptionalLong;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.puzzles.GolombRuler;
import steelyard.adapters.puzzles.Pigeonholes;
import steelyard.adapters.puzzles.Queens;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.Model;
import steelyard.variants.model.judge.Evaluator.Judgement;

/** Published answers, found and proved by every backend on the class path. */
class BackendAnswersTest {
  private static final String SERVICE = "META-INF/services/" + Backend.class.getName();

  /** A safety net: no answer here takes nearly as long. */
  private static final long SECONDS = 60;

  @Test
  void every_backend_that_is_registered_is_found() throws IOException {
    List<String> registered = new ArrayList<>();
    for (URL file : Collections.list(getClass().getClassLoader().getResources(SERVICE))) {
      try (InputStream text = file.openStream()) {
        new String(text.readAllBytes(), StandardCharsets.UTF_8)
            .lines()
            .map(String::strip)
            .filter(line -> !line.isEmpty())
            .forEach(registered::add);
      }
    }
    assertThat(registered).isNotEmpty();
    assertThat(Backends.all().stream().map(backend -> backend.getClass().getName()))
        .containsExactlyElementsOf(registered);
    assertThat(Backends.all().stream().map(backend -> backend.describe().name()))
        .doesNotHaveDuplicates();
  }

  static Stream<Arguments> shops() {
    return onEach(
        row("ft06", "plain", 0, 55),
        row("ft06", "plain+no-overlap", 1, 55),
        row("ft06", "plain+no-overlap+orders+order-first", 0, 55),
        row("la01", "plain+no-overlap+load-bound", 0, 666),
        row("la05", "plain+no-overlap+load-bound", 0, 593),
        row("floor-4x4", "plain", 1, 37),
        row("twins-4x3", "plain", 2, 14));
  }

  /**
   * Shortest makespans of ft06 (Fisher and Thompson 1963), la01 and la05 (Lawrence 1984) as listed
   * by Applegate and Cook (1991), ORSA Journal on Computing 3(2):149-156 (cited from memory), and
   * in later tables of best known bounds; of the two made-up ones by trying every order of the
   * moulds at every station.
   */
  @ParameterizedTest
  @MethodSource("shops")
  void proves_the_shortest_makespan(
      Backend backend, String instance, String variant, long seed, long makespan) {
    Shop<?> shop = Shop.of(instance);
    Model model = shop.variant(variant);
    assertProved(Told.by(backend, model, new Goal.Optimise(), seed, SECONDS), makespan)
        .forEach(solution -> shop.assertRight(model, solution));
  }

  static Stream<Arguments> variants() {
    return onEach(Shop.of("twins-4x3").variants().map(Backends::row).toArray(Object[][]::new));
  }

  @ParameterizedTest
  @MethodSource("variants")
  void proves_the_same_makespan_whenGiven(Backend backend, String variant) {
    Model model = Shop.of("twins-4x3").variant(variant);
    assertProved(Told.by(backend, model, new Goal.Optimise(), 0, SECONDS), 14);
  }

  private static List<Judgement> assertProved(Told told, long optimum) {
    assertThat(told.outcome().status()).isEqualTo(Status.OPTIMAL);
    assertThat(told.outcome().ended()).isEqualTo(Why.EXHAUSTED);
    assertThat(told.outcome().bound()).hasValue(optimum);
    assertThat(told.objective()).hasValue(optimum);
    assertThat(told.bounds()).allMatch(bound -> bound <= optimum);
    assertThat(told.solutions())
        .allSatisfy(solution -> assertThat(solution.violations()).isEmpty());
    assertThat(told.solutions())
        .extracting(Judgement::objective)
        .extracting(OptionalLong::getAsLong)
        .isSortedAccordingTo(Collections.reverseOrder());
    return told.solutions();
  }

  static Stream<Arguments> everyBackend() {
    return onEach(row());
  }

  @ParameterizedTest
  @MethodSource("everyBackend")
  void proves_that_no_plan_for_ft06_takes_54_minutes(Backend backend) {
    assertImpossible(Told.by(backend, Shop.of("ft06").within(54), new Goal.Satisfy(), 0, SECONDS));
  }

  private static void assertImpossible(Told told) {
    assertThat(told.solutions()).isEmpty();
    assertThat(told.outcome().status()).isEqualTo(Status.INFEASIBLE);
    assertThat(told.outcome().ended()).isEqualTo(Why.EXHAUSTED);
  }

  static Stream<Arguments> rulers() {
    return onEach(row(2, 1), row(3, 3), row(4, 6), row(5, 11), row(6, 17), row(7, 25));
  }

  /** OEIS A003022: length of the shortest Golomb ruler with n marks. */
  @ParameterizedTest
  @MethodSource("rulers")
  void proves_the_shortest_ruler(Backend backend, int marks, long length) {
    Model model = GolombRuler.of(marks);
    assertProved(Told.by(backend, model, new Goal.Optimise(), 0, SECONDS), length);
  }

  static Stream<Arguments> boards() {
    return onEach(
        row(1, 1), row(2, 0), row(3, 0), row(4, 2), row(5, 10), row(6, 4), row(7, 40), row(8, 92));
  }

  /** OEIS A000170: number of ways to place n queens on a board of n by n. */
  @ParameterizedTest
  @MethodSource("boards")
  void finds_every_placement_of_queens_once(Backend backend, int n, int ways) {
    Model model = Queens.on(n);
    if (backend.describe().goals().contains(Goal.Enumerate.class)) {
      Goal all = new Goal.Enumerate(model.variables().decisions(), Long.MAX_VALUE);
      Told told = Told.by(backend, model, all, n, SECONDS);
      assertThat(told.solutions()).hasSize(ways).allMatch(Judgement::isValid);
      assertThat(told.solutions().stream().map(Judgement::complete)).doesNotHaveDuplicates();
      assertThat(told.outcome().ended()).isEqualTo(Why.EXHAUSTED);
    } else {
      Told told = Told.by(backend, model, new Goal.Satisfy(), n, SECONDS);
      assertThat(told.outcome().status()).isEqualTo(ways > 0 ? Status.FEASIBLE : Status.INFEASIBLE);
    }
  }

  static Stream<Arguments> pigeons() {
    return onEach(row(2), row(5), row(7));
  }

  /** Dirichlet's principle: more pigeons than holes cannot sit alone; as many can. */
  @ParameterizedTest
  @MethodSource("pigeons")
  void proves_that_one_pigeon_too_many_cannot_sit_alone(Backend backend, int holes) {
    Goal any = new Goal.Satisfy();
    assertImpossible(Told.by(backend, Pigeonholes.together(holes + 1, holes), any, 0, SECONDS));
    assertImpossible(Told.by(backend, Pigeonholes.byPairs(holes + 1, holes), any, 0, SECONDS));
    Told told = Told.by(backend, Pigeonholes.byPairs(holes, holes), any, 0, SECONDS);
    assertThat(told.outcome().status()).isEqualTo(Status.FEASIBLE);
    assertThat(told.solutions()).isNotEmpty().allMatch(Judgement::isValid);
  }
}
