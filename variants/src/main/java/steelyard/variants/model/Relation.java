package steelyard.variants.model;

/**
 * A relation over views: one record per kind. A visitor without defaults meets them, so that a new
 * kind does not compile until every adapter has said how it lowers it.
 */
public sealed interface Relation extends Constraint
    permits Linear,
        Clause,
        AllDifferent,
        AllDifferentExcept,
        Element,
        Table,
        Regular,
        GlobalCardinality,
        Count,
        DistinctValues,
        Maximum,
        Absolute,
        Product,
        Division,
        Modulo,
        Lexicographic,
        Inverse,
        Circuit,
        Subcircuit,
        NoOverlap,
        NoOverlap2D,
        Cumulative,
        BinPacking,
        Knapsack,
        Precedence {

  <R> R accept(RelationVisitor<R> visitor);

  @Override
  Relation rewrite(Rewriting rewriting);

  /** The kind's name, as reports and tables write it. */
  String kind();
}
