package steelyard.results.ledger;

/**
 * How a run's claim stands beside the others of its problem.
 *
 * @param claim the claim's standing
 * @param agreeing how many other technologies claim the same
 */
public record Standing(Claim claim, int agreeing) {}
