package steelyard.harness.sweep;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import steelyard.harness.sweep.text.Field;
import steelyard.harness.sweep.text.Keys;
import steelyard.harness.sweep.text.Mistakes;
import steelyard.harness.sweep.text.Phrases;

/**
 * Reads one family's part of a sweep file: its variants, instances, pairs and who is in service.
 */
final class ContestReader {

  /** The keys that it reads. */
  static final List<String> KEYS =
      List.of("family", "variants", "instances", "in-service", "pairs");

  private static final int MOST_CANDIDATES = 1000;

  private final Catalogue catalogue;
  private final Path base;
  private final List<Setup> setups;
  private final Mistakes mistakes;
  private final List<String> remarks = new ArrayList<>();

  /**
   * A reader.
   *
   * @param setups empty if the file's backends are not known: then nothing is said of candidates
   */
  ContestReader(Catalogue catalogue, Path base, List<Setup> setups, Mistakes mistakes) {
    this.catalogue = catalogue;
    this.base = base;
    this.setups = setups;
    this.mistakes = mistakes;
  }

  /** What the file left open and how it was taken. */
  List<String> remarks() {
    return remarks;
  }

  /** The contest; empty if the file has mistakes by now. */
  Optional<Contest> read(Field whole, Keys keys) {
    Optional<Field> named = keys.required("family", "family: workshop");
    Optional<Field> variants = keys.required("variants", "variants: {one-at-a-time: all}");
    Optional<FamilyVersions> family = named.flatMap(this::family);
    if (family.isEmpty() || variants.isEmpty()) {
      return Optional.empty();
    }
    int before = mistakes.count();
    VariantsReader.Chosen chosen = new VariantsReader(family.get()).read(variants.get());
    List<Candidate> candidates =
        mistakes.count() == before ? candidates(variants.get(), chosen) : List.of();
    List<Instance> instances =
        new InstancesReader(base, family.get().main(), mistakes)
            .read(keys.optional("instances"), whole);
    return candidates.isEmpty()
        ? Optional.empty()
        : contest(keys, family.get(), candidates, instances, chosen.leftOut());
  }

  private Optional<FamilyVersions> family(Field field) {
    Optional<String> name = field.text();
    Optional<FamilyVersions> family = name.flatMap(it -> FamilyVersions.find(catalogue, it));
    if (name.isPresent() && family.isEmpty()) {
      field.unknown(
          "family", name.get(), catalogue.families().stream().map(f -> f.name()).toList());
    }
    return family;
  }

  private List<Candidate> candidates(Field field, VariantsReader.Chosen chosen) {
    List<Candidate> candidates = new ArrayList<>();
    for (Variant variant : chosen.variants()) {
      setups.forEach(setup -> candidates.add(new Candidate(variant, setup)));
    }
    if (candidates.size() > MOST_CANDIDATES) {
      field.mistake(
          Phrases.count(chosen.variants().size(), "variant")
              + " on "
              + Phrases.count(setups.size(), "backend setting")
              + " are "
              + candidates.size()
              + " candidates; at most "
              + MOST_CANDIDATES);
    }
    return candidates;
  }

  private Optional<Contest> contest(
      Keys keys,
      FamilyVersions family,
      List<Candidate> candidates,
      List<Instance> instances,
      int leftOut) {
    CandidateNames names = new CandidateNames(family, candidates);
    Optional<Field> named = keys.optional("in-service");
    Optional<Candidate> inService =
        named.isPresent() ? named.flatMap(names::read) : Optional.of(byDefault(candidates));
    Optional<Field> paired = keys.optional("pairs");
    List<Pair> pairs =
        paired.isPresent()
            ? pairs(paired.get(), names)
            : inService.map(c -> againstInService(candidates, c)).orElse(List.of());
    if (mistakes.count() > 0 || inService.isEmpty()) {
      return Optional.empty();
    }
    if (named.isEmpty()) {
      remarks.add(family.name() + ": no in-service given, taken: " + inService.get().name());
    }
    if (leftOut > 0) {
      String combinations = Phrases.count(leftOut, "combination");
      remarks.add(family.name() + ": " + combinations + " left out, ruled out by the family");
    }
    return Optional.of(
        new Contest(
            family.name(), family.codes(), candidates, inService.get(), pairs, instances, leftOut));
  }

  /** Plain on the first backend; the first candidate where plain does not take part. */
  private static Candidate byDefault(List<Candidate> candidates) {
    return candidates.stream()
        .filter(candidate -> candidate.variant().amendments().isEmpty())
        .findFirst()
        .orElse(candidates.get(0));
  }

  private static List<Pair> againstInService(List<Candidate> candidates, Candidate inService) {
    return candidates.stream()
        .filter(candidate -> !candidate.equals(inService))
        .map(candidate -> new Pair(inService, candidate))
        .toList();
  }

  private static List<Pair> pairs(Field field, CandidateNames names) {
    Set<Pair> pairs = new LinkedHashSet<>();
    for (Field item : field.items()) {
      List<Field> sides = item.items();
      if (sides.size() == 2) {
        pair(item, names.read(sides.get(0)), names.read(sides.get(1))).ifPresent(pairs::add);
      } else if (!sides.isEmpty()) {
        item.mistake(
            "a pair has two candidates, before and after, found " + sides.size(),
            "for example: [plain on sat, plain on cpsat]");
      }
    }
    return List.copyOf(pairs);
  }

  private static Optional<Pair> pair(
      Field item, Optional<Candidate> before, Optional<Candidate> after) {
    if (before.isPresent() && before.equals(after)) {
      item.mistake(before.get().name() + " is paired with itself");
      return Optional.empty();
    }
    return before.flatMap(b -> after.map(a -> new Pair(b, a)));
  }
}
