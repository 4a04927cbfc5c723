package steelyard.variants.family;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Stream;
import steelyard.variants.model.Model;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Role;
import steelyard.variants.model.Variables;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.Evaluator.Judgement;

/**
 * Shows that a family's amendments are what their roles say, on every solution of small instances.
 *
 * @param <I> the family's instances
 */
public final class Roles<I> {
  private final Family<I> family;
  private final List<Sample<I>> samples;

  private Roles(Family<I> family, List<Sample<I>> samples) {
    this.family = family;
    this.samples = samples;
  }

  /** An instance with all its solutions. */
  private record Sample<I>(I instance, Model plain, List<Judgement> solutions) {
    /** The values that plain's named variables have in a solution of a variant. */
    SortedMap<String, Integer> shared(Model variant, Judgement solution) {
      SortedMap<String, Integer> values = new TreeMap<>();
      Variables variables = variant.variables();
      for (int v = 0; v < variables.size(); v++) {
        if (plain.variables().find(variables.name(v)).isPresent()) {
          values.put(variables.name(v), solution.complete().get(v));
        }
      }
      return values;
    }

    Answer answer(Model variant, Judgement solution) {
      return new Answer(shared(variant, solution), solution.objective());
    }

    Set<Answer> answers(Model variant, List<Judgement> solutions) {
      Set<Answer> answers = new LinkedHashSet<>();
      solutions.forEach(solution -> answers.add(answer(variant, solution)));
      return answers;
    }

    Set<Answer> all() {
      return answers(plain, solutions);
    }

    /** The solutions of the variant, as plain's variables show them. */
    Set<Answer> keptBy(Model variant) {
      if (!variant.variables().decisions().equals(plain.variables().decisions())) {
        return answers(variant, AllSolutions.of(variant));
      }
      Evaluator evaluator = new Evaluator(variant);
      return answers(
          variant,
          solutions.stream()
              .map(solution -> evaluator.judge(AllSolutions.decisions(plain, solution)))
              .filter(Judgement::isValid)
              .toList());
    }

    @Override
    public String toString() {
      return instance.toString();
    }
  }

  /** Solves every instance in every way; those without solutions count too. */
  public static <I> Roles<I> of(Family<I> family, Stream<I> instances) {
    return new Roles<>(family, instances.map(instance -> sample(family, instance)).toList());
  }

  private static <I> Sample<I> sample(Family<I> family, I instance) {
    Model plain = Variant.PLAIN.build(family, instance);
    return new Sample<>(instance, plain, AllSolutions.of(plain));
  }

  /** Fails unless some samples have solutions and some have none. */
  public void assertSomeCanBeSolvedAndSomeCannot() {
    assertThat(samples)
        .anyMatch(sample -> sample.solutions.isEmpty())
        .anyMatch(sample -> !sample.solutions.isEmpty());
  }

  /** Fails unless the amendment, with those that it requires, is what its role says. */
  public void assertTrue(String amendment) {
    String role = named(amendment).roleLabel();
    for (Sample<I> sample : samples) {
      Model variant = variant(amendment).build(family, sample.instance);
      Set<Answer> kept = sample.keptBy(variant);
      switch (role) {
        case "implied", "search" ->
            assertThat(kept).as("%s", sample).containsExactlyElementsOf(sample.all());
        case "reformulation" ->
            assertThat(sample.answers(variant, AllSolutions.of(variant)))
                .as("%s", sample)
                .isEqualTo(sample.all());
        case "dominance" -> assertKeepsABest(sample, kept);
        default -> assertKeepsOneOfEachOrbit(sample, kept, amendment);
      }
    }
  }

  /** Fails unless the amendments together keep a best solution of every sample. */
  public void assertKeepsABest(Set<String> amendments) {
    Variant variant = Variant.of(family, amendments);
    samples.forEach(s -> assertKeepsABest(s, s.keptBy(variant.build(family, s.instance))));
  }

