package steelyard.variants.family;

import java.util.Objects;
import java.util.Set;
import java.util.function.BiConsumer;
import steelyard.variants.model.Role;
import steelyard.variants.model.build.Change;

/** Amendments from a lambda each, for roles that are the same on every instance. */
public final class Amendments {
  private Amendments() {}

  /** A constraint that holds in every solution of the plain model. */
  public static <I> Amendment<I> implied(
      String name, String summary, BiConsumer<I, Change> change) {
    return of(name, summary, new Role.Implied(), change);
  }

  /** A constraint that keeps at least one optimal solution. */
  public static <I> Amendment<I> dominance(
      String name, String summary, BiConsumer<I, Change> change) {
    return of(name, summary, new Role.Dominance(), change);
  }

  /** Other constraints with the same solutions. */
  public static <I> Amendment<I> reformulation(
      String name, String summary, BiConsumer<I, Change> change) {
    return of(name, summary, new Role.Reformulation(), change);
  }

  /** Another branching or hint. */
  public static <I> Amendment<I> search(String name, String summary, BiConsumer<I, Change> change) {
    return of(name, summary, new Role.Search(), change);
  }

  /** The same amendment, which also needs the named ones. */
  public static <I> Amendment<I> requiring(Amendment<I> amendment, String... names) {
    return new Linked<>(amendment, Set.of(names), amendment.excludes());
  }

  /** The same amendment, which cannot stand beside the named ones. */
  public static <I> Amendment<I> excluding(Amendment<I> amendment, String... names) {
    return new Linked<>(amendment, amendment.requires(), Set.of(names));
  }

  private static <I> Amendment<I> of(
      String name, String summary, Role role, BiConsumer<I, Change> change) {
    Objects.requireNonNull(change, "change");
    return new Simple<>(name, summary, role, change);
  }

  private record Simple<I>(
      String name, String summary, Role fixedRole, BiConsumer<I, Change> change)
      implements Amendment<I> {
    @Override
    public Role role(I instance) {
      return fixedRole;
    }

    @Override
    public String roleLabel() {
      return fixedRole.label();
    }

    @Override
    public void apply(I instance, Change draft) {
      change.accept(instance, draft);
    }
  }

  private record Linked<I>(Amendment<I> amendment, Set<String> requires, Set<String> excludes)
      implements Amendment<I> {
    @Override
    public String name() {
      return amendment.name();
    }

    @Override
    public String summary() {
      return amendment.summary();
    }

    @Override
    public Role role(I instance) {
      return amendment.role(instance);
    }

    @Override
    public String roleLabel() {
      return amendment.roleLabel();
    }

    @Override
    public void apply(I instance, Change change) {
      amendment.apply(instance, change);
    }
  }
}
