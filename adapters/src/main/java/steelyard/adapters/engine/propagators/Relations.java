package steelyard.adapters.engine.propagators;

import java.util.Arrays;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * Posts relations in their best native form.
 *
 * <p>Every method takes a condition {@code when}, {@link Atom#TRUE} for a relation that is simply
 * posted, and posts {@code when ⇒ relation}; the relation's other directions are made of that:
 * {@code relation ⇒ when} is {@code not(when) ⇒ negation} for linear relations, or {@link
 * #entails}.
 */
public final class Relations {
  /** An entry of a tuple that stands for every value. */
  public static final int ANY = Table.ANY;

  private final Network network;
  private final Store store;

  /** Posts into {@code network}. */
  public Relations(Network network) {
    this.network = network;
    store = network.store();
  }

  /** {@code when ⇒} some of the atoms is true. */
  public void clause(int tag, long when, long... atoms) {
    long[] all = Arrays.copyOf(atoms, atoms.length + 1);
    all[atoms.length] = Atom.not(when);
    network.clause(tag, all);
  }

  /** {@code when ⇒ sum ≤ bound}. */
  public void atMost(int tag, long when, Sum sum, long bound) {
    if (sum.max(store) <= bound) {
      return;
    }
    if (sum.min(store) > bound) {
      network.clause(tag, Atom.not(when));
      return;
    }
    long divisor = sum.divisor();
    Sum terms = sum.dividedBy(divisor);
    long most = Math.floorDiv(bound - sum.constant(), divisor);
    if (terms.max(store) - most <= terms.leastCoefficient()) {
      clause(tag, when, someBelowMax(terms));
    } else if (terms.size() == 1) {
      clause(tag, when, Atom.le(terms.handle(0), (int) most));
    } else if (terms.size() == 2 && terms.unit()) {
      network.difference(tag, terms.handle(0), -most, terms.handle(1) ^ 1, when);
    } else {
      post(tag, when, new LinearAtMost(terms, most));
    }
  }

  private long[] someBelowMax(Sum terms) {
    long[] atoms = new long[terms.size()];
    for (int i = 0; i < atoms.length; i++) {
      atoms[i] = Atom.le(terms.handle(i), store.max(terms.handle(i)) - 1);
    }
    return atoms;
  }

  /** {@code when ⇒ sum ≥ bound}. */
  public void atLeast(int tag, long when, Sum sum, long bound) {
    atMost(tag, when, sum.negated(), -bound);
  }

  /** {@code when ⇒ sum = value}. */
  public void equal(int tag, long when, Sum sum, long value) {
    if (!reachable(sum, value)) {
      network.clause(tag, Atom.not(when));
    } else if (sum.size() > 0) {
      equalReduced(
          tag, when, sum.dividedBy(sum.divisor()), (value - sum.constant()) / sum.divisor());
    }
  }

  private void equalReduced(int tag, long when, Sum terms, long total) {
    if (terms.size() == 1) {
      clause(tag, when, Atom.eq(terms.handle(0), (int) total));
    } else if (terms.size() == 2 && terms.unit()) {
      atMost(tag, when, terms, total);
      atLeast(tag, when, terms, total);
    } else {
      post(tag, when, new LinearEqual(terms, total));
    }
  }

  /** {@code when ⇒ sum ≠ value}. */
  public void unequal(int tag, long when, Sum sum, long value) {
    if (!reachable(sum, value)) {
      return;
    }
    if (sum.size() == 0) {
      network.clause(tag, Atom.not(when));
      return;
    }
    Sum terms = sum.dividedBy(sum.divisor());
    long total = (value - sum.constant()) / sum.divisor();
    if (terms.size() == 1) {
      clause(tag, when, Atom.ne(terms.handle(0), (int) total));
    } else {
      post(tag, when, new LinearUnequal(terms, total));
    }
  }

  /** Whether the sum may be {@code value} by its bounds and the divisor of its coefficients. */
  private boolean reachable(Sum sum, long value) {
    long divisor = sum.divisor();
    return sum.min(store) <= value
        && sum.max(store) >= value
        && (divisor == 0 || (value - sum.constant()) % divisor == 0);
  }

  /** {@code when ⇒} the rows are pairwise different, to the given level. */
  public void allDifferent(int tag, long when, Scope x, Level level) {
    if (x.size() < 2) {
      return;
    }
    if (store.truth(when) > 0) {
      network.post(new AllDifferentValues(x), tag);
    }
    post(
        tag,
        when,
        level == Level.DOMAIN && AllDifferentDomain.fits(store, x)
            ? new AllDifferentDomain(store, x)
            : new AllDifferentBounds(x));
  }

  /** Whether {@link #allowed} takes the tuples: no column with {@link #ANY} is too wide. */
  public boolean fits(Scope x, int[] tuples) {
    return Table.fits(store, x, tuples);
  }

  /**
   * {@code when ⇒} the rows take one of the tuples, one after the other; they {@link #fits fit}.
   */
  public void allowed(int tag, long when, Scope x, int[] tuples) {
    post(tag, when, new Table(store, x, tuples));
  }

  /** {@code when ⇒} the rows take none of the tuples, given one after the other. */
  public void forbidden(int tag, long when, Scope x, int[] tuples) {
    int n = x.size();
    for (int t = 0; t < tuples.length; t += n) {
      long[] atoms = new long[n];
      for (int i = 0; i < n; i++) {
        atoms[i] = tuples[t + i] == Table.ANY ? Atom.FALSE : x.ne(i, tuples[t + i]);
      }
      clause(tag, when, atoms);
    }
  }

  /** {@code when ⇒ array[index] = result}, counted from 0, the index within the array. */
  public void element(int tag, long when, Scope array, Scope index, Scope result) {
    if (array.size() == 0) {
      clause(tag, when);
    } else {
      post(tag, when, new Element(store, array, index, result));
    }
  }

  /** {@code when ⇒} the result is the greatest of the terms. */
  public void maximum(int tag, long when, Scope terms, Scope result) {
    post(tag, when, new Maximum(terms, result));
  }

  /** {@code when ⇒} no two tasks overlap. */
  public void noOverlap(int tag, long when, TaskScope tasks) {
    post(tag, when, new NoOverlap(tasks));
  }

  /** {@code when ⇒} at any time the demands of the tasks that run sum to at most the capacity. */
  public void cumulative(int tag, long when, TaskScope tasks, Scope demands, Scope capacity) {
    post(tag, when, new Cumulative(store, tasks, demands, capacity));
  }

  /** {@code when ⇒} the items' sizes in each bin sum to its load. */
  public void binPacking(int tag, long when, Scope bins, long[] sizes, Scope loads) {
    post(tag, when, new BinPacking(bins, sizes, loads));
  }

  /** {@code when ⇒ body}. */
  public void post(int tag, long when, Decidable body) {
    int truth = store.truth(when);
    if (truth > 0) {
      network.post(body, tag);
    } else if (truth == 0) {
      network.post(new Implied(when, body), tag);
    }
  }

  /** {@code body ⇒ then}, by the body's verdict alone. */
  public void entails(int tag, Decidable body, long then) {
    if (store.truth(then) <= 0) {
      network.post(new Entails(body, then), tag);
    }
  }
}
