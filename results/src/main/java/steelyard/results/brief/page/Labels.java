package steelyard.results.brief.page;

import java.time.Instant;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Locale;
import steelyard.results.brief.Facts.Run;
import steelyard.results.brief.Verdict.Standing;
import steelyard.results.brief.Words;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Claim;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Status;
import steelyard.results.statistics.Outcome;
import steelyard.results.statistics.PairRule.Ground;
import steelyard.results.statistics.SolveTime;

/** The words that pages use for what the facts say in codes. */
public final class Labels {

  /** What goes with every result that somebody may act on. */
  public static final String CAUTION =
      "If a result may set working hours, machine operation or loads: it is a calculation, not an"
          + " approval. Local codes and the judgement of licensed practitioners come first, and a"
          + " plan is reviewed by those who answer for it before anybody works to it.";

  private static final DateTimeFormatter MINUTE =
      DateTimeFormatter.ofPattern("yyyy-MM-dd HH:mm 'UTC'", Locale.ROOT).withZone(ZoneOffset.UTC);

  private Labels() {}

  /** A time of day to the minute. */
  public static String minute(Instant instant) {
    return MINUTE.format(instant);
  }

  /** How a run ended and what that is worth. */
  public static String outcome(Run run) {
    if (run.check() == Check.INVALID) {
      return "invalid solution";
    }
    if (run.claim() == Claim.CONTRADICTED) {
      return "contradicted claim";
    }
    if (run.proved()) {
      return answer(run.status());
    }
    boolean found = run.status() == Status.FEASIBLE || run.status() == Status.OPTIMAL;
    return ending(run.ending()) + (found ? ", solution found" : "");
  }

  private static String answer(Status status) {
    return switch (status) {
      case OPTIMAL -> "optimal";
      case FEASIBLE -> "solved";
      case INFEASIBLE -> "infeasible";
      case UNKNOWN -> "unknown";
    };
  }

  private static String ending(Ending ending) {
    return switch (ending) {
      case COMPLETED -> "gave up";
      case TIME_LIMIT -> "time limit";
      case WORK_LIMIT -> "work limit";
      case MEMORY_LIMIT -> "memory limit";
      case CRASHED -> "crashed";
      case UNSUPPORTED -> "refused";
      case STOPPED -> "stopped";
    };
  }

  /** What stands behind a run's answer; empty if nothing needs saying. */
  public static String trust(Run run) {
    if (run.check() == Check.INVALID || run.claim() == Claim.CONTRADICTED) {
      return "";
    }
    String claim =
        switch (run.claim()) {
          case PROVED -> "proof checked";
          case AGREED -> "claim agreed";
          case ALONE -> "claim alone";
          case NONE, CONTRADICTED -> "";
        };
    boolean unjudged = run.check() == Check.UNCHECKED && run.objective().isPresent();
    String check = run.check() == Check.VALID ? "checked" : unjudged ? "not judged" : "";
    return check.isEmpty() || claim.isEmpty() ? check + claim : check + ", " + claim;
  }

  /** Seconds of a run; of one that its time limit ended, that it was more. */
  public static String seconds(Run run) {
    return run.ending() == Ending.TIME_LIMIT
        ? "> " + Words.seconds(run.limits().wallSeconds())
        : Words.seconds(run.seconds());
  }

  /** Seconds to an answer, or more than the limit. */
  public static String seconds(SolveTime time) {
    return (time.censored() ? "> " : "") + Words.seconds(time.seconds());
  }

  /** What a run was allowed. */
  public static String limits(Limits limits) {
    String wall = Words.plain(limits.wallSeconds()) + " s";
    String memory = mebibytes(limits.memoryBytes());
    return limits
            .work()
            .map(w -> Words.plain(w.amount()) + " " + w.unit() + " (" + wall + " at most)")
            .orElse(wall)
        + ", "
        + memory;
  }

  /** A size in MiB. */
  public static String mebibytes(long bytes) {
    return String.format(Locale.ROOT, "%d MiB", Math.round(bytes / 1048576.0));
  }

  /** How a pair came out. */
  public static String outcome(Outcome outcome) {
    return switch (outcome) {
      case WIN -> "won";
      case LOSS -> "lost";
      case TIE -> "tie";
      case BOTH_OPEN -> "both open";
      case UNCHANGED -> "unchanged";
    };
  }

  /** What decided a pair. */
  public static String ground(Ground ground) {
    return switch (ground) {
      case PROOF -> "answer to the goal";
      case ANSWER -> "a solution at all";
      case OBJECTIVE -> "better solution";
      case TIME -> "time";
      case NONE -> "";
    };
  }

  /** How a candidate stands. */
  public static String standing(Standing standing) {
    return switch (standing) {
      case AHEAD -> "ahead";
      case BEHIND -> "behind";
      case NO_CLEAR_DIFFERENCE -> "no clear difference yet";
      case BARRED -> "barred";
      case NOT_WEIGHED -> "not weighed yet";
    };
  }
}
