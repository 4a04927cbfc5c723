package steelyard.adapters.spi;

import java.util.function.IntBinaryOperator;
import java.util.stream.IntStream;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.apache.commons.rng.sampling.ArraySampler;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Rewriting;

/**
 * Makes a seed matter: permutes variables, postings and commuting rows before a library sees them,
 * because most libraries' own seeds change nothing. Seed 0 is the identity. The order of a
 * branching stays: it is what the amendment says.
 */
public final class Seeding {
  private final Model original;
  private final Model permuted;

  /** From a variable's id in the original to its id in the permuted model. */
  private final int[] places;

  /** From a position in the permuted model's decisions to the position in the original's. */
  private final int[] decisionsBack;

  private Seeding(Model original, Model permuted, int[] places) {
    this.original = original;
    this.permuted = permuted;
    this.places = places;
    this.decisionsBack = decisionsBack();
  }

  public static Seeding of(Model model, long seed) {
    if (seed == 0) {
      return new Seeding(model, model, identity(model.variables().size()));
    }
    UniformRandomProvider random = new SplitMix64(seed);
    int[] places = shuffled(random, model.variables().size());
    int[] postings = shuffled(random, model.postings().size());
    Model permuted = model.rewrite(new Shuffle(random, places), postings);
    return new Seeding(model, permuted, places);
  }

  /** The model that the backend gets. */
  public Model model() {
    return permuted;
  }

  /** The goal in the permuted model's ids. */
  public Goal goal(Goal goal) {
    if (goal instanceof Goal.Enumerate all) {
      int[] projection = all.projection().stream().map(v -> places[v]).toArray();
      return new Goal.Enumerate(Ints.of(projection), all.atMost());
    }
    return goal;
  }

  /** Passes on to {@code monitor} in the original's terms. */
  public Monitor monitor(Monitor monitor) {
    return new Monitor() {
      @Override
      public void phase(String name) {
        monitor.phase(name);
      }

      @Override
      public void solution(int[] decisions) {
        int[] back = new int[decisions.length];
        for (int i = 0; i < back.length; i++) {
          back[decisionsBack[i]] = decisions[i];
        }
        monitor.solution(back);
      }

      @Override
      public void bound(long value) {
        monitor.bound(value);
      }

      @Override
      public void count(String counter, long value) {
        monitor.count(counter, value);
      }

      @Override
      public void blame(String measure, Longs byPosting) {
        monitor.blame(measure, byPosting);
      }
    };
  }

  private int[] decisionsBack() {
    int[] positions = new int[original.variables().size()];
    Ints before = original.variables().decisions();
    int[] from = new int[positions.length];
    for (int v = 0; v < places.length; v++) {
      from[places[v]] = v;
    }
    for (int i = 0; i < before.size(); i++) {
      positions[before.get(i)] = i;
    }
    return permuted.variables().decisions().stream().map(v -> positions[from[v]]).toArray();
  }

  private static int[] shuffled(UniformRandomProvider random, int size) {
    return ArraySampler.shuffle(random, identity(size));
  }

  private static int[] identity(int size) {
    return IntStream.range(0, size).toArray();
  }

  private static final class Shuffle implements Rewriting {
    private final UniformRandomProvider random;
    private final int[] places;

    Shuffle(UniformRandomProvider random, int[] places) {
      this.random = random;
      this.places = places;
    }

    @Override
    public int variable(int old) {
      return places[old];
    }

    @Override
    public int[] rows(int size, IntBinaryOperator byContent) {
      return shuffled(random, size);
    }
  }
}
