package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * At every time the demands of the tasks that are there and run then sum to at most the capacity;
 * where none runs, nothing is said of it.
 *
 * <p>Time-tabling both ways in time, on demands and on the capacity ({@link Profile}), and overload
 * checking by energy ({@link EnergyCheck}). Strength: weaker than bounds(Z), which is NP-hard.
 * Cost: tasks times segments of the profile. Optional tasks are found absent where they fit nowhere
 * and otherwise left alone. Not explained yet. Forms: posted and conditional.
 *
 * <p>Source: Beldiceanu and Carlsson (2002), A new multi-resource cumulatives constraint with
 * negative heights, CP, LNCS 2470:63-79, for the sweep; the profile is common practice.
 */
public final class Cumulative implements Decidable {
  private final TaskScope tasks;
  private final TaskScope mirrored;
  private final Scope demands;
  private final Scope capacity;
  private final Profile forward;
  private final Profile backward;
  private final EnergyCheck energy;

  /** {@code demands[i] ≥ 0} is what task i uses; {@code capacity} is one row. */
  public Cumulative(Store s, TaskScope tasks, Scope demands, Scope capacity) {
    if (demands.size() != tasks.size() || capacity.size() != 1) {
      throw new IllegalArgumentException("a demand for each task and one capacity are needed");
    }
    this.tasks = tasks;
    this.demands = demands;
    this.capacity = capacity;
    mirrored = tasks.mirrored();
    forward = new Profile(tasks, demands);
    backward = new Profile(mirrored, demands);
    energy = new EnergyCheck(s, tasks, demands, capacity);
  }

  @Override
  public int cost() {
    return QUADRATIC;
  }

  @Override
  public void attach(Wiring wiring) {
    tasks.attach(wiring);
    for (int i = 0; i < demands.size(); i++) {
      wiring.onMin(demands.handle(i));
    }
    wiring.onMax(capacity.handle(0));
  }

  @Override
  public void attachForTruth(Wiring wiring) {
    attach(wiring);
    for (int i = 0; i < demands.size(); i++) {
      wiring.onMax(demands.handle(i));
    }
    wiring.onMin(capacity.handle(0));
  }

  @Override
  public boolean propagate(Store s) {
    return tooLarge(s)
        && overProfile(s)
        && raiseStarts(s, tasks, forward)
        && lowerEnds(s)
        && energy.check(s);
  }

  /** A task that demands more than there is lasts no time or is absent. */
  private boolean tooLarge(Store s) {
    int most = capacity.max(s, 0);
    for (int i = 0; i < tasks.size(); i++) {
      if (demands.min(s, i) > most && tasks.longest(s, i) > 0) {
        boolean there = tasks.presence(s, i) > 0;
        if (there ? !tasks.lastsAtMost(s, i, 0) : mustRun(s, i) && !tasks.forbid(s, i)) {
          return false;
        }
      }
    }
    return true;
  }

  private boolean mustRun(Store s, int i) {
    return tasks.presence(s, i) == 0 && tasks.shortest(s, i) > 0;
  }

  private boolean overProfile(Store s) {
    forward.build(s);
    long peak = forward.peak();
    if (peak > 0 && !capacity.setMin(s, 0, (int) Math.min(peak, Store.LIMIT + 1L), 0)) {
      return false;
    }
    long most = capacity.max(s, 0);
    for (int i = 0; i < tasks.size(); i++) {
      long room = forward.roomFor(i, most);
      if (demands.max(s, i) > room && forward.runs(i) && !demands.setMax(s, i, (int) room, 0)) {
        return false;
      }
    }
    return true;
  }

  private boolean raiseStarts(Store s, TaskScope timed, Profile profile) {
    long most = capacity.max(s, 0);
    for (int i = 0; i < timed.size(); i++) {
      int presence = timed.presence(s, i);
      if (presence < 0 || timed.shortest(s, i) == 0 || demands.min(s, i) == 0) {
        continue;
      }
      long start = profile.firstFit(s, i, most);
      if (start > timed.earliestStart(s, i)) {
        boolean fits = start <= timed.latestStart(s, i);
        if (presence > 0 ? !timed.startsFrom(s, i, start) : !fits && !timed.forbid(s, i)) {
          return false;
        }
      }
    }
    return true;
  }

  private boolean lowerEnds(Store s) {
    backward.build(s);
    return raiseStarts(s, mirrored, backward);
  }

  /** FALSE if the profile passes the capacity, TRUE if everything is fixed and it does not. */
  @Override
  public Verdict verdict(Store s) {
    forward.build(s);
    long peak = forward.peak();
    if (peak > 0 && peak > capacity.max(s, 0)) {
      return Verdict.FALSE;
    }
    return settled(s) ? Verdict.TRUE : Verdict.OPEN;
  }

  private boolean settled(Store s) {
    if (!capacity.fixed(s, 0)) {
      return false;
    }
    for (int i = 0; i < tasks.size(); i++) {
      if (!tasks.settled(s, i) || !demands.fixed(s, i)) {
        return false;
      }
    }
    return true;
  }
}
