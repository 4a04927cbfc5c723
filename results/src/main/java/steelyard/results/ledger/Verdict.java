package steelyard.results.ledger;

import java.time.Instant;

/**
 * What judging said of a run's solutions, all of them together.
 *
 * @param run the run's id
 * @param judge digest of the code that judged
 * @param check what it said
 * @param detail what was broken, or why nothing could be said; empty if all is well
 * @param at when
 */
public record Verdict(String run, Digest judge, Check check, String detail, Instant at) {

  static final int MOST_DETAIL = 2_000;

  public Verdict {
    Text.requireId("run", run);
    Text.require("judge", judge);
    Text.require("check", check);
    detail = Text.head(Text.require("detail", detail), MOST_DETAIL);
    Text.require("at", at);
  }
}
