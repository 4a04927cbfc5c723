package steelyard.harness.sweep;

import java.util.Collections;
import java.util.HashSet;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Recipe;

/**
 * One family's part of a sweep: who is compared on what.
 *
 * @param family the family's name
 * @param codes digest of the family's code by alias; that without one under the empty text
 * @param candidates each once, in the order of the sweep file; at least one
 * @param inService the candidate that the others are held against; one of them
 * @param pairs what is to be shown before against after
 * @param instances at least one, by unique names
 * @param leftOut how many combinations of amendments were left out because they cannot be combined
 */
public record Contest(
    String family,
    SortedMap<String, Digest> codes,
    List<Candidate> candidates,
    Candidate inService,
    List<Pair> pairs,
    List<Instance> instances,
    int leftOut) {

  public Contest {
    Objects.requireNonNull(family, "family");
    codes = Collections.unmodifiableSortedMap(new TreeMap<>(codes));
    candidates = List.copyOf(candidates);
    pairs = List.copyOf(pairs);
    instances = List.copyOf(instances);
    for (Candidate candidate : candidates) {
      Optional<String> alias = candidate.variant().alias();
      if (alias.isPresent() && !codes.containsKey(alias.get())) {
        throw new IllegalArgumentException("no code for " + candidate);
      }
    }
    if (!candidates.contains(inService)) {
      throw new IllegalArgumentException(inService + " is in service and not a candidate");
    }
    if (new HashSet<>(candidates).size() < candidates.size()) {
      throw new IllegalArgumentException("a candidate comes twice: " + candidates);
    }
    for (Pair pair : pairs) {
      if (!candidates.contains(pair.before()) || !candidates.contains(pair.after())) {
        throw new IllegalArgumentException("no candidates: " + pair);
      }
    }
    if (instances.isEmpty()
        || instances.stream().map(Instance::name).distinct().count() < instances.size()) {
      throw new IllegalArgumentException("instances must be some, with names of their own");
    }
  }

  /** How a candidate's model on an instance is made. */
  public Recipe recipe(Candidate candidate, Instance instance) {
    Variant variant = candidate.variant();
    return new Recipe(
        family,
        variant.alias(),
        codes.get(variant.alias().orElse(onlyAlias())),
        instance.forRecipe(),
        variant.amendments(),
        variant.name());
  }

  private String onlyAlias() {
    return codes.size() == 1 ? codes.firstKey() : "";
  }
}
