package steelyard.adapters.engine.core;

/**
 * The weighted degree of each variable: the constraints on it, each with one more than the
 * conflicts it has found.
 *
 * <p>Source: Boussemart, Hemery, Lecoutre and Sais (2004), Boosting systematic search by weighting
 * constraints, ECAI 146-150. Differing from the paper, a constraint keeps counting when its other
 * variables are fixed, which makes this a look-up.
 */
final class Weights {
  private final long[] weight;
  private final Lists scopes;
  private final Clauses clauses;
  private final Arcs arcs;

  /** The degrees, before any conflict; {@code scopes} are the variables of each propagator. */
  Weights(int variables, Lists scopes, Clauses clauses, Arcs arcs) {
    weight = new long[variables];
    this.scopes = scopes;
    this.clauses = clauses;
    this.arcs = arcs;
    for (int p = 0; p < scopes.count(); p++) {
      bump(p);
    }
    for (int c = 0; c < clauses.size(); c++) {
      bumpClause(c);
    }
    for (int a = 0; a < arcs.size(); a++) {
      bumpArc(a);
    }
  }

  long of(int variable) {
    return weight[variable];
  }

  void bump(int propagator) {
    for (int i = 0; i < scopes.size(propagator); i++) {
      weight[scopes.get(propagator, i)]++;
    }
  }

  void bumpClause(int clause) {
    for (int i = clauses.first(clause); i < clauses.end(clause); i++) {
      weight[Atom.variable(clauses.literal(i))]++;
    }
  }

  void bumpArc(int arc) {
    weight[arcs.source(arc) >> 1]++;
    weight[arcs.target(arc) >> 1]++;
    weight[Atom.variable(arcs.when(arc))]++;
  }
}
