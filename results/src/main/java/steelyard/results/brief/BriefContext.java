package steelyard.results.brief;

import java.time.Instant;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * What the brief is about, beyond the runs themselves.
 *
 * @param plan the sweep and how far it has come
 * @param site where and with what it was measured
 * @param rules the choices behind the numbers
 * @param pairs the comparisons asked for; empty means every candidate against the one in service
 * @param findings what others found that the runs alone do not show
 * @param rerun the command that repeats a run, with {@code {run}} where its id goes
 */
public record BriefContext(
    Plan plan, Site site, Rules rules, List<Asked> pairs, List<Finding> findings, String rerun) {

  /** Where a run's id goes in the command that repeats it. */
  public static final String RUN = "{run}";

  /**
   * The sweep.
   *
   * @param sweep its name
   * @param inService the candidate that is deployed now, as {@code VARIANT on BACKEND}
   * @param plannedRuns at least 0
   * @param finishedRuns at least 0; the brief is of a part while it is less than planned
   * @param started when its first night began
   * @param lastRun when its latest run ended; empty before the first
   * @param sweepFile the text of the file that describes it
   */
  public record Plan(
      String sweep,
      String inService,
      int plannedRuns,
      int finishedRuns,
      Instant started,
      Optional<Instant> lastRun,
      String sweepFile) {
    public Plan {
      Objects.requireNonNull(sweep, "sweep");
      Objects.requireNonNull(inService, "inService");
      Objects.requireNonNull(started, "started");
      Objects.requireNonNull(lastRun, "lastRun");
      Objects.requireNonNull(sweepFile, "sweepFile");
      if (plannedRuns < 0 || finishedRuns < 0) {
        throw new IllegalArgumentException(
            "counts of runs must be at least 0: " + finishedRuns + " of " + plannedRuns);
      }
    }

    /** Whether runs are still to come. */
    public boolean partial() {
      return finishedRuns < plannedRuns;
    }
  }

  /**
   * Where and with what.
   *
   * @param machineClass what kind of machine, in words
   * @param calibration how fast it was while the sweep ran, in words
   * @param versions of backends and whatever else matters, in the order to show
   */
  public record Site(String machineClass, String calibration, List<Version> versions) {
    public Site {
      Objects.requireNonNull(machineClass, "machineClass");
      Objects.requireNonNull(calibration, "calibration");
      versions = List.copyOf(versions);
    }
  }

  /** A thing and its version. */
  public record Version(String name, String version) {
    public Version {
      Objects.requireNonNull(name, "name");
      Objects.requireNonNull(version, "version");
    }
  }

  /** A comparison asked for: two different candidates. */
  public record Asked(String before, String after) {
    public Asked {
      if (before.equals(after)) {
        throw new IllegalArgumentException("a candidate cannot be compared with itself: " + before);
      }
    }
  }

  /** How much a finding matters. */
  public enum Gravity {
    /** An answer is wrong or a run was lost: look at it before anything else. */
    WRONG,
    /** Part of the evidence is missing or weak. */
    CAUTION
  }

  /**
   * Something found outside the runs' own records, such as a refuted role.
   *
   * @param text one plain sentence
   * @param candidate the candidate that it speaks against: a {@code WRONG} one bars it from being
   *     called ahead; empty if it is about none
   * @param runs ids of the runs that show it
   */
  public record Finding(
      Gravity gravity, String text, Optional<String> candidate, List<String> runs) {
    public Finding {
      Objects.requireNonNull(gravity, "gravity");
      Objects.requireNonNull(text, "text");
      Objects.requireNonNull(candidate, "candidate");
      runs = List.copyOf(runs);
    }
  }

  public BriefContext {
    Objects.requireNonNull(plan, "plan");
    Objects.requireNonNull(site, "site");
    Objects.requireNonNull(rules, "rules");
    pairs = List.copyOf(pairs);
    findings = List.copyOf(findings);
    if (!rerun.contains(RUN)) {
      throw new IllegalArgumentException("the command to rerun names no " + RUN + ": " + rerun);
    }
  }
}
