package steelyard.adapters.cpsat;

import com.google.ortools.sat.CpSolverResponse;
import com.google.ortools.sat.SatParameters;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.Work;

/** What the calls of one solve may still take, and which limit ended them. */
final class Limits {
  /** The library's own clock may stop it a little before ours says so. */
  private static final long NEARLY = TimeUnit.MILLISECONDS.toNanos(100);

  private final Deadline deadline;
  private double deterministicSeconds;
  private long conflicts;

  Limits(Deadline deadline) {
    this.deadline = deadline;
  }

  /** Limits the next call to what is left. */
  void set(SatParameters.Builder parameters) {
    parameters.setMaxTimeInSeconds(Math.max(0, deadline.nanosLeft()) / 1e9);
    deadline.work().ifPresent(work -> set(work, parameters));
  }

  private void set(Work work, SatParameters.Builder parameters) {
    if (work.unit().equals(WorkUnits.CONFLICTS)) {
      parameters.setMaxNumberOfConflicts(Math.max(0, (long) work.amount() - conflicts));
    } else {
      parameters.setMaxDeterministicTime(Math.max(0, work.amount() - deterministicSeconds));
    }
  }

  void spent(CpSolverResponse response) {
    deterministicSeconds += response.getDeterministicTime();
    conflicts += response.getNumConflicts();
  }

  private boolean usedUp(Work work) {
    return work.unit().equals(WorkUnits.CONFLICTS)
        ? conflicts >= (long) work.amount()
        : deterministicSeconds >= work.amount();
  }

  /** Why the last call did not finish; empty if no limit tells. */
  Optional<Why> ended() {
    if (deadline.work().filter(this::usedUp).isPresent()) {
      return Optional.of(Why.WORK);
    }
    if (deadline.nanosLeft() <= NEARLY) {
      return Optional.of(Why.WALL);
    }
    return deadline.stopAsked() ? Optional.of(Why.STOPPED) : Optional.empty();
  }
}
