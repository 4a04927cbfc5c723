package steelyard.adapters.engine.search;

import java.util.List;
import steelyard.adapters.engine.core.Store;

/**
 * Several branchers one after the other: each goes on when those before it have nothing to decide.
 */
public final class Phases implements Brancher {
  private final List<Brancher> phases;

  /** The branchers in their order. */
  public Phases(List<? extends Brancher> phases) {
    this.phases = List.copyOf(phases);
  }

  @Override
  public long next(Store s) {
    for (int i = 0; i < phases.size(); i++) {
      long atom = phases.get(i).next(s);
      if (atom != NONE) {
        return atom;
      }
    }
    return NONE;
  }

  @Override
  public void failed(long atom) {
    phases.forEach(phase -> phase.failed(atom));
  }

  @Override
  public void solved(Store s) {
    phases.forEach(phase -> phase.solved(s));
  }

  @Override
  public void restarted() {
    phases.forEach(Brancher::restarted);
  }
}
