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

  private final Catalogue.Family family;
  private final Map<String, Candidate> byName = new LinkedHashMap<>();

  CandidateNames(Catalogue.Family family, List<Candidate> candidates) {
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
    List<String> parts = VariantsReader.parts(matcher.group(1));
    List<String> amendments = family.inOrder(parts.subList(1, parts.size()));
    boolean whole = parts.get(0).equals(Candidate.PLAIN) && amendments.size() == parts.size() - 1;
    return (whole ? Candidate.variant(amendments) : matcher.group(1)) + " on " + matcher.group(2);
  }
}
