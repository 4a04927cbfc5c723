package steelyard.variants.model;

import java.util.Arrays;
import java.util.Collection;
import java.util.List;
import java.util.Objects;
import java.util.stream.Collectors;

/** A truth-valued expression, kept as written; what a posting says and the judge judges. */
public sealed interface Formula {

  /** {@code left OP right}; false where a side is undefined. */
  record Compare(Term left, Comparison op, Term right) implements Formula {
    public Compare {
      Objects.requireNonNull(left, "left");
      Objects.requireNonNull(op, "op");
      Objects.requireNonNull(right, "right");
    }

    @Override
    public String toString() {
      return left + " " + op + " " + right;
    }
  }

  /** A single literal. */
  record Literal(Atom atom) implements Formula {
    public Literal {
      Objects.requireNonNull(atom, "atom");
    }

    @Override
    public String toString() {
      return atom.toString();
    }
  }

  /** A relation of the catalogue. */
  record Holds(Relation relation) implements Formula {
    public Holds {
      Objects.requireNonNull(relation, "relation");
    }

    @Override
    public String toString() {
      return relation.toString();
    }
  }

  /** Every part holds; true when there is none. */
  record All(List<Formula> parts) implements Formula {
    public All {
      parts = List.copyOf(parts);
    }

    @Override
    public String toString() {
      return joined(parts, " and ");
    }
  }

  /** Some part holds; false when there is none. */
  record Any(List<Formula> parts) implements Formula {
    public Any {
      parts = List.copyOf(parts);
    }

    @Override
    public String toString() {
      return joined(parts, " or ");
    }
  }

  /** The part does not hold. */
  record Not(Formula part) implements Formula {
    public Not {
      Objects.requireNonNull(part, "part");
    }

    @Override
    public String toString() {
      return "not (" + part + ")";
    }
  }

  /** Both hold or neither does. */
  record Iff(Formula left, Formula right) implements Formula {
    public Iff {
      Objects.requireNonNull(left, "left");
      Objects.requireNonNull(right, "right");
    }

    @Override
    public String toString() {
      return "(" + left + ") iff (" + right + ")";
    }
  }

  private static String joined(List<Formula> parts, String word) {
    return parts.stream().map(Object::toString).collect(Collectors.joining(word, "(", ")"));
  }

  static Formula holds(Relation relation) {
    return new Holds(relation);
  }

  static Formula literal(Atom atom) {
    return new Literal(atom);
  }

  static Formula all(Formula... parts) {
    return new All(Arrays.asList(parts));
  }

  static Formula all(Collection<? extends Formula> parts) {
    return new All(List.copyOf(parts));
  }

  static Formula any(Formula... parts) {
    return new Any(Arrays.asList(parts));
  }

  static Formula any(Collection<? extends Formula> parts) {
    return new Any(List.copyOf(parts));
  }

  default Formula and(Formula other) {
    return all(this, other);
  }

  default Formula or(Formula other) {
    return any(this, other);
  }

  default Formula not() {
    return new Not(this);
  }

  default Formula implies(Formula other) {
    return any(not(), other);
  }

  default Formula iff(Formula other) {
    return new Iff(this, other);
  }
}
