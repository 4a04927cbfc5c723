package steelyard.variants.model;

/** One answer per kind of relation. */
public interface RelationVisitor<R> {
  R linear(Linear relation);

  R clause(Clause relation);

  R allDifferent(AllDifferent relation);

  R element(Element relation);

  R table(Table relation);

  R maximum(Maximum relation);

  R noOverlap(NoOverlap relation);

  R cumulative(Cumulative relation);

  R binPacking(BinPacking relation);
}
