package steelyard.adapters.engine.search;

import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.function.Consumer;
import java.util.function.Predicate;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Stop;
import steelyard.adapters.engine.core.Store;

/**
 * Depth-first search: each decision atom is tried, then its negation.
 *
 * <p>The right branch opens no level, its atom is required in the parent's; so there are as many
 * levels as left branches in force. With an objective, each solution must be better than the last
 * (branch and bound). A search is run once.
 */
public final class Search {
  private final Network network;
  private final Store store;
  private final Brancher brancher;
  private Optional<Objective> objective = Optional.empty();
  private Optional<Brancher> leader = Optional.empty();
  private Restarts restarts = Restarts.never();
  private Predicate<Store> listener = s -> true;
  private Consumer<Store> rootListener = s -> {};
  private Limits limits = Limits.NONE;

  private boolean consistent;
  private long[] decision = new long[64];
  private int leading;
  private long cutoff;
  private long nodes;
  private long failures;
  private long returns;
  private long solutions;
  private int depth;
  private OptionalLong bound = OptionalLong.empty();

  /** A search for solutions; {@code brancher} must go on until every variable is fixed. */
  public Search(Network network, Brancher brancher) {
    this.network = network;
    this.brancher = brancher;
    store = network.store();
  }

  /** Looks for ever better solutions. */
  public Search minimising(Objective sum) {
    objective = Optional.of(sum);
    return this;
  }

  /**
   * Finds one solution for each assignment of some variables: those that {@code first} fixes, by
   * decisions on them alone. These come first, and after a solution the last of them is undone.
   */
  public Search projectedOn(Brancher first) {
    leader = Optional.of(first);
    return this;
  }

  /**
   * Starts again from the root as the policy says; not for enumeration, which would repeat itself.
   */
  public Search restarting(Restarts policy) {
    restarts = policy;
    return this;
  }

  /** Shows each solution to {@code accept}, with every variable fixed; false ends the search. */
  public Search onSolution(Predicate<Store> accept) {
    listener = accept;
    return this;
  }

  /** Shows the root to {@code look} when it has been propagated, unless that was a conflict. */
  public Search onRoot(Consumer<Store> look) {
    rootListener = look;
    return this;
  }

  /** Runs until the tree is done, a limit is reached or {@code stop} asks for the end. */
  public Ending run(Limits most, Stop stop) {
    limits = most;
    cutoff = restarts.nextCutoff();
    network.stopWhen(stop);
    consistent = network.propagate();
    if (consistent) {
      bound = objective.map(o -> OptionalLong.of(o.least(store))).orElse(bound);
      rootListener.accept(store);
    }
    Optional<Ending> ending = Optional.empty();
    while (ending.isEmpty()) {
      ending = consistent ? forward() : backward();
    }
    if (ending.get() == Ending.EXHAUSTED) {
      bound = objective.map(Objective::best).orElse(OptionalLong.empty());
    }
    return ending.get();
  }

  private Optional<Ending> forward() {
    long atom = choose();
    if (atom == Brancher.NONE) {
      return solved();
    }
    if (nodes == limits.nodes()) {
      return Optional.of(Ending.NODES);
    }
    nodes++;
    int level = store.level();
    if (level == decision.length) {
      decision = Arrays.copyOf(decision, 2 * level);
    }
    decision[level] = atom;
    store.push();
    depth = Math.max(depth, level + 1);
    consistent = network.propagate(atom);
    return Optional.empty();
  }

  private long choose() {
    if (leader.isPresent()) {
      long atom = leader.get().next(store);
      if (atom != Brancher.NONE) {
        leading = store.level() + 1;
        return atom;
      }
    }
    return brancher.next(store);
  }

  private Optional<Ending> backward() {
    if (network.stopped()) {
      return Optional.of(Ending.STOPPED);
    }
    failures++;
    if (store.level() == 0) {
      return Optional.of(Ending.EXHAUSTED);
    }
    brancher.failed(decision[store.level() - 1]);
    if (failures >= limits.failures()) {
      return Optional.of(Ending.FAILURES);
    }
    if (failures < cutoff) {
      retreat(store.level() - 1);
    } else {
      restart();
    }
    return Optional.empty();
  }

  private Optional<Ending> solved() {
    solutions++;
    objective.ifPresent(o -> o.improve(store));
    brancher.solved(store);
    boolean more = listener.test(store);
    int back = leader.isPresent() ? leading : store.level();
    if (back == 0) {
      return Optional.of(Ending.EXHAUSTED);
    }
    if (!more || solutions >= limits.solutions()) {
      return Optional.of(Ending.SOLUTIONS);
    }
    retreat(back - 1);
    return Optional.empty();
  }

  /** Leaves the levels after {@code level} and tries the other side of the decision made there. */
  private void retreat(int level) {
    returnTo(level);
    consistent = network.propagate(Atom.not(decision[level]));
  }

  private void restart() {
    returns++;
    cutoff = failures + restarts.nextCutoff();
    returnTo(0);
    brancher.restarted();
    consistent = network.propagate();
  }

  private void returnTo(int level) {
    store.popTo(level);
    leading = Math.min(leading, level);
    if (objective.isPresent()) {
      objective.get().wake();
    }
  }

  /**
   * A lower bound on the objective over all solutions: the optimum once the search is exhausted,
   * else what the root's propagation proved. Empty without objective or solution.
   */
  public OptionalLong bound() {
    return bound;
  }

  /** What has been done so far. */
  public Counters counters() {
    return new Counters(nodes, failures, network.propagations(), returns, solutions, depth);
  }
}