  private void assertKeepsABest(Sample<I> sample, Set<Answer> kept) {
    assertThat(sample.all()).as("%s", sample).containsAll(kept);
    assertThat(kept.isEmpty()).as("%s", sample).isEqualTo(sample.solutions.isEmpty());
    assertThat(kept.stream().mapToLong(a -> a.objective().orElse(0)).min())
        .as("%s", sample)
        .isEqualTo(sample.all().stream().mapToLong(a -> a.objective().orElse(0)).min());
  }

  private void assertKeepsOneOfEachOrbit(Sample<I> sample, Set<Answer> kept, String amendment) {
    assertKeepsABest(sample, kept);
    Role.Symmetry role = (Role.Symmetry) named(amendment).role(sample.instance);
    Set<SortedMap<String, Integer>> all = new HashSet<>();
    sample.solutions.forEach(solution -> all.add(decisions(sample.plain, solution)));
    Set<SortedMap<String, Integer>> left = new HashSet<>();
    kept.forEach(answer -> left.add(decisions(sample.plain, answer)));
    for (SortedMap<String, Integer> solution : all) {
      Set<SortedMap<String, Integer>> orbit = orbit(solution, role.generators());
      assertThat(all).as("%s", sample).containsAll(orbit);
      assertThat(orbit).as("%s", sample).anyMatch(left::contains);
    }
  }

  private static SortedMap<String, Integer> decisions(Model plain, Judgement solution) {
    SortedMap<String, Integer> values = new TreeMap<>();
    plain.variables().decisions().stream()
        .forEach(v -> values.put(plain.variables().name(v), solution.complete().get(v)));
    return values;
  }

  private static SortedMap<String, Integer> decisions(Model plain, Answer answer) {
    SortedMap<String, Integer> values = new TreeMap<>();
    plain.variables().decisions().stream()
        .mapToObj(plain.variables()::name)
        .forEach(name -> values.put(name, answer.value(name)));
    return values;
  }

  /** What the generators make of a solution, one after the other, until nothing new comes. */
  private static Set<SortedMap<String, Integer>> orbit(
      SortedMap<String, Integer> solution, List<Permutation> generators) {
    Set<SortedMap<String, Integer>> orbit = new HashSet<>(Set.of(solution));
    Deque<SortedMap<String, Integer>> open = new ArrayDeque<>(orbit);
    while (!open.isEmpty()) {
      SortedMap<String, Integer> next = open.pop();
      for (Permutation generator : generators) {
        SortedMap<String, Integer> image = new TreeMap<>(next);
        generator.images().forEach((from, to) -> image.put(to, next.get(from)));
        if (orbit.add(image)) {
          open.push(image);
        }
      }
    }
    return orbit;
  }

  /** Fails unless the amendment changes the model, or for a search its branching, of a sample. */
  public void assertChangesSomething(String amendment) {
    Variant without = Variant.of(family, named(amendment).requires());
    assertThat(samples)
        .anyMatch(
            sample -> {
              Model before = without.build(family, sample.instance);
              Model after = variant(amendment).build(family, sample.instance);
              return !before.asBuilt().equals(after.asBuilt())
                  || !before.search().equals(after.search());
            });
  }

  /** Fails unless the amendment leaves out a solution of a sample. */
  public void assertLeavesOutSomething(String amendment) {
    Variant variant = variant(amendment);
    assertThat(samples)
        .anyMatch(s -> s.keptBy(variant.build(family, s.instance)).size() < s.all().size());
  }

  /** The names of the family's amendments of the given roles. */
  public static <I> Stream<String> amendments(Family<I> family, String... roles) {
    return family.amendments().stream()
        .filter(amendment -> List.of(roles).contains(amendment.roleLabel()))
        .map(Amendment::name);
  }

  private Variant variant(String amendment) {
    Set<String> names = new LinkedHashSet<>(named(amendment).requires());
    names.add(amendment);
    return Variant.of(family, names);
  }

  private Amendment<I> named(String name) {
    return family.amendments().stream()
        .filter(amendment -> amendment.name().equals(name))
        .findFirst()
        .orElseThrow();
  }
}
