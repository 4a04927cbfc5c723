package steelyard.variants.family;

import static java.util.Comparator.comparingInt;
import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.OptionalLong;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.TreeMap;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Model;
import steelyard.variants.model.Role;
import steelyard.variants.model.Variables;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.Evaluator.Judgement;

/** What every family owes, on each family that is found and its smallest instances. */
class FamilyContractTest {
  private static final String WELL_FORMED = "[a-z][a-z0-9]*(-[a-z0-9]+)*";

  /** How many amendments are combined in every way: fewer of a family that has many. */
  private static int together(Family<?> family) {
    return family.amendments().size() > 15 ? 2 : 3;
  }

  /** A family with one of its instances. */
  private record Case<I>(Family<I> family, String name, I instance) {
    Model build(Variant variant) {
      return variant.build(family, instance);
    }

    int decisions() {
      return build(Variant.PLAIN).variables().decisions().size();
    }

    @Override
    public String toString() {
      return family.name() + " " + name;
    }
  }

  static Stream<Family<?>> families() {
    return GivenFamilies.all();
  }

  static Stream<Case<?>> cases() {
    return families().flatMap(FamilyContractTest::tiny);
  }

  /** Of each family the one with fewest decisions: all its assignments can be tried. */
  static Stream<Case<?>> smallestCases() {
    return families().map(family -> tiny(family).min(comparingInt(Case::decisions)).orElseThrow());
  }

  /** The family's instances of the set {@code tiny}. */
  private static <I> Stream<Case<?>> tiny(Family<I> family) {
    return GivenFamilies.instances(family).stream()
        .filter(listed -> listed.sets().contains("tiny"))
        .map(
            listed -> new Case<>(family, listed.path(), GivenFamilies.read(family, listed.path())));
  }

  @Test
  void families_have_names_of_their_own() {
    List<String> names = families().map(family -> family.name()).toList();
    assertThat(names).isNotEmpty().doesNotHaveDuplicates().allMatch(n -> n.matches(WELL_FORMED));
  }

  @ParameterizedTest
  @MethodSource("families")
  <I> void amendments_have_names_of_their_own_and_know_each_other(Family<I> family) {
    List<String> names = family.amendments().stream().map(Amendment::name).toList();
    assertThat(names).doesNotHaveDuplicates().allMatch(name -> name.matches(WELL_FORMED));
    assertThat(family.summary()).isNotBlank().doesNotContain("\n");
    for (Amendment<I> amendment : family.amendments()) {
      assertThat(names).containsAll(amendment.requires()).containsAll(amendment.excludes());
      assertThat(amendment.summary()).isNotBlank().doesNotContain("\n");
    }
  }

  @ParameterizedTest
  @MethodSource("cases")
  <I> void roles_are_labelled_alike_with_and_without_an_instance(Case<I> of) {
    for (Amendment<I> amendment : of.family.amendments()) {
      Role role = amendment.role(of.instance);
      assertThat(role.label()).as(amendment.name()).isEqualTo(amendment.roleLabel());
    }
  }

  @ParameterizedTest
  @MethodSource("smallestCases")
  <I> void variants_build_alike_twice_and_keep_the_decisions_of_plain(Case<I> of) {
    Model plain = of.build(Variant.PLAIN);
    for (Variant variant : variants(of.family)) {
      Model model = of.build(variant);
      Model again = of.build(variant);
      assertThat(model.asBuilt()).as(variant.name()).isEqualTo(again.asBuilt());
      assertThat(model.search()).as(variant.name()).isEqualTo(again.search());
      assertThat(plain.variables().decisions().stream())
          .as(variant.name())
          .allMatch(v -> model.variables().find(plain.variables().name(v)).isPresent());
    }
  }

