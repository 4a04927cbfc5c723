package steelyard.results.brief;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Claim;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Status;
import steelyard.results.statistics.Outcome;
import steelyard.results.statistics.PairRule.Ground;
import steelyard.results.statistics.SolveTime;
import steelyard.results.statistics.TimeRatio;

/**
 * Everything that a brief says. The pages show it, the JSON page is it: its components are that
 * page's fields, under the same names and in this order.
 *
 * <p>Times are seconds. Names are as given, with nothing escaped or cut.
 *
 * @param plan the sweep and how far it has come
 * @param site where and with what it was measured
 * @param rules the choices behind the numbers
 * @param scope what the runs cover
 * @param trust how the answers stood up
 * @param troubles what is wrong, gravest first
 * @param verdict what the evidence says for now
 * @param candidates all instances together; the candidate in service first, then by penalised mean
 * @param classes the same per class of instances; empty if there is only one class
 * @param pairs the comparisons, in the order asked for
 * @param runs every run, by instance
 */
public record Facts(
    BriefContext.Plan plan,
    BriefContext.Site site,
    Rules rules,
    Scope scope,
    Trust trust,
    List<Trouble> troubles,
    Verdict verdict,
    List<Row> candidates,
    List<ClassTable> classes,
    List<Pair> pairs,
    List<Run> runs) {

  /**
   * What the runs cover, each list without repetitions.
   *
   * @param timed true if wall time was what limited every run; otherwise no time is compared
   */
  public record Scope(
      List<String> families,
      int instances,
      List<String> classes,
      List<Long> seeds,
      List<Limits> limits,
      boolean timed) {
    public Scope {
      families = List.copyOf(families);
      classes = List.copyOf(classes);
      seeds = List.copyOf(seeds);
      limits = List.copyOf(limits);
    }
  }

  /** How many runs' solutions were judged, and how many claims stand on what. */
  public record Trust(
      int valid, int invalid, int unchecked, int proved, int agreed, int alone, int contradicted) {

    /** Whether no solution was refused and no claim is contradicted. */
    public boolean isSound() {
      return invalid == 0 && contradicted == 0;
    }
  }

  /**
   * Something wrong or weak.
   *
   * @param text one plain sentence
   * @param runs ids of the runs that show it
   */
  public record Trouble(BriefContext.Gravity gravity, String text, List<String> runs) {
    public Trouble {
      Objects.requireNonNull(text, "text");
      runs = List.copyOf(runs);
    }
  }

  /**
   * One candidate on one set of instances.
   *
   * @param against its comparison with the candidate in service; empty for that one itself
   */
  public record Row(String candidate, boolean inService, Score score, Optional<Against> against) {}

  /**
   * What one candidate did by itself.
   *
   * @param instances how many it has run on
   * @param solved on how many of them it found a usable answer; an instance of which only some
   *     seeds did counts as that share
   * @param proved on how many it answered its goal, counted likewise
   * @param penalisedMean empty without runs, or where time was not what limited them
   * @param shiftedGeometricMean likewise
   */
  public record Score(
      int instances,
      int runs,
      double solved,
      double proved,
      OptionalDouble penalisedMean,
      OptionalDouble shiftedGeometricMean) {}

  /**
   * What one candidate (after) did beside another (before) on the instances that both have run in
   * the same blocks.
   *
   * @param instances how many those are
   * @param penalisedBefore over those instances alone; empty as in {@link Score}
   * @param penalisedAfter likewise
   * @param worstSlowdown of the instances that after lost, the one with the largest ratio
   * @param bestSpeedup of the instances that after won, the one with the smallest ratio
   */
  public record Against(
      String before,
      int instances,
      Tally tally,
      OptionalDouble penalisedBefore,
      OptionalDouble penalisedAfter,
      Optional<Extreme> worstSlowdown,
      Optional<Extreme> bestSpeedup) {}

  /** Instances by outcome. */
  public record Tally(int wins, int losses, int ties, int bothOpen, int unchanged) {}

  /** An instance that stands out. */
  public record Extreme(String family, String instance, TimeRatio ratio) {}

  /** The table of candidates for one class of instances. */
  public record ClassTable(String instanceClass, List<Row> candidates) {
    public ClassTable {
      candidates = List.copyOf(candidates);
    }
  }

  /**
   * One comparison.
   *
   * @param total over all instances
   * @param classes per class of instances, also if there is only one
   * @param grounds what decided how many pairs of runs
   * @param open pairs of runs beyond the limit
   * @param unpaired runs of after that have no partner in their block yet
   * @param points every pair of runs
   */
  public record Pair(
      String before,
      String after,
      Against total,
      List<ClassAgainst> classes,
      List<GroundCount> grounds,
      Open open,
      int unpaired,
      List<Point> points) {
    public Pair {
      classes = List.copyOf(classes);
      grounds = List.copyOf(grounds);
      points = List.copyOf(points);
    }
  }

  /** A comparison on one class of instances. */
  public record ClassAgainst(String instanceClass, Against against) {}

  /** How many pairs of runs were won and lost on one ground. */
  public record GroundCount(Ground ground, int wins, int losses) {}

  /** How many pairs of runs had no answer to their goal, by whose is missing. */
  public record Open(int beforeOnly, int afterOnly, int both) {}

  /** One pair of runs, by the ids of its runs. */
  public record Point(
      String family,
      String instance,
      String instanceClass,
      long seed,
      String beforeRun,
      String afterRun,
      SolveTime before,
      SolveTime after,
      Outcome outcome,
      Ground ground) {}

  /**
   * One run.
   *
   * @param proved whether it answered its goal in a way that stood up
   * @param peakBytes 0 where it was not measured
   * @param rerun the command that repeats it
   */
  public record Run(
      String run,
      String family,
      String instance,
      String instanceClass,
      String candidate,
      String variant,
      String backend,
      String setting,
      long seed,
      int block,
      Limits limits,
      Status status,
      Ending ending,
      Check check,
      Claim claim,
      boolean proved,
      double seconds,
      OptionalLong objective,
      OptionalLong bound,
      long peakBytes,
      boolean disturbed,
      String rerun) {}

  public Facts {
    Objects.requireNonNull(plan, "plan");
    Objects.requireNonNull(site, "site");
    Objects.requireNonNull(rules, "rules");
    Objects.requireNonNull(verdict, "verdict");
    troubles = List.copyOf(troubles);
    candidates = List.copyOf(candidates);
    classes = List.copyOf(classes);
    pairs = List.copyOf(pairs);
    runs = List.copyOf(runs);
  }
}
