package steelyard.results.ledger;

import java.time.Instant;
import java.util.Optional;
import java.util.SortedMap;

/**
 * Everything that one finished run says, enough to understand and repeat it with nothing else at
 * hand.
 *
 * @param run the run's id, random; also the name of its folder
 * @param key what makes two runs the same experiment
 * @param attempt how often this cell was started before, from 0
 * @param place where in a plan it belongs; empty for a run in the foreground
 * @param recipe how its model is made
 * @param model what was built; empty if it did not come to that
 * @param backend which solver
 * @param setting the backend's options
 * @param conditions seed, goal, limits
 * @param session harness, machine and launch
 * @param times how long it took
 * @param outcome what it established and how it ended
 * @param memory the most memory it held
 * @param counters what the backend counted; free of the machine's speed
 * @param sizes how large the lowered model is; empty if it did not come to that
 * @param trace improving solutions and bounds
 * @param exit what its process left behind
 * @param disturbed true if the machine was seen to interfere
 * @param finished when it ended
 */
public record RunRecord(
    String run,
    RunKey key,
    int attempt,
    Optional<Place> place,
    Recipe recipe,
    Optional<ModelFacts> model,
    BackendBuild backend,
    Setting setting,
    Conditions conditions,
    Session session,
    Times times,
    Outcome outcome,
    PeakMemory memory,
    SortedMap<String, Long> counters,
    Optional<Sizes> sizes,
    Trace trace,
    Exit exit,
    boolean disturbed,
    Instant finished) {

  public RunRecord {
    Text.requireId("run", run);
    Text.require("key", key);
    Text.require("place", place);
    Text.require("recipe", recipe);
    Text.require("model", model);
    Text.require("backend", backend);
    Text.require("setting", setting);
    Text.require("conditions", conditions);
    Text.require("session", session);
    Text.require("times", times);
    Text.require("outcome", outcome);
    Text.require("memory", memory);
    counters = Sorted.copy("counters", counters);
    Text.require("sizes", sizes);
    Text.require("trace", trace);
    Text.require("exit", exit);
    Text.require("finished", finished);
    if (attempt < 0) {
      throw new IllegalArgumentException("attempt must be at least 0, was " + attempt);
    }
  }
}
