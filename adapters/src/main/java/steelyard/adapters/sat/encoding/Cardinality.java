package steelyard.adapters.sat.encoding;

/** Encodings of how many of some literals are true. */
final class Cardinality {
  static final String PAIRWISE = "pairwise";
  static final String COUNTER = "sequential counter (Sinz 2005)";
  static final String TOTALIZER = "totalizer (Bailleux & Boufkhad 2003)";

  /** Up to so many literals, at most one needs no more clauses pairwise than with a counter. */
  private static final int PAIRWISE_UP_TO = 5;

  private final Cnf cnf;

  Cardinality(Cnf cnf) {
    this.cnf = cnf;
  }

  /** At most {@code most} of {@code literals}, where {@code guard} holds; the encoding's name. */
  String atMost(Literals literals, long most, int guard) {
    if (most == 1 && literals.size() <= PAIRWISE_UP_TO) {
      pairwise(literals, guard);
      return PAIRWISE;
    }
    counter(literals, Math.toIntExact(most), guard);
    return COUNTER;
  }

  /** At most one, pair by pair. */
  void pairwise(Literals literals, int guard) {
    for (int i = 0; i < literals.size(); i++) {
      for (int j = i + 1; j < literals.size(); j++) {
        cnf.clause(-guard, -literals.get(i), -literals.get(j));
      }
    }
  }

  /**
   * At most {@code most}, by counters of each prefix: Sinz (2005), "Towards an Optimal CNF Encoding
   * of Boolean Cardinality Constraints", CP, LNCS 3709:827-831, LT-SEQ. Only what the counters
   * forbid is guarded.
   *
   * @param most at least 1, less than the number of literals
   */
  void counter(Literals literals, int most, int guard) {
    int last = literals.size() - 1;
    int counters = cnf.variables((long) most * last);
    cnf.clause(-literals.get(0), counters);
    for (int j = 1; j < most; j++) {
      cnf.clause(-(counters + j));
    }
    for (int i = 1; i < last; i++) {
      int x = literals.get(i);
      int before = counters + (i - 1) * most;
      int here = before + most;
      cnf.clause(-x, here);
      cnf.clause(-before, here);
      for (int j = 1; j < most; j++) {
        cnf.clause(-x, -(before + j - 1), here + j);
        cnf.clause(-(before + j), here + j);
      }
      cnf.clause(-guard, -x, -(before + most - 1));
    }
    cnf.clause(-guard, -literals.get(last), -(counters + last * most - 1));
  }

  /** Exactly {@code count} of {@code literals}, where {@code guard} holds. */
  void exactly(Literals literals, int count, int guard) {
    Literals sorted = totalizer(literals, count + 1);
    cnf.clause(-guard, sorted.get(count - 1));
    cnf.clause(-guard, -sorted.get(count));
  }

  /**
   * The truth values of {@code literals} in descending order: entry i is true where more than i of
   * them are. Bailleux &amp; Boufkhad (2003), "Efficient CNF Encoding of Boolean Cardinality
   * Constraints", CP, LNCS 2833:108-122.
   *
   * @param most how many entries are wanted
   */
  Literals totalizer(Literals literals, int most) {
    if (literals.size() == 1) {
      return literals;
    }
    int middle = literals.size() / 2;
    Literals a = totalizer(literals.slice(0, middle), most);
    Literals b = totalizer(literals.slice(middle, literals.size()), most);
    Literals sum = new Literals(most);
    for (int i = 0; i < Math.min(most, literals.size()); i++) {
      sum.add(cnf.variable());
    }
    for (int i = 0; i <= a.size(); i++) {
      for (int j = 0; j <= b.size(); j++) {
        int least = Math.min(i + j, sum.size());
        if (least > 0) {
          cnf.clause(negatedAt(a, i), negatedAt(b, j), sum.get(least - 1));
        }
        if (i + j < sum.size()) {
          cnf.clause(at(a, i), at(b, j), -sum.get(i + j));
        }
      }
    }
    return sum;
  }

  /** What says that not {@code count} of the row hold. */
  private static int negatedAt(Literals row, int count) {
    return count == 0 ? Cnf.FALSE : -row.get(count - 1);
  }

  /** What says that more than {@code count} of the row hold. */
  private static int at(Literals row, int count) {
    return count < row.size() ? row.get(count) : Cnf.FALSE;
  }
}
