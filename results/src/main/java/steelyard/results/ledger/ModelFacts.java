package steelyard.results.ledger;

import java.util.SortedMap;

/**
 * What is known of a model without building it again.
 *
 * @param asBuilt digest of constraints, variables, domains and objective in posting order, nameless
 * @param search digest of branching and hint
 * @param canonical digest free of order, over names
 * @param plainCanonical the canonical digest of the plain model on the same instance
 * @param variables number of variables
 * @param postings number of postings
 * @param groups the groups by name
 */
public record ModelFacts(
    Digest asBuilt,
    Digest search,
    Digest canonical,
    Digest plainCanonical,
    int variables,
    int postings,
    SortedMap<String, Group> groups) {

  public ModelFacts {
    Text.require("asBuilt", asBuilt);
    Text.require("search", search);
    Text.require("canonical", canonical);
    Text.require("plainCanonical", plainCanonical);
    if (variables < 0 || postings < 0) {
      throw new IllegalArgumentException(
          "variables and postings must be at least 0, were %d and %d"
              .formatted(variables, postings));
    }
    groups = Sorted.copy("groups", groups);
    groups.keySet().forEach(name -> Text.requireName("group name", name));
  }

  /**
   * One group of the model.
   *
   * @param digest digest of what was posted under its name
   * @param postings how many postings that is
   */
  public record Group(Digest digest, int postings) {
    public Group {
      Text.require("group digest", digest);
      if (postings < 0) {
        throw new IllegalArgumentException(
            "a group's postings must be at least 0, were " + postings);
      }
    }
  }
}
