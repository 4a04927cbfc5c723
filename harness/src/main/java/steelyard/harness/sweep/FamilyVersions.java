package steelyard.harness.sweep;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Collectors;
import steelyard.results.ledger.Digest;

/**
 * All that there is of one family: its code as installed or given without an alias, and others by
 * alias, such as yesterday's and today's.
 *
 * @param all at least one, of one name, each alias once
 */
record FamilyVersions(List<Catalogue.Family> all) {
  FamilyVersions {
    all = List.copyOf(all);
  }

  /** The family of that name; empty if there is none. */
  static Optional<FamilyVersions> find(Catalogue catalogue, String name) {
    List<Catalogue.Family> found =
        catalogue.families().stream().filter(family -> family.name().equals(name)).toList();
    return found.isEmpty() ? Optional.empty() : Optional.of(new FamilyVersions(found));
  }

  String name() {
    return all.get(0).name();
  }

  /** The version without an alias where there is one, else the first: it gives the instances. */
  Catalogue.Family main() {
    return all.stream().filter(f -> f.alias().isEmpty()).findFirst().orElse(all.get(0));
  }

  /** The version that a variant asks for; without an alias the only one or the one without. */
  Optional<Catalogue.Family> of(Optional<String> alias) {
    if (alias.isEmpty() && all.size() == 1) {
      return Optional.of(all.get(0));
    }
    return all.stream().filter(family -> family.alias().equals(alias)).findFirst();
  }

  List<String> aliases() {
    return all.stream().flatMap(family -> family.alias().stream()).toList();
  }

  /** The digest of each version's code, by alias; that without one under the empty text. */
  SortedMap<String, Digest> codes() {
    SortedMap<String, Digest> codes = new TreeMap<>();
    all.forEach(family -> codes.put(family.alias().orElse(""), family.code()));
    return codes;
  }

  /** A variant's name in its parts. */
  record Parts(List<String> words, Optional<String> alias) {
    static Parts of(String variant) {
      int at = variant.lastIndexOf(Variant.AT);
      String model = at < 0 ? variant : variant.substring(0, at);
      return new Parts(
          Arrays.stream(model.split("\\+", -1)).map(String::strip).collect(Collectors.toList()),
          at < 0 ? Optional.empty() : Optional.of(variant.substring(at + 1).strip()));
    }

    boolean isPlain() {
      return words.get(0).equals(Variant.PLAIN);
    }

    List<String> amendments() {
      return words.subList(1, words.size());
    }
  }
}
