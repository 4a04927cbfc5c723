package steelyard.adapters.cpsat;

import com.google.ortools.sat.LinearConstraintProto;
import java.util.LinkedHashMap;
import java.util.Map;
import steelyard.variants.model.Atom;
import steelyard.variants.model.View;

/** A sum of weighted literals and views; terms over one place are collected. */
final class Weights {
  private final Map<Integer, Long> byPlace = new LinkedHashMap<>();
  private long constant;

  /** Adds {@code weight} where the canonical atom holds. */
  void add(long weight, Atom canonical, Literals literals) {
    if (canonical.isConstant()) {
      constant += canonical.equals(Atom.TRUE) ? weight : 0;
      return;
    }
    int literal = literals.of(canonical);
    if (literal >= 0) {
      byPlace.merge(literal, weight, Long::sum);
    } else {
      constant += weight;
      byPlace.merge(ModelProto.negated(literal), -weight, Long::sum);
    }
  }

  /** Adds {@code factor·view}. */
  void add(long factor, View view, Places places) {
    constant += factor * view.offset();
    if (!view.isConstant()) {
      byPlace.merge(places.of(view.variable()), factor * view.sign(), Long::sum);
    }
  }

  boolean isConstant() {
    byPlace.values().removeIf(weight -> weight == 0);
    return byPlace.isEmpty();
  }

  long constant() {
    return constant;
  }

  /** The sum without its constant. */
  LinearConstraintProto.Builder terms() {
    LinearConstraintProto.Builder terms = LinearConstraintProto.newBuilder();
    byPlace.forEach((place, weight) -> terms.addVars(place).addCoeffs(weight));
    return terms;
  }
}
