package steelyard.adapters.engine.core;

import java.util.Arrays;

/**
 * The posted constraints and their fixpoint.
 *
 * <p>Clauses and differences are tables and run first; propagators run by cost class, first come
 * first served within one. Every constraint carries a tag, by which propagations and failures are
 * counted: a propagation is a run of a propagator, a clause looked at because a watched atom became
 * false, or a difference followed.
 */
public final class Network {
  /** Propagations between two looks at {@link Stop}. */
  private static final int POLL = 256;

  private final Store store;
  private final Agenda agenda;
  private final Wiring wiring;
  private final Tally tally = new Tally();
  private final Clauses clauses;
  private final Arcs arcs;
  private Propagator[] propagators = new Propagator[16];
  private int[] tags = new int[16];
  private int count;
  private Weights weights;
  private boolean inconsistent;
  private Stop stop = Stop.NEVER;
  private boolean stopped;
  private int untilPoll = POLL;

  /** A network without constraints over the variables of {@code store}. */
  public Network(Store store) {
    this.store = store;
    agenda = store.agenda;
    wiring = new Wiring(store);
    clauses = new Clauses(store, tally);
    arcs = new Arcs(store, tally);
  }

  /** The domains. */
  public Store store() {
    return store;
  }

  /** Makes a cell for a brancher or the like; see {@link Wiring#cell}. */
  public int cell(long initial) {
    return store.makeCells(1, initial);
  }

  /** Posts a propagator and returns its index. */
  public int post(Propagator p, int tag) {
    building();
    tally.tag(tag);
    if (count == tags.length) {
      propagators = Arrays.copyOf(propagators, 2 * count);
      tags = Arrays.copyOf(tags, 2 * count);
    }
    propagators[count] = p;
    tags[count] = tag;
    wiring.begin(count);
    p.attach(wiring);
    return count++;
  }

  /** Posts {@code when ⇒ x + gap ≤ y}; see {@link Arcs}. */
  public void difference(int tag, int x, long gap, int y, long when) {
    building();
    tally.tag(tag);
    if (x == y) {
      if (gap > 0) {
        clause(tag, Atom.not(when));
      }
      return;
    }
    arcs.add(tag, x, gap, y, when);
  }

  /** Posts that some of the atoms is true; while building, or later at the root. */
  public void clause(int tag, long... atoms) {
    if (store.level() != 0) {
      throw new IllegalStateException("clauses are added at the root");
    }
    tally.tag(tag);
    long[] kept = new long[atoms.length];
    int size = 0;
    for (long atom : atoms) {
      int truth = store.truth(atom);
      if (truth > 0) {
        return;
      }
      if (truth == 0) {
        kept[size++] = asBound(atom);
      }
    }
    size = distinct(kept, size);
    if (size > 1) {
      clauses.add(tag, kept, size);
    } else {
      fact(tag, size == 0 ? Atom.FALSE : kept[0]);
    }
  }

  /** Sorts the atoms, as a clause must not watch one twice, and returns how many there are. */
  private static int distinct(long[] atoms, int size) {
    Arrays.sort(atoms, 0, size);
    int distinct = 0;
    for (int i = 0; i < size; i++) {
      if (i == 0 || atoms[i] != atoms[i - 1]) {
        atoms[distinct++] = atoms[i];
      }
    }
    return distinct;
  }

  private void fact(int tag, long atom) {
    tally.propagated(tag);
    store.running = Store.DECISION;
    if (!store.require(atom, 0)) {
      tally.failed(tag);
      inconsistent = true;
    }
  }

  /** At the root, [x = k] and [x ≠ k] with k at an end of the domain are bounds. */
  private long asBound(long atom) {
    if (Atom.isBound(atom)) {
      return atom;
    }
    int h = Atom.handle(atom);
    int k = Atom.value(atom);
    boolean unequal = Atom.isUnequal(atom);
    if (k == store.min(h)) {
      return unequal ? Atom.ge(h, k + 1) : Atom.le(h, k);
    }
    if (k == store.max(h)) {
      return unequal ? Atom.le(h, k - 1) : Atom.ge(h, k);
    }
    return atom;
  }

  /** Constraints posted so far: propagators, clauses and differences. */
  public int size() {
    return count + clauses.size() + arcs.size() / 2;
  }

  private void building() {
    if (agenda.frozen()) {
      throw new IllegalStateException("constraints are posted before the first propagation");
    }
  }

  /** Asks {@code asked} now and then from now on whether to end. */
  public void stopWhen(Stop asked) {
    stop = asked;
  }

  /**
   * Whether the last {@link #propagate} ended because it was asked to; its false is no conflict.
   */
  public boolean stopped() {
    return stopped;
  }

