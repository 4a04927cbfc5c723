package steelyard.adapters.sat.encoding;

import java.util.Optional;
import java.util.Set;
import steelyard.variants.model.Absolute;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.AllDifferentExcept;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Count;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.DistinctValues;
import steelyard.variants.model.Division;
import steelyard.variants.model.Element;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.Linear;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Modulo;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.Precedence;
import steelyard.variants.model.Product;
import steelyard.variants.model.Regular;
import steelyard.variants.model.RelationVisitor;
import steelyard.variants.model.Subcircuit;
import steelyard.variants.model.Table;
import steelyard.variants.model.Views;

/**
 * Writes a posted relation and answers with the names of the encodings used; empty, and nothing
 * written, where the shared decomposition is better.
 */
final class RelationEncoder implements RelationVisitor<Optional<Set<String>>> {
  /** How a clause is encoded. */
  static final String ITSELF = "itself, over order literals";

  private final Cnf cnf;
  private final Integers integers;
  private final LinearEncoder linear;

  RelationEncoder(Cnf cnf, Integers integers, LinearEncoder linear) {
    this.cnf = cnf;
    this.integers = integers;
    this.linear = linear;
  }

  /** Adds the clause's literals to the one being written. */
  Cnf anyOf(Clause clause) {
    for (int i = 0; i < clause.atoms().size(); i++) {
      cnf.or(integers.literal(clause.atoms().get(i)));
    }
    return cnf;
  }

  @Override
  public Optional<Set<String>> linear(Linear relation) {
    linear.encode(relation, Cnf.TRUE);
    return Optional.of(linear.used());
  }

  @Override
  public Optional<Set<String>> clause(Clause relation) {
    anyOf(relation).end();
    return Optional.of(Set.of(ITSELF));
  }

  @Override
  public Optional<Set<String>> allDifferent(AllDifferent relation) {
    new AllDifferentEncoder(cnf, integers).encode(relation);
    return Optional.of(Set.of(AllDifferentEncoder.NAME));
  }

  @Override
  public Optional<Set<String>> element(Element relation) {
    new ElementEncoder(cnf, integers, linear).encode(relation);
    return Optional.of(Set.of(ElementEncoder.NAME));
  }

  @Override
  public Optional<Set<String>> table(Table relation) {
    return Optional.of(Set.of(new TableEncoder(cnf, integers).encode(relation)));
  }

  @Override
  public Optional<Set<String>> maximum(Maximum relation) {
    new MaximumEncoder(cnf, integers, linear).encode(relation);
    return Optional.of(Set.of(MaximumEncoder.NAME));
  }

  @Override
  public Optional<Set<String>> absolute(Absolute relation) {
    return maximum(
        new Maximum(Views.of(relation.operand(), relation.operand().negated()), relation.result()));
  }

  @Override
  public Optional<Set<String>> noOverlap(NoOverlap relation) {
    new NoOverlapEncoder(cnf, integers, linear).encode(relation);
    return Optional.of(Set.of(NoOverlapEncoder.NAME));
  }

  @Override
  public Optional<Set<String>> cumulative(Cumulative relation) {
    CumulativeEncoder encoder = new CumulativeEncoder(cnf, integers, linear);
    if (!encoder.suits(relation)) {
      return Optional.empty();
    }
    encoder.encode(relation);
    return Optional.of(Set.of(CumulativeEncoder.NAME));
  }

  @Override
  public Optional<Set<String>> binPacking(BinPacking relation) {
    new BinPackingEncoder(cnf, integers, linear).encode(relation);
    return Optional.of(Set.of(BinPackingEncoder.NAME));
  }

  @Override
  public Optional<Set<String>> allDifferentExcept(AllDifferentExcept relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> regular(Regular relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> globalCardinality(GlobalCardinality relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> count(Count relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> distinctValues(DistinctValues relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> product(Product relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> division(Division relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> modulo(Modulo relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> lexicographic(Lexicographic relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> inverse(Inverse relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> circuit(Circuit relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> subcircuit(Subcircuit relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> noOverlap2D(NoOverlap2D relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> knapsack(Knapsack relation) {
    return Optional.empty();
  }

  @Override
  public Optional<Set<String>> precedence(Precedence relation) {
    return Optional.empty();
  }
}
