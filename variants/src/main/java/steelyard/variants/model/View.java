package steelyard.variants.model;

/**
 * The value {@code sign·x + offset} of variable x: the only shape in which scopes refer to
 * variables.
 *
 * @param variable the variable's id; 0 for a constant
 * @param sign -1, 0 or +1; 0 is a constant
 * @param offset at most {@link Domain#LIMIT} in magnitude
 */
public record View(int variable, int sign, int offset) implements Term, Viewable {

  public View {
    if (sign < -1 || sign > 1) {
      throw new IllegalArgumentException("sign must be -1, 0 or 1, was " + sign);
    }
    if (sign == 0 && variable != 0) {
      throw new IllegalArgumentException("a constant view names no variable");
    }
    if (variable < 0) {
      throw new IllegalArgumentException("variable ids start at 0, was " + variable);
    }
    Domain.requireValue(offset);
  }

  /** The variable itself. */
  public static View of(int variable) {
    return new View(variable, 1, 0);
  }

  /** The constant {@code value}. */
  public static View constant(int value) {
    return new View(0, 0, value);
  }

  public boolean isConstant() {
    return sign == 0;
  }

  /** The view's value when its variable is {@code x}. */
  public int apply(int x) {
    return sign * x + offset;
  }

  /** This plus {@code delta}. */
  public View shifted(int delta) {
    return new View(variable, sign, Math.addExact(offset, delta));
  }

  /** The negative of this. */
  @Override
  public View negated() {
    return new View(variable, -sign, -offset);
  }

  @Override
  public View view() {
    return this;
  }

  /** The literal that says this view is at least {@code v}. */
  public Atom atLeast(long v) {
    if (sign == 0) {
      return Atom.constant(offset >= v);
    }
    return sign > 0
        ? Atom.clamped(variable, Atom.Op.GE, v - offset)
        : Atom.clamped(variable, Atom.Op.LE, offset - v);
  }

  /** The literal that says this view is at most {@code v}. */
  public Atom atMost(long v) {
    return atLeast(v + 1).negated();
  }

  /** The literal that says this view equals {@code v}. */
  public Atom is(long v) {
    if (sign == 0) {
      return Atom.constant(offset == v);
    }
    return Atom.clamped(variable, Atom.Op.EQ, sign * (v - offset));
  }

  View mapped(Rewriting rewriting) {
    return sign == 0 ? this : new View(rewriting.variable(variable), sign, offset);
  }

  @Override
  public String toString() {
    if (sign == 0) {
      return Integer.toString(offset);
    }
    String x = (sign < 0 ? "-" : "") + "x" + variable;
    return offset == 0 ? x : x + (offset > 0 ? "+" : "") + offset;
  }
}
