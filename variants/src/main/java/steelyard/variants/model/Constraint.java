package steelyard.variants.model;

/** What an adapter lowers: a bare relation, or one under a condition. */
public sealed interface Constraint permits Relation, Conditional {
  /** The same constraint under other names and with its commuting rows in another order. */
  Constraint rewrite(Rewriting rewriting);
}
