package steelyard.harness.sweep;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.apache.commons.rng.sampling.ListSampler;
import steelyard.variants.model.Digester;

/**
 * A sweep laid out as blocks, in the order in which they are carried out.
 *
 * <p>The first seed of all instances comes before the second. Within a seed the instances come in
 * {@link FairOrder}; each takes as many blocks as its candidates need, one after the other. So in
 * every prefix each candidate but the one in service has run on the same number of instances but
 * for one, and each class of instances is within one instance of its proportional share.
 *
 * @param sweep what is planned
 * @param blocks numbered from 0
 */
public record Plan(Sweep sweep, List<Block> blocks) {

  /** How long after its limit a run that does not obey is ended. */
  public static final double GRACE_SECONDS = 0.8;

  /**
   * How large a plan is.
   *
   * @param candidates over all families
   * @param instances over all families
   * @param seeds how many
   * @param blocks how many
   * @param runs how many
   * @param coreHoursAtWorst if every run takes its whole wall limit and the grace after it; start,
   *     load and build of the models come on top
   * @param hoursAtWorst the same on the sweep's cores, if they can all be kept busy
   * @param leftOut combinations of amendments that families rule out
   * @param pairsApart pairs that never meet in a block
   */
  public record Summary(
      int candidates,
      int instances,
      int seeds,
      int blocks,
      long runs,
      double coreHoursAtWorst,
      double hoursAtWorst,
      int leftOut,
      List<Pair> pairsApart) {
    public Summary {
      pairsApart = List.copyOf(pairsApart);
    }
  }

  public Plan {
    Objects.requireNonNull(sweep, "sweep");
    blocks = List.copyOf(blocks);
  }

  /** Lays out a sweep. Equal sweeps give equal plans. */
  public static Plan of(Sweep sweep) {
    List<Turn> turns = FairOrder.merge(strata(sweep));
    List<Block> blocks = new ArrayList<>();
    for (long seed : sweep.seeds()) {
      for (Turn turn : turns) {
        for (int heat = 0; heat < turn.heats().size(); heat++) {
          List<Candidate> order = shuffled(sweep, turn, seed, heat);
          blocks.add(new Block(blocks.size(), turn.contest(), turn.instance(), seed, order));
        }
      }
    }
    return new Plan(sweep, blocks);
  }

  private record Turn(Contest contest, List<List<Candidate>> heats, Instance instance) {}

  /** One list for each class of each family. */
  private static List<List<Turn>> strata(Sweep sweep) {
    List<List<Turn>> strata = new ArrayList<>();
    for (Contest contest : sweep.contests()) {
      List<List<Candidate>> heats = Heats.of(contest, sweep.blockSize());
      Map<String, List<Instance>> classes = new LinkedHashMap<>();
      for (Instance instance : contest.instances()) {
        classes.computeIfAbsent(instance.instanceClass(), c -> new ArrayList<>()).add(instance);
      }
      for (List<Instance> instances : classes.values()) {
        strata.add(
            FairOrder.within(instances).stream().map(i -> new Turn(contest, heats, i)).toList());
      }
    }
    return strata;
  }

  /** A heat's candidates in an order of its own for every instance and seed. */
  private static List<Candidate> shuffled(Sweep sweep, Turn turn, long seed, int heat) {
    Digester digester = new Digester().add(sweep.name()).add(turn.contest().family());
    String start = digester.add(turn.instance().name()).add(seed).add(heat).digest().hex();
    List<Candidate> order = new ArrayList<>(turn.heats().get(heat));
    ListSampler.shuffle(new SplitMix64(Long.parseUnsignedLong(start.substring(0, 16), 16)), order);
    return order;
  }

  /** How large the plan is. */
  public Summary summary() {
    long runs = 0;
    double coreSeconds = 0;
    for (Block block : blocks) {
      runs += block.order().size();
      for (Candidate candidate : block.order()) {
        Setup setup = candidate.setup();
        coreSeconds += setup.threads() * (setup.limits().wallSeconds() + GRACE_SECONDS);
      }
    }
    List<Contest> contests = sweep.contests();
    return new Summary(
        contests.stream().mapToInt(c -> c.candidates().size()).sum(),
        contests.stream().mapToInt(c -> c.instances().size()).sum(),
        sweep.seeds().size(),
        blocks.size(),
        runs,
        coreSeconds / 3600,
        coreSeconds / 3600 / sweep.cores(),
        contests.stream().mapToInt(Contest::leftOut).sum(),
        contests.stream().flatMap(c -> apart(c).stream()).toList());
  }

  private List<Pair> apart(Contest contest) {
    List<List<Candidate>> heats = Heats.of(contest, sweep.blockSize());
    return contest.pairs().stream()
        .filter(
            pair ->
                heats.stream()
                    .noneMatch(h -> h.contains(pair.before()) && h.contains(pair.after())))
        .toList();
  }
}
