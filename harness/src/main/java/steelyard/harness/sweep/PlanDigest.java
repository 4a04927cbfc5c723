package steelyard.harness.sweep;

import java.util.List;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Limits;
import steelyard.variants.model.Digester;

/** Digests what a plan is a function of. */
final class PlanDigest {

  /** Raised whenever equal sweeps are laid out otherwise than before. */
  private static final int FORM = 1;

  private final Digester digester = new Digester();

  private PlanDigest() {}

  static Digest of(Sweep sweep) {
    PlanDigest digest = new PlanDigest();
    digest.add(sweep);
    return new Digest(digest.digester.digest().hex());
  }

  private void add(Sweep sweep) {
    digester.add(FORM).add(sweep.name()).add(sweep.cores()).add(sweep.seeds().size());
    sweep.seeds().forEach(digester::add);
    digester.add(sweep.contests().size());
    for (Contest contest : sweep.contests()) {
      digester.add(contest.family()).add(contest.code().hex());
      List<List<Candidate>> heats = Heats.of(contest, sweep.blockSize());
      digester.add(heats.size());
      for (List<Candidate> heat : heats) {
        digester.add(heat.size());
        heat.forEach(this::add);
      }
      digester.add(contest.instances().size());
      contest.instances().forEach(this::add);
    }
  }

  private void add(Candidate candidate) {
    Setup setup = candidate.setup();
    digester.add(candidate.name()).add(setup.backend().adapter()).add(setup.backend().version());
    digester.add(setup.backend().code().hex());
    digester.add(setup.setting().options().size());
    setup.setting().options().forEach((option, value) -> digester.add(option).add(value));
    digester.add(setup.threads());
    add(setup.limits());
  }

  private void add(Limits limits) {
    digester.add(Double.doubleToLongBits(limits.wallSeconds())).add(limits.memoryBytes());
    digester.add(limits.work().isPresent() ? 1 : 0);
    limits.work().ifPresent(w -> digester.add(w.unit()).add(Double.doubleToLongBits(w.amount())));
  }

  private void add(Instance instance) {
    digester.add(instance.name()).add(instance.content().hex()).add(instance.bytes());
    digester.add(instance.instanceClass()).add(Double.doubleToLongBits(instance.weight()));
  }
}
