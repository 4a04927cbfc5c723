package steelyard.variants.model;

/** One answer per kind of relation. */
public interface RelationVisitor<R> {
  R linear(Linear relation);

  R clause(Clause relation);

  R allDifferent(AllDifferent relation);

  R allDifferentExcept(AllDifferentExcept relation);

  R element(Element relation);

  R table(Table relation);

  R regular(Regular relation);

  R globalCardinality(GlobalCardinality relation);

  R count(Count relation);

  R distinctValues(DistinctValues relation);

  R maximum(Maximum relation);

  R absolute(Absolute relation);

  R product(Product relation);

  R division(Division relation);

  R modulo(Modulo relation);

  R lexicographic(Lexicographic relation);

  R inverse(Inverse relation);

  R circuit(Circuit relation);

  R subcircuit(Subcircuit relation);

  R noOverlap(NoOverlap relation);

  R noOverlap2D(NoOverlap2D relation);

  R cumulative(Cumulative relation);

  R binPacking(BinPacking relation);

  R knapsack(Knapsack relation);

  R precedence(Precedence relation);
}
