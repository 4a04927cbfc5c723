package steelyard.adapters.engine;

import java.util.Arrays;
import java.util.stream.IntStream;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.propagators.InRanges;
import steelyard.adapters.engine.propagators.Sum;
import steelyard.adapters.spi.Fresh;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Model;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/** Where the model's variables, views and atoms are in the engine. */
final class Places {
  private static final int NONE = -1;

  /** Values in the gaps of a domain up to which they are removed one by one. */
  private static final long MOST_HOLES = 4096;

  private final Network network;
  private final Store store;
  private final Fresh fresh;
  private final int ranged;
  private int[] handle;
  private int declared;

  /** Makes the variables that the model's lowered part needs; those of gaps get the last tag. */
  Places(Network network, Model model) {
    this.network = network;
    store = network.store();
    fresh = Fresh.beside(model.variables());
    ranged = model.postings().size();
    handle = new int[model.variables().size()];
    for (; declared < handle.length; declared++) {
      handle[declared] = model.isNeeded(declared) ? make(fresh.domain(declared)) : NONE;
    }
  }

  Fresh fresh() {
    return fresh;
  }

  /** Makes the variables that a decomposition has added since. */
  void declareFresh() {
    handle = Arrays.copyOf(handle, fresh.size());
    for (; declared < handle.length; declared++) {
      handle[declared] = make(fresh.domain(declared));
    }
  }

  private int make(Domain domain) {
    int h = store.variable(domain.min(), domain.max());
    long gaps = (long) domain.max() - domain.min() + 1 - domain.size();
    if (gaps > MOST_HOLES) {
      int[] from = IntStream.range(0, domain.ranges()).map(domain::from).toArray();
      int[] to = IntStream.range(0, domain.ranges()).map(domain::to).toArray();
      network.post(new InRanges(h, from, to), ranged);
      return h;
    }
    boolean open = true;
    for (int r = 1; r < domain.ranges(); r++) {
      for (int v = domain.to(r - 1) + 1; v < domain.from(r); v++) {
        open &= store.remove(h, v, 0);
      }
    }
    if (!open) {
      throw new IllegalStateException("a domain without values");
    }
    return h;
  }

  /** Whether the engine has the variable. */
  boolean has(int variable) {
    return handle[variable] != NONE;
  }

  int handle(int variable) {
    return handle[variable];
  }

  /** The variable's value; it is fixed. */
  int value(int variable) {
    return store.min(handle[variable]);
  }

  Scope scope(Ints variables) {
    return Scope.of(variables.stream().map(this::handle).toArray());
  }

  /** The sum without its constant. */
  Sum sum(LinearSum sum) {
    return Sum.of(store, sum.coefficients().stream().toArray(), scope(sum.variables()));
  }

  Scope scope(View view) {
    return scope(Views.of(view));
  }

  /**
   * The views as rows.
   *
   * @throws OutOfRange if one can pass 10^9
   */
  Scope scope(Views views) {
    int[] handles = new int[views.size()];
    int[] offsets = new int[views.size()];
    for (int i = 0; i < handles.length; i++) {
      handles[i] = views.isConstant(i) ? Store.ZERO : handle[views.variable(i)];
      handles[i] ^= views.sign(i) < 0 ? 1 : 0;
      offsets[i] = views.offset(i);
      long least = (long) store.min(handles[i]) + offsets[i];
      long greatest = (long) store.max(handles[i]) + offsets[i];
      if (least < -Store.LIMIT || greatest > Store.LIMIT) {
        throw new OutOfRange("a view takes values from " + least + " to " + greatest);
      }
    }
    return Scope.of(store, handles, offsets);
  }

  long atom(steelyard.variants.model.Atom atom) {
    if (atom.isConstant()) {
      return atom.holds(0) ? Atom.TRUE : Atom.FALSE;
    }
    int h = handle[atom.variable()];
    return switch (atom.op()) {
      case GE -> Atom.ge(h, atom.value());
      case LE -> Atom.le(h, atom.value());
      case EQ -> Atom.eq(h, atom.value());
      case NE -> Atom.ne(h, atom.value());
    };
  }

  long[] atoms(Atoms atoms) {
    return atoms.stream().mapToLong(this::atom).toArray();
  }
}
