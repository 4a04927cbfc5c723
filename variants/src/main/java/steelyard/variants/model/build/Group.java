package steelyard.variants.model.build;

import java.util.Collection;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Relation;

/** Constraints posted under one name. */
public interface Group {
  /** Asserts that the formula holds. */
  void post(Formula formula);

  /** Asserts that the relation holds. */
  default void post(Relation relation) {
    post(Formula.holds(relation));
  }

  /** Asserts that each of the formulas holds. */
  default void postAll(Collection<? extends Formula> formulas) {
    formulas.forEach(this::post);
  }
}
