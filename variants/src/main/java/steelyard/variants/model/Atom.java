package steelyard.variants.model;

import java.util.List;
import java.util.Objects;

/**
 * A literal: a variable compared with a value. The one vocabulary for clauses, conditions,
 * assumptions, encodings and explanations. A Boolean b is an integer 0..1, its literal [b &ge; 1].
 *
 * @param variable the variable's id, or {@link #NONE} for the constants {@link #TRUE} and {@link
 *     #FALSE}
 */
public record Atom(int variable, Op op, int value) {
  /** No variable: the atom is a constant. */
  public static final int NONE = -1;

  public static final Atom TRUE = new Atom(NONE, Op.EQ, 0);
  public static final Atom FALSE = new Atom(NONE, Op.NE, 0);

  /** The comparisons; closed under negation. */
  public enum Op {
    GE(0),
    LE(1),
    EQ(2),
    NE(3);

    private static final List<Op> BY_CODE = List.of(values());

    private final int code;

    Op(int code) {
      this.code = code;
    }

    /** A number for flat rows and digests; never changes. */
    int code() {
      return code;
    }

    static Op of(int code) {
      return BY_CODE.get(code);
    }

    /** Whether {@code x OP v} holds. */
    public boolean holds(int x, int v) {
      return switch (this) {
        case GE -> x >= v;
        case LE -> x <= v;
        case EQ -> x == v;
        case NE -> x != v;
      };
    }
  }

  public Atom {
    Objects.requireNonNull(op, "op");
    if (variable < NONE) {
      throw new IllegalArgumentException("variable ids start at 0, was " + variable);
    }
    if (variable == NONE && (value != 0 || op == Op.GE || op == Op.LE)) {
      throw new IllegalArgumentException("a constant atom is TRUE or FALSE");
    }
  }

  public static Atom atLeast(int variable, int value) {
    return new Atom(variable, Op.GE, value);
  }

  public static Atom atMost(int variable, int value) {
    return new Atom(variable, Op.LE, value);
  }

  public static Atom is(int variable, int value) {
    return new Atom(variable, Op.EQ, value);
  }

  public static Atom isNot(int variable, int value) {
    return new Atom(variable, Op.NE, value);
  }

  public static Atom constant(boolean truth) {
    return truth ? TRUE : FALSE;
  }

  /** The atom over a value that may lie beyond what a domain can hold; then it is a constant. */
  static Atom clamped(int variable, Op op, long value) {
    if (value > Domain.LIMIT + 1L) {
      return constant(op == Op.LE || op == Op.NE);
    }
    if (value < -Domain.LIMIT - 1L) {
      return constant(op == Op.GE || op == Op.NE);
    }
    return new Atom(variable, op, (int) value);
  }

  public boolean isConstant() {
    return variable == NONE;
  }

  /** The literal that is true exactly where this is false. */
  public Atom negated() {
    return switch (op) {
      case GE -> new Atom(variable, Op.LE, value - 1);
      case LE -> new Atom(variable, Op.GE, value + 1);
      case EQ -> new Atom(variable, Op.NE, value);
      case NE -> new Atom(variable, Op.EQ, value);
    };
  }

  /** Whether it holds when its variable is {@code x}; constants ignore {@code x}. */
  public boolean holds(int x) {
    return isConstant() ? op == Op.EQ : op.holds(x, value);
  }

  Atom mapped(Rewriting rewriting) {
    return isConstant() ? this : new Atom(rewriting.variable(variable), op, value);
  }

  @Override
  public String toString() {
    if (isConstant()) {
      return op == Op.EQ ? "true" : "false";
    }
    String sign =
        switch (op) {
          case GE -> ">=";
          case LE -> "<=";
          case EQ -> "=";
          case NE -> "!=";
        };
    return "[x" + variable + sign + value + "]";
  }
}
