package steelyard.results.brief;

import java.util.OptionalDouble;
import java.util.OptionalLong;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Claim;
import steelyard.results.ledger.Observation;
import steelyard.results.ledger.Status;
import steelyard.results.statistics.Attainment;
import steelyard.results.statistics.SolveTime;

/** What a run's record is worth as evidence. */
final class Measure {

  private Measure() {}

  /** Whether the run answered its goal and nothing has spoken against the answer. */
  static boolean proved(Observation run) {
    return run.proved() && run.claim() != Claim.CONTRADICTED;
  }

  /** Whether it has a usable solution, or a usable proof that there is none. */
  static boolean answered(Observation run) {
    boolean refuted = run.status() == Status.INFEASIBLE && run.claim() == Claim.CONTRADICTED;
    return run.solved() && !refuted;
  }

  /** Whether wall time is what limited it, so that its time can be compared. */
  static boolean timed(Observation run) {
    return run.limits().work().isEmpty();
  }

  /** Its time to a usable answer; a run without one is censored at its limit. */
  static SolveTime time(Observation run) {
    double limit = run.limits().wallSeconds();
    return proved(run)
        ? SolveTime.exactly(Math.min(run.seconds(), limit))
        : SolveTime.beyond(limit);
  }

  static Attainment attainment(Observation run) {
    return new Attainment(
        proved(run),
        answered(run),
        cost(run),
        timed(run) ? OptionalDouble.of(run.seconds()) : OptionalDouble.empty());
  }

  private static OptionalLong cost(Observation run) {
    if (run.objective().isEmpty() || run.check() == Check.INVALID || !answered(run)) {
      return OptionalLong.empty();
    }
    long objective = run.objective().getAsLong();
    return OptionalLong.of(run.minimize() ? objective : -objective);
  }
}
