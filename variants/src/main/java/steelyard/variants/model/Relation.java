package steelyard.variants.model;

/**
 * A relation over views: one record per kind. A visitor without defaults meets them, so that a new
 * kind does not compile until every adapter has said how it lowers it.
 */
public sealed interface Relation extends Constraint
    permits Linear,
        Clause,
        AllDifferent,
        Element,
        Table,
        Maximum,
        NoOverlap,
        Cumulative,
        BinPacking {

  <R> R accept(RelationVisitor<R> visitor);

  @Override
  Relation rewrite(Rewriting rewriting);

  /** The kind's name, as reports and tables write it. */
  String kind();
}
