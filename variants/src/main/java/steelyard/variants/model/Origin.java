package steelyard.variants.model;

import java.util.Objects;

/**
 * Who posted a constraint.
 *
 * @param amendment the amendment's name; {@link #PLAIN} for the plain model
 * @param group the group's name
 * @param index position within the group, from 0
 */
public record Origin(String amendment, String group, int index) {
  /** The plain model, where an amendment's name would stand. */
  public static final String PLAIN = "plain";

  public Origin {
    Objects.requireNonNull(amendment, "amendment");
    Objects.requireNonNull(group, "group");
  }

  /** The group's name with the amendment that posted it, unless plain did. */
  public String qualifiedGroup() {
    return amendment.equals(PLAIN) ? group : amendment + "/" + group;
  }

  @Override
  public String toString() {
    return qualifiedGroup() + "[" + index + "]";
  }
}
