package steelyard.variants.family;

import java.util.Set;
import steelyard.variants.model.Role;
import steelyard.variants.model.build.Change;

/**
 * One named change to a family's model.
 *
 * @param <I> the family's instances
 */
public interface Amendment<I> {
  /** Lower case, digits and hyphens. */
  String name();

  /** What it changes and why it might help, in one sentence. */
  String summary();

  /** What it claims about itself; its rights and its audit follow from that. */
  Role role(I instance);

  /**
   * The role's {@link Role#label()}, known without an instance.
   *
   * @return implied, dominance, symmetry, reformulation or search
   */
  String roleLabel();

  void apply(I instance, Change change);

  /** Amendments of the family without which this one means nothing or is not true. */
  default Set<String> requires() {
    return Set.of();
  }

  /** Amendments of the family that cannot stand beside this one. */
  default Set<String> excludes() {
    return Set.of();
  }
}
