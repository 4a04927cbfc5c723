package steelyard.harness.sweep;

import java.util.ArrayList;
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
   * @param variants each once, its amendments in order of declaration
   * @param leftOut how many combinations were left out
   */
  record Chosen(List<Variant> variants, int leftOut) {}

  private final FamilyVersions versions;
  private final Set<Variant> variants = new LinkedHashSet<>();
  private int leftOut;

  VariantsReader(FamilyVersions versions) {
    this.versions = versions;
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

  /** The variant of that name; empty, and a mistake, if there is none. */
  private Optional<Variant> named(Field field) {
    return base(field).map(Based::variant);
  }

  /** A variant together with the version of the family that it belongs to. */
  private record Based(Catalogue.Family family, Variant variant) {}

  private Optional<Based> base(Field field) {
    Optional<FamilyVersions.Parts> read = field.text().map(FamilyVersions.Parts::of);
    if (read.isEmpty()) {
      return Optional.empty();
    }
    FamilyVersions.Parts parts = read.get();
    Optional<Catalogue.Family> family = version(field, parts.alias());
    if (family.isPresent() && !parts.isPlain()) {
      String text = field.text().orElse("");
      String fix =
          family.get().names().contains(parts.words().get(0)) ? "; write plain+" + text : "";
      field.mistake(
          "a variant's name starts with 'plain', " + Phrases.quoted(text) + " does not" + fix);
      return Optional.empty();
    }
    return family.flatMap(
        it ->
            amendments(field, it, parts.amendments())
                .map(chosen -> new Variant(chosen, parts.alias()))
                .filter(chosen -> isValid(field, it, chosen))
                .map(chosen -> new Based(it, chosen)));
  }

  private Optional<Catalogue.Family> version(Field field, Optional<String> alias) {
    Optional<Catalogue.Family> version = versions.of(alias);
    if (version.isEmpty()) {
      if (alias.isPresent()) {
        field.unknown("version", alias.get(), versions.aliases());
      } else {
        field.mistake(
            "which version of " + versions.name() + "? write plain@" + versions.aliases().get(0),
            "its versions: " + String.join(", ", versions.aliases()));
      }
    }
    return version;
  }

  private static boolean isValid(Field field, Catalogue.Family family, Variant chosen) {
    Optional<String> conflict = family.conflict(chosen.amendments());
    conflict.ifPresent(why -> field.mistake(chosen.name() + " is no variant: " + why));
    return conflict.isEmpty();
  }

  private static Optional<List<String>> amendments(
      Field field, Catalogue.Family family, List<String> names) {
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
    Optional<Based> base = onto.isPresent() ? base(onto.get()) : plain(item);
    if (base.isPresent()) {
      variants.add(base.get().variant());
      one.flatMap(field -> chosen(field, base.get().family()))
          .ifPresent(names -> addOneAtATime(one.get(), base.get(), names));
      subsets
          .flatMap(field -> chosen(field, base.get().family()))
          .ifPresent(names -> addSubsets(subsets.get(), base.get(), names));
    }
  }

  private Optional<Based> plain(Field item) {
    return version(item, Optional.empty()).map(family -> new Based(family, Variant.of(List.of())));
  }

  private static Optional<List<String>> chosen(Field field, Catalogue.Family family) {
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
      name.flatMap(n -> amendments(item, family, List.of(n))).ifPresent(names::addAll);
    }
    if (new HashSet<>(names).size() < names.size()) {
      field.mistake("an amendment comes twice");
      return Optional.empty();
    }
    return Optional.of(names);
  }

  private void addOneAtATime(Field field, Based base, List<String> names) {
    Catalogue.Family family = base.family();
    for (String name : names) {
      List<String> wanted = new ArrayList<>(base.variant().amendments());
      wanted.add(name);
      Variant chosen = new Variant(family.withRequired(wanted), base.variant().alias());
      if (field.isSingle() && family.conflict(chosen.amendments()).isPresent()) {
        leftOut++;
      } else if (isValid(field, family, chosen)) {
        variants.add(chosen);
      }
    }
  }

  private void addSubsets(Field field, Based base, List<String> names) {
    if (names.size() > MOST_COMBINED) {
      field.mistake(names.size() + " amendments; at most " + MOST_COMBINED + " are combined");
      return;
    }
    List<String> before = base.variant().amendments();
    List<String> added = names.stream().filter(name -> !before.contains(name)).toList();
    for (int subset = 0; subset < 1 << added.size(); subset++) {
      Set<String> wanted = new HashSet<>(before);
      for (int i = 0; i < added.size(); i++) {
        if ((subset >> i & 1) == 1) {
          wanted.add(added.get(i));
        }
      }
      if (base.family().conflict(wanted).isEmpty()) {
        variants.add(new Variant(base.family().inOrder(wanted), base.variant().alias()));
      } else {
        leftOut++;
      }
    }
  }
}
