package steelyard.adapters.sat.encoding;

import java.util.Arrays;
import java.util.function.IntConsumer;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;
import steelyard.variants.model.View;

/**
 * The order encoding of integer variables: for each value of a domain but the smallest, a literal
 * that says the variable is at least that; a view's literals are its variable's, shifted or
 * negated. Literals for equality are made where one is first asked for.
 *
 * <p>Source: Crawford &amp; Baker (1994), "Experimental Results on the Application of
 * Satisfiability Algorithms to Scheduling Problems", AAAI; Tamura, Taga, Kitagawa &amp; Banbara
 * (2009), "Compiling Finite Linear CSP into SAT", Constraints 14(2):254-272.
 */
public final class Integers {
  private static final int[] NONE = {};

  private final Cnf cnf;

  /** By variable; null where it has not been added. */
  private Domain[] domains = new Domain[16];

  /** By variable: the literal of its second value. */
  private int[] first = new int[16];

  /** By variable and position of the value: the literal of equality, 0 where there is none yet. */
  private int[][] equal = new int[16][];

  /** By variable and range of its domain: how many values lie in earlier ranges. */
  private int[][] before = new int[16][];

  Integers(Cnf cnf) {
    this.cnf = cnf;
  }

  /** Gives {@code variable} its literals and the clauses between them. */
  void add(int variable, Domain domain) {
    reserve(variable);
    first[variable] = cnf.variables(domain.size() - 1);
    int size = (int) domain.size();
    domains[variable] = domain;
    before[variable] = domain.isInterval() ? NONE : starts(domain);
    for (int literal = first[variable]; literal < first[variable] + size - 2; literal++) {
      cnf.clause(-(literal + 1), literal);
    }
  }

  private void reserve(int variable) {
    if (variable >= domains.length) {
      int length = Math.max(variable + 1, 2 * domains.length);
      domains = Arrays.copyOf(domains, length);
      first = Arrays.copyOf(first, length);
      equal = Arrays.copyOf(equal, length);
      before = Arrays.copyOf(before, length);
    }
  }

  private static int[] starts(Domain domain) {
    int[] starts = new int[domain.ranges()];
    for (int r = 1; r < starts.length; r++) {
      starts[r] = starts[r - 1] + domain.to(r - 1) - domain.from(r - 1) + 1;
    }
    return starts;
  }

  public boolean has(int variable) {
    return variable < domains.length && domains[variable] != null;
  }

  public Domain domain(int variable) {
    return domains[variable];
  }

  long min(View view) {
    return switch (view.sign()) {
      case 1 -> domains[view.variable()].min() + (long) view.offset();
      case -1 -> view.offset() - (long) domains[view.variable()].max();
      default -> view.offset();
    };
  }

  long max(View view) {
    return switch (view.sign()) {
      case 1 -> domains[view.variable()].max() + (long) view.offset();
      case -1 -> view.offset() - (long) domains[view.variable()].min();
      default -> view.offset();
    };
  }

  /** Calls {@code each} with the values of {@code view}, in no particular order. */
  void forEachValue(View view, IntConsumer each) {
    if (view.isConstant()) {
      each.accept(view.offset());
    } else {
      for (int p = 0; p < size(view.variable()); p++) {
        each.accept(view.apply(valueAt(view.variable(), p)));
      }
    }
  }

  /** The literal that says a variable is at least the value at {@code position} of its domain. */
  public int order(int variable, int position) {
    return position == 0 ? Cnf.TRUE : first[variable] + position - 1;
  }

  /** How many values the variable has. */
  public int size(int variable) {
    return (int) domains[variable].size();
  }

  /** The literal of equality with the value at {@code position} if there is one, else 0. */
  public int equality(int variable, int position) {
    return equal[variable] == null ? 0 : equal[variable][position];
  }