  /**
   * Runs everything that is woken until nothing is. False: the domains hold no solution, or {@link
   * #stopped}.
   */
  public boolean propagate() {
    if (!agenda.frozen()) {
      freeze();
    } else if (stopped) {
      wakeAll();
    }
    stopped = false;
    if (inconsistent) {
      return false;
    }
    arcs.begin();
    boolean consistent = clauses.attachNew() && fixpoint();
    if (!consistent) {
      agenda.clear();
      if (!stopped) {
        blame();
        inconsistent = store.level() == 0;
      }
    }
    store.running = Store.DECISION;
    return consistent;
  }

  /** Requires the atom as a decision, then runs to the fixpoint; false as there. */
  public boolean propagate(long atom) {
    store.running = Store.DECISION;
    if (store.require(atom, 0)) {
      return propagate();
    }
    agenda.clear();
    return false;
  }

  private boolean fixpoint() {
    while (true) {
      if (--untilPoll <= 0 && stopAsked()) {
        return false;
      }
      int h = agenda.nextTouched();
      if (h >= 0) {
        if (!arcs.propagate(h) || !clauses.propagate(h)) {
          return false;
        }
        continue;
      }
      int p = agenda.nextWoken();
      if (p < 0) {
        return true;
      }
      store.running = p;
      tally.propagated(tags[p]);
      if (!propagators[p].propagate(store)) {
        return false;
      }
    }
  }

  private boolean stopAsked() {
    untilPoll = POLL;
    stopped = stop.asked();
    return stopped;
  }

  private void freeze() {
    if (store.level() != 0) {
      throw new IllegalStateException("the first propagation is at the root");
    }
    int[] segments = wiring.segments();
    byte[] costs = new byte[count];
    for (int p = 0; p < count; p++) {
      costs[p] = (byte) propagators[p].cost();
    }
    agenda.freeze(segments, wiring.subscribers(segments), costs);
    arcs.freeze();
    weights = new Weights(store.variables(), wiring.scopes(count), clauses, arcs);
    wakeAll();
  }

  private void wakeAll() {
    for (int p = 0; p < count; p++) {
      agenda.wake(p);
    }
    for (int h = 0; h < 2 * store.variables(); h++) {
      agenda.touch(h);
    }
  }

  private void blame() {
    int by = store.failedBy();
    int why = store.failedWhy();
    if (by >= 0) {
      tally.failed(tags[by]);
      weights.bump(by);
    } else if (by == Store.CLAUSE) {
      tally.failed(clauses.tag(why));
      weights.bumpClause(why);
    } else if (by == Store.ARC) {
      int arc = arcs.blamed(why);
      tally.failed(arcs.tag(arc));
      weights.bumpArc(arc);
    }
  }

  /** The weighted degree of h; see {@link Weights}. */
  public long weight(int h) {
    return weights.of(h >> 1);
  }

  /** Propagations so far. */
  public long propagations() {
    return tally.total;
  }

  /** Propagations so far by tag. */
  public long[] propagationsByTag() {
    return tally.propagations();
  }

  /** Conflicts found so far by tag. */
  public long[] failuresByTag() {
    return tally.failures();
  }

  /** Wakes a propagator whose constraint itself has been tightened, such as an objective cut. */
  public void wake(int propagator) {
    agenda.wake(propagator);
  }

  /**
   * Explains the change at {@code time}, which must have been made by a propagator, clause or
   * difference: atoms true before it that force {@link #changed}. Needs learning.
   */
  public void explain(int time, Reason out) {
    explain(store.trail.by[time], store.trail.why[time], changed(time), time, out);
  }

  /**
   * Whether the change at {@code time} was made by a constraint, not by a decision or the store.
   */
  public boolean explains(int time) {
    int by = store.trail.by[time];
    return by != Store.DECISION && by != Store.OWN;
  }

  /**
   * Explains the last conflict: atoms that are true now and that one constraint forbids together.
   */
  public void explainConflict(Reason out) {
    long atom = store.failedAtom();
    explain(store.failedBy(), store.failedWhy(), atom, store.now(), out);
    if (out.known()) {
      out.add(Atom.not(atom));
    }
  }

  private void explain(int by, int why, long atom, int time, Reason out) {
    out.clear();
    if (by >= 0) {
      propagators[by].explain(store, time, atom, why, out);
    } else if (by == Store.CLAUSE) {
      clauses.explain(why, atom, out);
    } else if (by == Store.ARC) {
      arcs.explain(why, atom, time, out);
    }
  }

  /** The atom that the change at {@code time} made true. */
  public long changed(int time) {
    int h = store.trail.handle[time];
    if (h < 0) {
      return Atom.ne(~h << 1, store.trail.old[time]);
    }
    return Atom.ge(h, store.minAt(h, time + 1));
  }
}
