package steelyard.harness.sweep;

import java.util.List;
import java.util.Objects;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.results.statistics.TieMargin;

/**
 * What a sweep file says of how its runs are to be reported; kept beside the ledger, because the
 * file and the instances that it names may be gone when the brief is made.
 *
 * @param pairs what is to be shown before against after, by candidates' names
 * @param tieMargin within what distance two times are the same
 * @param penalty what a run without an answer counts as, in limits
 */
public record BriefChoices(List<Names> pairs, TieMargin tieMargin, double penalty) {

  /** A pair by name. */
  public record Names(String before, String after) {
    public Names {
      Objects.requireNonNull(before, "before");
      Objects.requireNonNull(after, "after");
    }
  }

  public BriefChoices {
    pairs = List.copyOf(pairs);
    Objects.requireNonNull(tieMargin, "tieMargin");
  }

  public static BriefChoices of(Sweep sweep) {
    return new BriefChoices(
        sweep.contests().stream()
            .flatMap(contest -> contest.pairs().stream())
            .map(pair -> new Names(pair.before().name(), pair.after().name()))
            .distinct()
            .toList(),
        sweep.tieMargin(),
        sweep.penalty());
  }

  public String toJson() {
    return Json.write(this);
  }

  /**
   * Reads what {@link #toJson} wrote.
   *
   * @param shown where the text is from, for messages
   * @throws SweepProblem if it is not that
   */
  public static BriefChoices ofJson(String json, String shown) {
    return Json.read(json, BriefChoices.class, shown);
  }
}
