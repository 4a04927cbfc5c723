package steelyard.results.ledger;

import java.time.Instant;
import java.util.Optional;

/**
 * A planned set of blocks.
 *
 * @param id its id, random
 * @param name the name in its file, which later sweeps may share
 * @param planned when it was planned
 * @param plan digest of what decides the plan: equal digests are one sweep to be resumed
 * @param inService the candidate in service; empty where none is named
 * @param file the text of the sweep file
 */
public record Sweep(
    String id, String name, Instant planned, Digest plan, Optional<String> inService, String file) {
  public Sweep {
    Text.requireId("sweep", id);
    Text.requireName("sweep name", name);
    Text.require("planned", planned);
    Text.require("plan", plan);
    Text.require("inService", inService);
    Text.require("file", file);
  }
}
