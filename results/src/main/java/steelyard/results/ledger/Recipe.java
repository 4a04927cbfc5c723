package steelyard.results.ledger;

import java.util.List;
import java.util.Optional;

/**
 * How a run's model is made: a variant of a family on an instance.
 *
 * @param family the family's name
 * @param alias the name of the family's jar in the sweep file, where two stand side by side
 * @param familyCode digest of the family's code
 * @param instance the instance
 * @param amendments the amendments' names in the order in which they were applied; empty for plain
 * @param variant the variant's name as people write it, such as {@code plain+load-bound}, with its
 *     alias where it has one: {@code plain@old}
 */
public record Recipe(
    String family,
    Optional<String> alias,
    Digest familyCode,
    Instance instance,
    List<String> amendments,
    String variant) {

  public Recipe {
    Text.requireName("family", family);
    Text.require("alias", alias).ifPresent(name -> Text.requireName("alias", name));
    Text.require("familyCode", familyCode);
    Text.require("instance", instance);
    amendments = List.copyOf(Text.require("amendments", amendments));
    amendments.forEach(name -> Text.requireName("amendment", name));
    Text.requireName("variant", variant);
  }

  /** What the model depends on, without any name but the family's and the amendments'. */
  public RecipeKey key() {
    return new RecipeKey(family, familyCode, instance.content(), amendments);
  }

  /**
   * One data file of the family.
   *
   * @param name its name within the family
   * @param path where it was read from
   * @param content digest of the file's bytes
   * @param instanceClass its class; {@code "-"} where it has none
   * @param weight its weight in production, positive and finite; 1 where none is given
   */
  public record Instance(
      String name, String path, Digest content, String instanceClass, double weight) {
    public Instance {
      Text.requireName("instance name", name);
      Text.require("instance path", path);
      Text.require("instance content", content);
      Text.requireName("instanceClass", instanceClass);
      if (!(weight > 0) || Double.isInfinite(weight)) {
        throw new IllegalArgumentException(
            "instance weight must be positive and finite, was " + weight);
      }
    }
  }
}
