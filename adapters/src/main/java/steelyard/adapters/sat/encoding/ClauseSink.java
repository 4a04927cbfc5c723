package steelyard.adapters.sat.encoding;

/** Where clauses go, one by one. */
@FunctionalInterface
public interface ClauseSink {
  /** Keeps nothing: for counting. */
  ClauseSink NONE = (literals, size) -> {};

  /**
   * Takes one clause.
   *
   * @param literals variables from 1, negative where negated; a literal may be repeated; the array
   *     is the writer's again after the call
   * @param size how many of them, from the first; 0 is the clause that is never true
   */
  void clause(int[] literals, int size);
}
