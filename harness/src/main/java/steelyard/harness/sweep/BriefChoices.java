package steelyard.harness.sweep;

import java.util.Collections;
import java.util.List;
import java.util.Objects;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.results.statistics.TieMargin;

/**
 * What a sweep file says of how its runs are to be reported; kept beside the ledger, because the
 * file and the instances that it names may be gone when the brief is made.
 *
 * @param families by name of the family; a brief each
 * @param tieMargin within what distance two times are the same
 * @param penalty what a run without an answer counts as, in limits
 */
public record BriefChoices(
    SortedMap<String, Contested> families, TieMargin tieMargin, double penalty) {

  /**
   * What one family's brief is about.
   *
   * @param inService the candidate that the others are held against
   * @param pairs what is to be shown before against after, by candidates' names
   */
  public record Contested(String inService, List<Names> pairs) {
    public Contested {
      Objects.requireNonNull(inService, "inService");
      pairs = List.copyOf(pairs);
    }
  }

  /** A pair by name. */
  public record Names(String before, String after) {
    public Names {
      Objects.requireNonNull(before, "before");
      Objects.requireNonNull(after, "after");
    }
  }

  public BriefChoices {
    families = Collections.unmodifiableSortedMap(new TreeMap<>(families));
    Objects.requireNonNull(tieMargin, "tieMargin");
  }

  public static BriefChoices of(Sweep sweep) {
    SortedMap<String, Contested> families = new TreeMap<>();
    for (Contest contest : sweep.contests()) {
      List<Names> pairs =
          contest.pairs().stream()
              .map(pair -> new Names(pair.before().name(), pair.after().name()))
              .distinct()
              .toList();
      families.put(contest.family(), new Contested(contest.inService().name(), pairs));
    }
    return new BriefChoices(families, sweep.tieMargin(), sweep.penalty());
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
