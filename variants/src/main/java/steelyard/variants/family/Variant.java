package steelyard.variants.family;

import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import steelyard.variants.model.Model;
import steelyard.variants.model.Origin;
import steelyard.variants.model.build.ModelBuilder;
import steelyard.variants.model.build.ModelException;

/**
 * The plain model plus a set of amendments.
 *
 * @param amendments in the family's order of declaration
 */
public record Variant(List<String> amendments) {
  public static final Variant PLAIN = new Variant(List.of());

  public Variant {
    amendments = List.copyOf(amendments);
  }

  /** {@code plain}, or {@code plain+first+second}. */
  public String name() {
    return amendments.isEmpty() ? Origin.PLAIN : Origin.PLAIN + "+" + String.join("+", amendments);
  }

  /**
   * The variant of {@code family} with the named amendments, in any order.
   *
   * @throws ModelException if a name is unknown, a required amendment is missing or two exclude
   *     each other
   */
  public static <I> Variant of(Family<I> family, Collection<String> names) {
    Set<String> wanted = new LinkedHashSet<>(names);
    List<String> ordered = new ArrayList<>();
    for (Amendment<I> amendment : family.amendments()) {
      if (wanted.contains(amendment.name())) {
        ordered.add(amendment.name());
        requireCompany(amendment, wanted);
      }
    }
    wanted.removeAll(ordered);
    if (!wanted.isEmpty()) {
      String known =
          family.amendments().stream().map(Amendment::name).collect(Collectors.joining(", "));
      throw new ModelException(
          family.name() + " has no amendment " + wanted + "; it has: " + known);
    }
    return new Variant(ordered);
  }

  private static <I> void requireCompany(Amendment<I> amendment, Set<String> wanted) {
    for (String needed : amendment.requires()) {
      if (!wanted.contains(needed)) {
        throw new ModelException(amendment.name() + " requires " + needed);
      }
    }
    for (String barred : amendment.excludes()) {
      if (wanted.contains(barred)) {
        throw new ModelException(amendment.name() + " excludes " + barred);
      }
    }
  }

  /**
   * Builds the variant's model on one instance.
   *
   * @throws ModelException if the family or an amendment writes what cannot be
   */
  public <I> Model build(Family<I> family, I instance) {
    ModelBuilder builder = new ModelBuilder();
    family.plain(instance, builder.plain());
    for (Amendment<I> amendment : family.amendments()) {
      if (amendments.contains(amendment.name())) {
        amendment.apply(
            instance,
            builder.amend(amendment.name(), amendment.role(instance), amendment.requires()));
      }
    }
    return builder.build();
  }
}
