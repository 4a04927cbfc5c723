package steelyard.harness.local;

import java.time.Clock;
import java.util.Optional;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.Sweep;

/** Finds the sweep in the ledger that a plan goes on with, or enters a new one. */
final class SweepBook {
  private final Ledger ledger;
  private final Clock clock;

  SweepBook(Ledger ledger, Clock clock) {
    this.ledger = ledger;
    this.clock = clock;
  }

  /** The latest sweep of that name if it has the same plan and is unfinished; else a new one. */
  Sweep sweep(KeyedPlan keyed, String file) {
    String name = keyed.plan().sweep().name();
    Optional<Sweep> unfinished =
        ledger
            .plans()
            .latest(name)
            .filter(sweep -> sweep.plan().equals(keyed.digest()))
            .filter(sweep -> !isFinished(sweep, keyed));
    return unfinished.orElseGet(() -> enter(keyed, file));
  }

  private boolean isFinished(Sweep sweep, KeyedPlan keyed) {
    return ledger.progress().finished(sweep.id()).size() >= keyed.plan().summary().runs();
  }

  private Sweep enter(KeyedPlan keyed, String file) {
    Optional<String> inService =
        keyed.plan().sweep().contests().stream().findFirst().map(c -> c.inService().name());
    Sweep sweep =
        new Sweep(
            RunIds.next(),
            keyed.plan().sweep().name(),
            clock.instant(),
            keyed.digest(),
            inService,
            file);
    ledger.plans().addSweep(sweep);
    ledger.plans().addBlocks(sweep.id(), keyed.forLedger());
    return sweep;
  }
}