  int literal(Atom atom) {
    if (atom.isConstant()) {
      return atom.equals(Atom.TRUE) ? Cnf.TRUE : Cnf.FALSE;
    }
    return switch (atom.op()) {
      case GE -> atLeast(atom.variable(), atom.value());
      case LE -> -atLeast(atom.variable(), atom.value() + 1L);
      case EQ -> is(atom.variable(), atom.value());
      case NE -> -is(atom.variable(), atom.value());
    };
  }

  int atLeast(View view, long value) {
    return switch (view.sign()) {
      case 1 -> atLeast(view.variable(), value - view.offset());
      case -1 -> -atLeast(view.variable(), view.offset() - value + 1);
      default -> view.offset() >= value ? Cnf.TRUE : Cnf.FALSE;
    };
  }

  int atMost(View view, long value) {
    return -atLeast(view, value + 1);
  }

  int is(View view, long value) {
    return view.isConstant()
        ? view.offset() == value ? Cnf.TRUE : Cnf.FALSE
        : is(view.variable(), view.sign() * (value - view.offset()));
  }

  int atLeast(int variable, long value) {
    Domain domain = domains[variable];
    if (value <= domain.min()) {
      return Cnf.TRUE;
    }
    return value > domain.max() ? Cnf.FALSE : order(variable, position(variable, (int) value));
  }

  int is(int variable, long value) {
    Domain domain = domains[variable];
    if (!domain.contains(value)) {
      return Cnf.FALSE;
    }
    int position = position(variable, (int) value);
    int last = size(variable) - 1;
    if (position == 0) {
      return last == 0 ? Cnf.TRUE : -order(variable, 1);
    }
    return position == last ? order(variable, last) : inner(variable, position);
  }

  /** Equality with a value that is neither the smallest nor the largest. */
  private int inner(int variable, int position) {
    if (equal[variable] == null) {
      equal[variable] = new int[size(variable)];
    }
    int literal = equal[variable][position];
    if (literal == 0) {
      literal = cnf.variable();
      equal[variable][position] = literal;
      int here = order(variable, position);
      int above = order(variable, position + 1);
      cnf.clause(-literal, here);
      cnf.clause(-literal, -above);
      cnf.clause(literal, -here, above);
    }
    return literal;
  }

  /** How many values of the domain are less than {@code value}, which is in its span. */
  private int position(int variable, int value) {
    Domain domain = domains[variable];
    if (domain.isInterval()) {
      return value - domain.min();
    }
    int low = 0;
    int high = domain.ranges() - 1;
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (domain.to(middle) < value) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return before[variable][low] + Math.max(0, value - domain.from(low));
  }

  /** The value at {@code position} of the variable's domain. */
  public int valueAt(int variable, int position) {
    Domain domain = domains[variable];
    if (domain.isInterval()) {
      return domain.min() + position;
    }
    int found = Arrays.binarySearch(before[variable], position);
    int range = found >= 0 ? found : -found - 2;
    return domain.from(range) + position - before[variable][range];
  }

  /**
   * The position of a variable's value in its domain.
   *
   * @param truth by propositional variable, all clauses of this true
   */
  private int position(int variable, boolean[] truth) {
    int low = 0;
    int high = size(variable) - 1;
    while (low < high) {
      int middle = (low + high + 1) >>> 1;
      if (truth[order(variable, middle)]) {
        low = middle;
      } else {
        high = middle - 1;
      }
    }
    return low;
  }

  /**
   * A variable's value.
   *
   * @param truth by propositional variable, all clauses of this true
   */
  public int value(int variable, boolean[] truth) {
    return valueAt(variable, position(variable, truth));
  }

  /** Adds to the clause being written that the variable does not have the value it has in truth. */
  private void orDiffers(int variable, boolean[] truth) {
    int position = position(variable, truth);
    cnf.or(position == 0 ? Cnf.FALSE : -order(variable, position));
    cnf.or(position + 1 == size(variable) ? Cnf.FALSE : order(variable, position + 1));
  }

  /** Writes that one of the variables does not have the value that it has in {@code truth}. */
  public void forbid(Ints variables, boolean[] truth) {
    variables.stream().forEach(variable -> orDiffers(variable, truth));
    cnf.end();
  }
}
