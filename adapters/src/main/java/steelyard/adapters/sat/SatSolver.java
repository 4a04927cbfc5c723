package steelyard.adapters.sat;

import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.concurrent.atomic.AtomicBoolean;
import org.sat4j.core.VecInt;
import org.sat4j.minisat.SolverFactory;
import org.sat4j.specs.ContradictionException;
import org.sat4j.specs.IConstr;
import org.sat4j.specs.ISolver;
import org.sat4j.specs.ISolverService;
import org.sat4j.specs.SearchListenerAdapter;
import org.sat4j.specs.TimeoutException;
import steelyard.adapters.sat.encoding.ClauseSink;

/**
 * Sat4j with its traps covered. A contradiction met while adding clauses is latched, because the
 * library forgets it. Its timers are not used: they start a thread for each call, are read once per
 * conflict, and one that goes off between two conflicts of a conflict budget ends in a null
 * pointer. Instead the search is unwound from within, through the listener that it calls at each
 * propagation and each conflict; after that this object answers nothing more.
 */
final class SatSolver implements ClauseSink {
  /** What a search ended with. */
  enum Answer {
    YES,
    NO,
    OUT_OF_BUDGET,
    STOPPED,
    OUT_OF_WORK
  }

  static final int NO_ASSUMPTION = 0;
  static final long NO_BUDGET = Long.MAX_VALUE;

  private final ISolver solver;
  private final VecInt clause = new VecInt();
  private final Watch watch;
  private final boolean[] truth;
  private boolean contradicted;

  /**
   * An empty formula.
   *
   * @param configuration one of {@link SatBackend#SOLVERS}
   * @param variables numbered from 1
   * @param stop looked at all the time while searching
   * @param conflicts how many conflicts all searches together may meet
   */
  SatSolver(String configuration, int variables, AtomicBoolean stop, long conflicts) {
    solver = solver(configuration);
    watch = new Watch(solver, stop, conflicts);
    solver.setKeepSolverHot(true);
    solver.setSearchListener(watch);
    truth = new boolean[variables + 1];
    solver.newVar(variables);
    for (int v = 1; v <= variables; v++) {
      solver.registerLiteral(v);
    }
  }

  /** Loads the library's classes. */
  static void loadLibrary() {
    SolverFactory.newGlucose21().reset();
  }

  private static ISolver solver(String configuration) {
    return switch (configuration) {
      case "glucose21" -> SolverFactory.newGlucose21();
      case "glucose" -> SolverFactory.newGlucose();
      case "best-wl" -> SolverFactory.newBestWL();
      case "best-ht" -> SolverFactory.newBestHT();
      case "minisat" -> SolverFactory.newMiniSATHeap();
      case "minilearning" -> SolverFactory.newMiniLearningHeap();
      case "concise" -> SolverFactory.newConcise();
      case "no-simplification" -> SolverFactory.newNoSimplification();
      case "no-restarts" -> SolverFactory.newUNSAT();
      default -> throw new IllegalArgumentException("no solver '" + configuration + "'");
    };
  }

  @Override
  public void clause(int[] literals, int size) {
    if (contradicted) {
      return;
    }
    clause.clear();
    for (int i = 0; i < size; i++) {
      clause.push(literals[i]);
    }
    try {
      solver.addClause(clause);
    } catch (ContradictionException e) {
      contradicted = true;
    }
  }

  /**
   * Searches for a solution of the clauses so far.
   *
   * @param assumption a literal that must hold in it, or {@link #NO_ASSUMPTION}
   * @param budget how many conflicts it may meet, at least 1
   */
  Answer search(int assumption, long budget) {
    if (contradicted) {
      return Answer.NO;
    }
    VecInt assumptions = new VecInt();
    if (assumption != NO_ASSUMPTION) {
      assumptions.push(assumption);
    }
    watch.start(budget, assumptions.size());
    try {
      if (!solver.isSatisfiable(assumptions, true)) {
        contradicted = assumption == NO_ASSUMPTION;
        return Answer.NO;
      }
    } catch (Unwound e) {
      return e.answer;
    } catch (TimeoutException e) {
      return Answer.OUT_OF_BUDGET;
    }
    for (int literal : solver.model()) {
      truth[Math.abs(literal)] = literal > 0;
    }
    return Answer.YES;
  }

  /** By variable, what the last solution says of it; overwritten by the next search. */
  boolean[] truth() {
    return truth;
  }

  /** The library's counters under the names that backends share. */
  SortedMap<String, Long> counters() {
    Map<String, Number> stats = solver.getStat();
    SortedMap<String, Long> counters = new TreeMap<>();
    counters.put("decisions", stats.get("decisions").longValue());
    counters.put("failures", stats.get("conflicts").longValue());
    counters.put("propagations", stats.get("propagations").longValue());
    counters.put("restarts", Math.max(0, stats.get("starts").longValue() - 1));
    counters.put("learned-clauses", stats.get("learnedclauses").longValue());
    return counters;
  }

  /** Ends the thread that the library keeps for its timer. */
  void close() {
    solver.expireTimeout();
  }

  /** Leaves the library's search from one of its calls. */
  private static final class Unwound extends RuntimeException {
    private static final long serialVersionUID = 1L;

    private final Answer answer;

    Unwound(Answer answer) {
      super(answer.toString(), null, false, false);
      this.answer = answer;
    }
  }

  private static final class Watch extends SearchListenerAdapter<ISolverService> {
    private static final long serialVersionUID = 1L;

    private final transient ISolver solver;
    private final transient AtomicBoolean stop;
    private long conflictsLeft;
    private long budgetLeft;
    private int lastLevel;

    Watch(ISolver solver, AtomicBoolean stop, long conflicts) {
      this.solver = solver;
      this.stop = stop;
      this.conflictsLeft = conflicts;
    }

    /** A search with so many assumptions, each a level, begins. */
    void start(long budget, int assumptions) {
      budgetLeft = budget;
      lastLevel = assumptions;
    }

    @Override
    public void propagating(int literal) {
      if (stop.get()) {
        throw new Unwound(Answer.STOPPED);
      }
    }

    /** A conflict on the assumptions alone is the answer; it is not taken away. */
    @Override
    public void conflictFound(IConstr conflict, int level, int trailLevel) {
      conflictsLeft--;
      budgetLeft--;
      if (level <= lastLevel) {
        return;
      }
      if (conflictsLeft <= 0) {
        throw new Unwound(Answer.OUT_OF_WORK);
      }
      if (budgetLeft <= 0) {
        solver.expireTimeout();
      }
    }
  }
}
