package steelyard.results.ledger;

import java.util.List;

/**
 * What a model depends on: equal keys build equal models.
 *
 * @param family the family's name; one jar may hold several
 * @param familyCode digest of the family's code
 * @param content digest of the instance's bytes
 * @param amendments the amendments' names in order; empty for plain
 */
public record RecipeKey(String family, Digest familyCode, Digest content, List<String> amendments) {
  public RecipeKey {
    Text.requireName("family", family);
    Text.require("familyCode", familyCode);
    Text.require("content", content);
    amendments = List.copyOf(Text.require("amendments", amendments));
    amendments.forEach(name -> Text.requireName("amendment", name));
  }
}
