package steelyard.adapters.engine.propagators;

import java.util.Optional;
import java.util.function.BiFunction;
import java.util.function.Predicate;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * A relation over the rows of a scope as the tests see it: the truth, and what its propagation
 * promises.
 *
 * @param rows domains of the rows
 * @param holds whether the relation holds for values of the rows
 * @param poster posts {@code when ⇒ relation}
 * @param body the relation as a propagator of its own, if it has one, for its verdict
 * @param level what the first fixpoint reaches
 * @param given what holds beside the relation, whether that is imposed or not
 * @param givenPoster posts what is given
 */
record Subject(
    String name,
    Rows rows,
    Predicate<int[]> holds,
    Poster poster,
    Optional<BiFunction<Store, Scope, Decidable>> body,
    Level level,
    Predicate<int[]> given,
    Poster givenPoster) {

  /** A relation that stands alone. */
  Subject(
      String name,
      Rows rows,
      Predicate<int[]> holds,
      Poster poster,
      Optional<BiFunction<Store, Scope, Decidable>> body,
      Level level) {
    this(name, rows, holds, poster, body, level, values -> true, (r, s, x, when) -> {});
  }

  /** The same where something else always holds. */
  Subject given(Predicate<int[]> always, Poster alwaysPoster) {
    return new Subject(name, rows, holds, poster, body, level, always, alwaysPoster);
  }

  /** Whether the relation holds, and what always does. */
  boolean isSolution(int[] values) {
    return given.test(values) && holds.test(values);
  }

  /** Posts {@code when ⇒ relation}. */
  interface Poster {
    void post(Relations relations, Store s, Scope x, long when);
  }

  /** How much the first fixpoint removes at least. */
  enum Level {
    SOUND,
    BOUNDS,
    DOMAIN
  }

  /** A relation that is posted through its body. */
  static Subject ofBody(
      String name,
      Rows rows,
      Predicate<int[]> holds,
      Level level,
      BiFunction<Store, Scope, Decidable> body) {
    Poster poster = (relations, s, x, when) -> relations.post(0, when, body.apply(s, x));
    return new Subject(name, rows, holds, poster, Optional.of(body), level);
  }

  @Override
  public String toString() {
    return name;
  }
}