  /** Every choice of up to so many amendments that can stand together, with what they require. */
  private static <I> Set<Variant> variants(Family<I> family) {
    Set<Set<String>> chosen = new LinkedHashSet<>(Set.of(Set.of()));
    for (int size = 0; size < together(family); size++) {
      for (Set<String> smaller : List.copyOf(chosen)) {
        for (Amendment<I> amendment : family.amendments()) {
          Set<String> larger = new LinkedHashSet<>(smaller);
          addWithRequired(amendment.name(), family, larger);
          if (isPossible(larger, family)) {
            chosen.add(larger);
          }
        }
      }
    }
    Set<Variant> variants = new LinkedHashSet<>();
    chosen.forEach(names -> variants.add(Variant.of(family, names)));
    return variants;
  }

  private static <I> void addWithRequired(String name, Family<I> family, Set<String> names) {
    if (names.add(name)) {
      named(name, family).requires().forEach(needed -> addWithRequired(needed, family, names));
    }
  }

  private static <I> boolean isPossible(Set<String> names, Family<I> family) {
    return names.stream()
        .flatMap(name -> named(name, family).excludes().stream())
        .noneMatch(names::contains);
  }

  private static <I> Amendment<I> named(String name, Family<I> family) {
    return family.amendments().stream()
        .filter(a -> a.name().equals(name))
        .findFirst()
        .orElseThrow();
  }

  @ParameterizedTest
  @MethodSource("smallestCases")
  <I> void the_checker_agrees_with_the_model_on_solutions_and_on_what_is_next_to_them(Case<I> of) {
    Model plain = of.build(Variant.PLAIN);
    List<Judgement> solutions = AllSolutions.first(50, plain);
    assertThat(solutions).isNotEmpty();
    SplittableRandom random = new SplittableRandom(17);
    int wrong = 0;
    for (Judgement solution : solutions) {
      assertAgree(of, plain, solution);
      for (int[] neighbour : neighbours(plain, solution, random)) {
        Judgement judged = new Evaluator(plain).judge(neighbour);
        assertAgree(of, plain, judged);
        wrong += judged.isValid() ? 0 : 1;
      }
    }
    assertThat(wrong).as("answers to reject").isPositive();
  }

  private static <I> void assertAgree(Case<I> of, Model plain, Judgement judged) {
    Answer answer = Answers.of(plain, judged);
    Check check = of.family.check(of.instance, answer);
    assertThat(check.isRight()).as("%s: %s", answer, check).isEqualTo(judged.isValid());
    if (judged.isValid()) {
      assertThat(check.objective()).as("%s", answer).isEqualTo(judged.objective());
    }
  }

  /** The solution with one decision after the other changed to another value of its domain. */
  private static List<int[]> neighbours(Model plain, Judgement solution, SplittableRandom random) {
    int[] decisions = AllSolutions.decisions(plain, solution);
    Variables variables = plain.variables();
    List<int[]> neighbours = new ArrayList<>();
    for (int i = 0; i < decisions.length; i++) {
      Domain domain = variables.domain(variables.decisions().get(i));
      int[] values = domain.stream().toArray();
      int[] changed = decisions.clone();
      changed[i] = values[random.nextInt(values.length)];
      neighbours.add(changed);
    }
    return neighbours;
  }

  @ParameterizedTest
  @MethodSource("smallestCases")
  <I> void the_checker_names_what_is_missing_whenGiven_an_empty_answer(Case<I> of) {
    Answer empty = new Answer(new TreeMap<>(), OptionalLong.empty());
    assertThat(of.family.check(of.instance, empty).problems()).isNotEmpty();
  }

  @ParameterizedTest
  @MethodSource("smallestCases")
  <I> void answers_are_shown_in_80_columns(Case<I> of) {
    Model plain = of.build(Variant.PLAIN);
    Answer answer = Answers.of(plain, AllSolutions.first(1, plain).get(0));
    assertThat(of.family.show(of.instance, answer))
        .isNotBlank()
        .satisfies(text -> assertThat(text.lines()).allMatch(line -> line.length() <= 80));
  }
}
