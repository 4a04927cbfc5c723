package steelyard.variants.model;

import java.util.Objects;

/**
 * No two of the views have the same value, except that any number of them may share a value of
 * {@code except}. True of fewer than two views; a view that stands there twice must take one of
 * {@code except}.
 *
 * <pre>{@code
 * // Every lot has a shelf of its own; 0 means that it is shipped at once.
 * draft.group("own shelf").post(AllDifferentExcept.of(Views.of(shelves), 0));
 * }</pre>
 *
 * @param except distinct
 */
public record AllDifferentExcept(Views scope, Ints except) implements Relation {

  public AllDifferentExcept {
    Objects.requireNonNull(scope, "scope");
    except.requireDistinctValues("an excepted value");
  }

  /** No two of the views have the same value other than {@code except}. */
  public static AllDifferentExcept of(Views scope, int... except) {
    return new AllDifferentExcept(scope, Ints.of(except));
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.allDifferentExcept(this);
  }

  @Override
  public AllDifferentExcept rewrite(Rewriting rewriting) {
    Views mapped = scope.mapped(rewriting);
    return new AllDifferentExcept(
        mapped.permuted(rewriting.rows(mapped.size(), mapped::compareRows)),
        except.permuted(rewriting.rows(except.size(), except::compareRows)));
  }

  @Override
  public String kind() {
    return "all-different-except";
  }
}
