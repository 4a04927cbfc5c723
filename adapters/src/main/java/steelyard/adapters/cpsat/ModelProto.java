package steelyard.adapters.cpsat;

import com.google.ortools.sat.BoolArgumentProto;
import com.google.ortools.sat.ConstraintProto;
import com.google.ortools.sat.CpModelProto;
import com.google.ortools.sat.IntegerVariableProto;
import com.google.ortools.sat.LinearConstraintProto;
import java.util.Arrays;
import java.util.stream.IntStream;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Longs;

/**
 * The message in the making: variables by place, constraints with the posting that made each.
 * Literals are the library's: place p, negated -p - 1.
 */
final class ModelProto {
  private final CpModelProto.Builder message = CpModelProto.newBuilder();
  private final long[] constraintsByPosting;
  private int[] makers = new int[64];
  private int posting;
  private long terms;

  ModelProto(int postings) {
    constraintsByPosting = new long[postings];
  }

  static int negated(int literal) {
    return -literal - 1;
  }

  static int[] negated(int[] literals) {
    return IntStream.of(literals).map(ModelProto::negated).toArray();
  }

  static int[] joined(int[] a, int... b) {
    int[] both = Arrays.copyOf(a, a.length + b.length);
    System.arraycopy(b, 0, both, a.length, b.length);
    return both;
  }

  /** What follows is made by the posting of that id. */
  void madeBy(int posting) {
    this.posting = posting;
  }

  /** A variable with the values of {@code domain}; gives its place. */
  int variable(Domain domain) {
    IntegerVariableProto.Builder variable = IntegerVariableProto.newBuilder();
    for (int r = 0; r < domain.ranges(); r++) {
      variable.addDomain(domain.from(r)).addDomain(domain.to(r));
    }
    message.addVariables(variable.build());
    return message.getVariablesCount() - 1;
  }

  /** A fresh variable 0..1. */
  int bool() {
    return variable(Domain.BOOLEAN);
  }

  /**
   * Adds a constraint that holds wherever all of {@code enforcement} are true; gives its index.
   *
   * @param named how many variables it names beside the enforcement
   */
  int post(ConstraintProto.Builder constraint, int named, int... enforcement) {
    for (int literal : enforcement) {
      constraint.addEnforcementLiteral(literal);
    }
    int index = message.getConstraintsCount();
    message.addConstraints(constraint.build());
    terms += named + enforcement.length;
    constraintsByPosting[posting]++;
    if (index == makers.length) {
      makers = Arrays.copyOf(makers, 2 * index);
    }
    makers[index] = posting;
    return index;
  }

  /** The terms' sum compares with {@code bound} wherever all of {@code enforcement} are true. */
  void linear(LinearConstraintProto.Builder terms, Comparison op, long bound, int... enforcement) {
    switch (op) {
      case LE -> terms.addDomain(Long.MIN_VALUE).addDomain(bound);
      case GE -> terms.addDomain(bound).addDomain(Long.MAX_VALUE);
      case EQ -> terms.addDomain(bound).addDomain(bound);
      case NE ->
          terms
              .addDomain(Long.MIN_VALUE)
              .addDomain(bound - 1)
              .addDomain(bound + 1)
              .addDomain(Long.MAX_VALUE);
    }
    post(ConstraintProto.newBuilder().setLinear(terms), terms.getVarsCount(), enforcement);
  }

  /** At least one of the literals is true. */
  void clause(int... literals) {
    BoolArgumentProto.Builder or = BoolArgumentProto.newBuilder();
    for (int literal : literals) {
      or.addLiterals(literal);
    }
    post(ConstraintProto.newBuilder().setBoolOr(or.build()), literals.length);
  }

  /** Where the search strategy and the hint go. */
  CpModelProto.Builder message() {
    return message;
  }

  long variables() {
    return message.getVariablesCount();
  }

  long constraints() {
    return message.getConstraintsCount();
  }

  /** Variables named in constraints, repeats counted. */
  long terms() {
    return terms;
  }

  Longs constraintsByPosting() {
    return Longs.of(constraintsByPosting);
  }

  /** The id of the posting that made the constraint of that index. */
  int maker(int constraint) {
    return makers[constraint];
  }
}
