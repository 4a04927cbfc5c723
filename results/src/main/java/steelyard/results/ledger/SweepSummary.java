package steelyard.results.ledger;

import java.time.Instant;
import java.util.Optional;

/**
 * A sweep on one line.
 *
 * @param id its id
 * @param name the name in its file
 * @param planned when it was planned; empty if only its runs are known
 * @param cells how many runs are planned
 * @param runs how many runs were made for it; stopped ones do not count
 * @param lastRun when the last of them ended; empty if there is none
 */
public record SweepSummary(
    String id,
    String name,
    Optional<Instant> planned,
    long cells,
    long runs,
    Optional<Instant> lastRun) {}
