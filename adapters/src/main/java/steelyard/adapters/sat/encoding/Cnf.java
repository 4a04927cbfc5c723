package steelyard.adapters.sat.encoding;

import java.util.Arrays;

/**
 * A formula while it is written: numbers variables, leaves out what constants decide, counts, and
 * passes each clause on.
 */
public final class Cnf {
  /** The literal that is always true. */
  public static final int TRUE = Integer.MAX_VALUE;

  /** The literal that is never true: the negative of {@link #TRUE}, as for all literals. */
  public static final int FALSE = -TRUE;

  private static final int CLAUSES_BETWEEN_LOOKS = 1 << 12;

  private final ClauseSink sink;
  private Limits limits;
  private int variables;
  private long clauses;
  private long literals;

  /** A clause of few literals. */
  private final int[] few = new int[4];

  /** The clause being written. */
  private int[] open = new int[16];

  private int size;
  private boolean satisfied;

  public Cnf(ClauseSink sink, Limits limits) {
    this.sink = sink;
    this.limits = limits;
  }

  /** From now on there is no limit: what is still to come is little. */
  public void liftLimits() {
    limits = Limits.NONE;
  }

  /** How many variables there are; they are numbered from 1. */
  public int variables() {
    return variables;
  }

  public long clauses() {
    return clauses;
  }

  /** How many literals the clauses have together. */
  public long literals() {
    return literals;
  }

  /** A new variable. */
  public int variable() {
    return variables(1);
  }

  /** New variables with consecutive numbers; the first. */
  public int variables(long count) {
    if (variables + count > limits.variables()) {
      throw new EncodingStopped(EncodingStopped.Why.VARIABLES);
    }
    int first = variables + 1;
    variables += (int) count;
    return first;
  }

  /** A clause of its own, which may be written while another is open. */
  public void clause(int a) {
    clause(a, FALSE, FALSE, FALSE);
  }

  /** A clause of its own, which may be written while another is open. */
  public void clause(int a, int b) {
    clause(a, b, FALSE, FALSE);
  }

  /** A clause of its own, which may be written while another is open. */
  public void clause(int a, int b, int c) {
    clause(a, b, c, FALSE);
  }

  /** A clause of its own, which may be written while another is open. */
  public void clause(int a, int b, int c, int d) {
    if (a == TRUE || b == TRUE || c == TRUE || d == TRUE) {
      return;
    }
    int used = 0;
    few[used] = a;
    used += a == FALSE ? 0 : 1;
    few[used] = b;
    used += b == FALSE ? 0 : 1;
    few[used] = c;
    used += c == FALSE ? 0 : 1;
    few[used] = d;
    used += d == FALSE ? 0 : 1;
    pass(few, used);
  }

  /** Adds a literal to the clause that the next {@link #end} ends. */
  public Cnf or(int literal) {
    if (literal == TRUE) {
      satisfied = true;
    } else if (literal != FALSE) {
      if (size == open.length) {
        open = Arrays.copyOf(open, 2 * size);
      }
      open[size++] = literal;
    }
    return this;
  }

  /** Adds each of {@code some} to the clause. */
  Cnf orAny(Literals some) {
    for (int i = 0; i < some.size(); i++) {
      or(some.get(i));
    }
    return this;
  }

  /** Ends the clause of the literals given to {@link #or} since the last end. */
  public void end() {
    boolean passes = !satisfied;
    int used = size;
    satisfied = false;
    size = 0;
    if (passes) {
      pass(open, used);
    }
  }

  private void pass(int[] clause, int used) {
    if (clauses >= limits.clauses()) {
      throw new EncodingStopped(EncodingStopped.Why.CLAUSES);
    }
    if (clauses % CLAUSES_BETWEEN_LOOKS == 0 && limits.stop().getAsBoolean()) {
      throw new EncodingStopped(EncodingStopped.Why.STOP);
    }
    clauses++;
    literals += used;
    sink.clause(clause, used);
  }
}
