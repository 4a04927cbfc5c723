package steelyard.variants.family;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.variants.model.Model;
import steelyard.variants.model.Variables;
import steelyard.variants.model.build.ModelBuilder;
import steelyard.variants.model.judge.Evaluator.Judgement;

/** What a family owes for each of the things that it may give beyond the required. */
class OptionalContractTest {
  private static final String WELL_FORMED = "[a-z][a-z0-9]*(-[a-z0-9]+)*";
  private static final int SEEDS = 20;
  private static final int FEW_DECISIONS = 150;
  private static final int SHRUNK = 60;

  @TempDir private Path folder;

  static Stream<Featured<?>> featured() {
    return GivenFamilies.thatAre(Featured.class).map(family -> (Featured<?>) family);
  }

  static Stream<Generating<?>> generating() {
    return GivenFamilies.thatAre(Generating.class).map(family -> (Generating<?>) family);
  }

  static Stream<Shrinking<?>> shrinking() {
    return GivenFamilies.thatAre(Shrinking.class).map(family -> (Shrinking<?>) family);
  }

  static Stream<Hinting<?>> hinting() {
    return GivenFamilies.thatAre(Hinting.class).map(family -> (Hinting<?>) family);
  }

  static Stream<Recalling<?>> recalling() {
    return GivenFamilies.thatAre(Recalling.class).map(family -> (Recalling<?>) family);
  }

  @ParameterizedTest
  @MethodSource("featured")
  <I> void features_have_the_same_names_on_every_instance_and_finite_values(Featured<I> family) {
    List<SortedMap<String, Double>> all =
        GivenFamilies.instances(family).stream()
            .map(listed -> family.features(GivenFamilies.read(family, listed.path())))
            .toList();
    assertThat(all.get(0)).isNotEmpty();
    for (SortedMap<String, Double> features : all) {
      assertThat(features.keySet())
          .isEqualTo(all.get(0).keySet())
          .allMatch(name -> name.matches(WELL_FORMED));
      assertThat(features.values()).allMatch(Double::isFinite);
    }
    assertThat(all).as("what tells instances apart").doesNotHaveDuplicates();
  }

  @ParameterizedTest
  @MethodSource("generating")
  <I> void made_up_instances_are_small_and_equal_for_equal_seeds(Generating<I> family) {
    for (long seed = 0; seed < SEEDS; seed++) {
      String text = family.generate(seed);
      assertThat(text).isEqualTo(family.generate(seed));
      I instance = GivenFamilies.read(family, text, folder);
      assertThat(plain(family, instance).variables().decisions().size())
          .as("decisions of seed %s", seed)
          .isBetween(1, FEW_DECISIONS);
    }
    assertThat(LongStream.range(0, SEEDS).mapToObj(family::generate).distinct().count())
        .isGreaterThan(SEEDS / 2);
  }

  @ParameterizedTest
  @MethodSource("shrinking")
  <I> void smaller_instances_are_read_and_going_on_from_any_of_them_ends(Shrinking<I> family) {
    for (GivenFamilies.Listed listed : GivenFamilies.instances(family)) {
      if (!listed.sets().contains("tiny")) {
        continue;
      }
      I instance = GivenFamilies.read(family, listed.path());
      int before = plain(family, instance).variables().decisions().size();
      family
          .shrink(instance)
          .forEach(
              text -> {
                I smaller = GivenFamilies.read(family, text, folder);
                assertThat(smaller).isNotEqualTo(instance);
                assertThat(plain(family, smaller).variables().decisions().size())
                    .isLessThanOrEqualTo(before);
              });
      assertThat(shrinkByLast(family, instance)).isLessThan(SHRUNK);
    }
  }

  /** How often the most cautious step can be taken. */
  private <I> int shrinkByLast(Shrinking<I> family, I start) {
    int steps = 0;
    Optional<String> smaller = family.shrink(start).reduce((first, second) -> second);
    while (smaller.isPresent() && steps < SHRUNK) {
      steps++;
      I instance = GivenFamilies.read(family, smaller.get(), folder);
      smaller = family.shrink(instance).reduce((first, second) -> second);
    }
    return steps;
  }

  @ParameterizedTest
  @MethodSource("hinting")
  <I> void hints_name_decisions_and_values_of_their_domains(Hinting<I> family) {
    List<I> instances =
        GivenFamilies.instances(family).stream()
            .filter(listed -> listed.sets().contains("tiny"))
            .map(listed -> GivenFamilies.read(family, listed.path()))
            .toList();
    for (I before : instances) {
      Model model = plain(family, before);
      Answer plan = Answers.of(model, AllSolutions.first(1, model).get(0));
      assertThat(family.hint(before, plan, before)).as("the same day again").isNotEmpty();
      for (I now : instances) {
        Variables variables = plain(family, now).variables();
        family
            .hint(before, plan, now)
            .forEach(
                (name, value) -> {
                  int variable = variables.find(name).orElseThrow();
                  assertThat(variables.isDecision(variable)).as(name).isTrue();
                  assertThat(variables.domain(variable).contains(value)).as(name).isTrue();
                });
      }
    }
  }

  /** The plain model is the one in service: it accepts what production made, at its price. */
  @ParameterizedTest
  @MethodSource("recalling")
  <I> void plain_accepts_known_solutions_at_the_same_objective(Recalling<I> family)
      throws IOException {
    Path known = GivenFamilies.folder(family).resolve("known");
    assertThat(known).isNotEmptyDirectory();
    List<String> names =
        GivenFamilies.instances(family).stream().map(GivenFamilies.Listed::path).toList();
    try (Stream<Path> files = Files.list(known)) {
      files.forEach(file -> assertAccepts(family, file, names));
    }
  }

  private static <I> void assertAccepts(Recalling<I> family, Path file, List<String> names) {
    String name = file.getFileName().toString();
    String owner =
        names.stream().filter(path -> name.startsWith(path + ".")).findFirst().orElseThrow();
    I instance = GivenFamilies.read(family, owner);
    try {
      KnownSolution solution = family.recall(instance, new InstanceSource(name, file));
      Model plain = plain(family, instance);
      Judgement judged = solution.judgedBy(plain);
      assertThat(judged.violations()).as(name).isEmpty();
      assertThat(judged.objective()).as(name).isEqualTo(solution.objective());
      Check check = family.check(instance, Answers.of(plain, judged));
      assertThat(check.problems()).as(name).isEmpty();
      assertThat(check.objective()).as(name).isEqualTo(solution.objective());
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Test
  void a_known_solution_names_what_it_lacks_and_what_is_foreign() {
    Model model = ModelBuilder.of(draft -> draft.integer("x", 0, 3));
    assertThatIllegalArgumentException()
        .isThrownBy(() -> known("y", 1).judgedBy(model))
        .withMessageContaining("does not decide 'x'");
    KnownSolution more = new KnownSolution(new TreeMap<>(known("x", 1).decisions()), none());
    assertThat(more.judgedBy(model).isValid()).isTrue();
    SortedMap<String, Integer> both = new TreeMap<>(known("x", 1).decisions());
    both.put("y", 2);
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new KnownSolution(both, none()).judgedBy(model))
        .withMessageContaining("decides no 'y'");
  }

  private static KnownSolution known(String name, int value) {
    SortedMap<String, Integer> decisions = new TreeMap<>();
    decisions.put(name, value);
    return new KnownSolution(decisions, none());
  }

  private static OptionalLong none() {
    return OptionalLong.empty();
  }

  private static <I> Model plain(Family<I> family, I instance) {
    return Variant.PLAIN.build(family, instance);
  }
}
