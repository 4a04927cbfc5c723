package steelyard.variants.model;

/** How two amounts compare; closed under negation on the integers. */
public enum Comparison {
  LE("<="),
  GE(">="),
  EQ("="),
  NE("!=");

  private final String symbol;

  Comparison(String symbol) {
    this.symbol = symbol;
  }

  public boolean holds(long left, long right) {
    return switch (this) {
      case LE -> left <= right;
      case GE -> left >= right;
      case EQ -> left == right;
      case NE -> left != right;
    };
  }

  /** The comparison that holds with both sides negated. */
  public Comparison mirrored() {
    return switch (this) {
      case LE -> GE;
      case GE -> LE;
      case EQ, NE -> this;
    };
  }

  @Override
  public String toString() {
    return symbol;
  }
}
