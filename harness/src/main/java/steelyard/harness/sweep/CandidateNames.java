package steelyard.harness.sweep;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import steelyard.harness.sweep.text.Field;

/** Finds a sweep's candidates by the names that people write, amendments in any order. */
final class CandidateNames {

  private static final Pattern NAME = Pattern.compile("(.+?)\\s+on\\s+(\\S+)");

  private final FamilyVersions family;
  private final Map<String, Candidate> byName = new LinkedHashMap<>();

  CandidateNames(FamilyVersions family, List<Candidate> candidates) {
    this.family = family;
    candidates.forEach(candidate -> byName.put(candidate.name(), candidate));
  }

  /** The candidate that the field names; empty, and a mistake, if there is none. */
  Optional<Candidate> read(Field field) {
    return field
        .text()
        .flatMap(
            text -> {
              Candidate candidate = byName.get(ordered(text));
              if (candidate == null) {
                field.unknown("candidate", text, byName.keySet());
              }
              return Optional.ofNullable(candidate);
            });
  }

  private String ordered(String text) {
    Matcher matcher = NAME.matcher(text);
    if (!matcher.matches()) {
      return text;
    }
    return ordered(FamilyVersions.Parts.of(matcher.group(1))).orElse(matcher.group(1))
        + " on "
        + matcher.group(2);
  }

  private Optional<String> ordered(FamilyVersions.Parts parts) {
    return family
        .of(parts.alias())
        .map(version -> version.inOrder(parts.amendments()))
        .filter(chosen -> parts.isPlain() && chosen.size() == parts.amendments().size())
        .map(chosen -> new Variant(chosen, parts.alias()).name());
  }
}
