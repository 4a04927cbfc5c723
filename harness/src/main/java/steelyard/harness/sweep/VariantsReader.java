package steelyard.harness.sweep;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import steelyard.harness.sweep.text.Field;
import steelyard.harness.sweep.text.Keys;
import steelyard.harness.sweep.text.Phrases;

/**
 * Reads {@code variants}: names, or sets of amendments to be combined.
 *
 * <p>A name is {@code plain} or {@code plain+a+b}, in any order; it comes out in the family's order
 * of declaration. A combination that the family rules out is a mistake where it is named, and left
 * out and counted where it is one of all. One at a time means: with what it requires.
 */
final class VariantsReader {

  private static final String SUBSETS = "all-subsets-of";
  private static final String ONE = "one-at-a-time";
  private static final String ONTO = "onto";
  private static final String ALL = "all";
  private static final int MOST_COMBINED = 10;

  /**
   * What was chosen.
   *
   * @param variants the amendments of each, in order of declaration; each variant once
   * @param leftOut how many combinations were left out
   */
  record Chosen(List<List<String>> variants, int leftOut) {}

  private final Catalogue.Family family;
  private final Set<List<String>> variants = new LinkedHashSet<>();
  private int leftOut;

  VariantsReader(Catalogue.Family family) {
    this.family = family;
  }

  Chosen read(Field field) {
    for (Field item : field.itemsOrAlone()) {
      if (item.isSingle()) {
        named(item).ifPresent(variants::add);
      } else {
        readCombinations(item);
      }
    }
    return new Chosen(List.copyOf(variants), leftOut);
  }

  /** The amendments of a variant by its name; empty, and a mistake, if there is no such variant. */
  private Optional<List<String>> named(Field field) {
    Optional<String> text = field.text();
    if (text.isEmpty()) {
      return Optional.empty();
    }
    List<String> parts = parts(text.get());
    if (!parts.get(0).equals(Candidate.PLAIN)) {
      String fix = family.names().contains(parts.get(0)) ? "; write plain+" + text.get() : "";
      field.mistake(
          "a variant's name starts with 'plain', "
              + Phrases.quoted(text.get())
              + " does not"
              + fix);
      return Optional.empty();
    }
    return amendments(field, parts.subList(1, parts.size()))
        .filter(chosen -> isValid(field, chosen));
  }

  static List<String> parts(String variant) {
    return Arrays.stream(variant.split("\\+", -1)).map(String::strip).toList();
  }

  private boolean isValid(Field field, List<String> chosen) {
    Optional<String> conflict = family.conflict(chosen);
    conflict.ifPresent(why -> field.mistake(Candidate.variant(chosen) + " is no variant: " + why));
    return conflict.isEmpty();
  }

  private Optional<List<String>> amendments(Field field, List<String> names) {
    for (String name : names) {
      if (!family.names().contains(name)) {
        field.unknown("amendment", name, family.names());
        return Optional.empty();
      }
    }
    if (new HashSet<>(names).size() < names.size()) {
      field.mistake("an amendment comes twice");
      return Optional.empty();
    }
    return Optional.of(family.inOrder(names));
  }

  private void readCombinations(Field item) {
    Keys keys = Keys.of(item, List.of(SUBSETS, ONE, ONTO));
    Optional<Field> subsets = keys.optional(SUBSETS);
    Optional<Field> one = keys.optional(ONE);
    if (subsets.isEmpty() && one.isEmpty() && item.hasKeys()) {
      item.mistake("says neither " + SUBSETS + " nor " + ONE);
    }
    Optional<Field> onto = keys.optional(ONTO);
    Optional<List<String>> base = onto.isPresent() ? named(onto.get()) : Optional.of(List.of());
    if (base.isPresent()) {
      variants.add(base.get());
      one.flatMap(this::chosen).ifPresent(names -> addOneAtATime(one.get(), base.get(), names));
      subsets
          .flatMap(this::chosen)
          .ifPresent(names -> addSubsets(subsets.get(), base.get(), names));
    }
  }

  private Optional<List<String>> chosen(Field field) {
    if (field.isSingle()) {
      Optional<String> text = field.text();
      if (text.isPresent() && text.get().equals(ALL)) {
        return Optional.of(family.names());
      }
      text.ifPresent(
          word ->
              field.mistake(
                  "expected 'all' or a list of amendments, found " + Phrases.quoted(word)));
      return Optional.empty();
    }
    List<String> names = new ArrayList<>();
    for (Field item : field.items()) {
      Optional<String> name = item.text();
      name.flatMap(n -> amendments(item, List.of(n))).ifPresent(names::addAll);
    }
    if (new HashSet<>(names).size() < names.size()) {
      field.mistake("an amendment comes twice");
      return Optional.empty();
    }
    return Optional.of(names);
  }

  private void addOneAtATime(Field field, List<String> base, List<String> names) {
    for (String name : names) {
      List<String> wanted = new ArrayList<>(base);
      wanted.add(name);
      List<String> chosen = family.withRequired(wanted);
      if (field.isSingle() && family.conflict(chosen).isPresent()) {
        leftOut++;
      } else if (isValid(field, chosen)) {
        variants.add(chosen);
      }
    }
  }

  private void addSubsets(Field field, List<String> base, List<String> names) {
    if (names.size() > MOST_COMBINED) {
      field.mistake(names.size() + " amendments; at most " + MOST_COMBINED + " are combined");
      return;
    }
    List<String> added = names.stream().filter(name -> !base.contains(name)).toList();
    for (int subset = 0; subset < 1 << added.size(); subset++) {
      Set<String> wanted = new HashSet<>(base);
      for (int i = 0; i < added.size(); i++) {
        if ((subset >> i & 1) == 1) {
          wanted.add(added.get(i));
        }
      }
      if (family.conflict(wanted).isEmpty()) {
        variants.add(family.inOrder(wanted));
      } else {
        leftOut++;
      }
    }
  }
}
