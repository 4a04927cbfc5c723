package steelyard.harness.sweep;

import java.util.Collections;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.SortedSet;
import java.util.TreeMap;
import java.util.TreeSet;
import steelyard.results.ledger.Conditions.Mode;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Goal;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.RunKey;
import steelyard.variants.model.Digester;

/**
 * What makes two runs the same experiment, whatever they are called and wherever they are planned.
 *
 * @param model digest of the model as built
 * @param search digest of its branching and hint; empty unless the backend follows them
 * @param backend digest of the adapter's code, its libraries, natives or program
 * @param options every option with its value in force
 * @param seed the seed
 * @param threads what the solver is given
 * @param goal what is asked for
 * @param limits what is allowed; under a work limit the safety net is no part of the key
 * @param evidence the kinds of evidence asked for
 */
public record KeyParts(
    Digest model,
    Optional<Digest> search,
    Digest backend,
    SortedMap<String, String> options,
    long seed,
    int threads,
    Goal goal,
    Limits limits,
    SortedSet<String> evidence) {

  /** Raised whenever what enters a key or how it enters changes. */
  private static final int FORM = 1;

  /**
   * What the counters of a backend depend on that is not portable.
   *
   * @param machineClass machines of one class are taken as equal
   * @param jdk the JDK's build
   */
  public record Platform(String machineClass, String jdk) {
    public Platform {
      Objects.requireNonNull(machineClass, "machineClass");
      Objects.requireNonNull(jdk, "jdk");
    }
  }

  /**
   * What wall times depend on.
   *
   * @param machineClass machines of one class are taken as equally fast
   * @param launch how workers are launched: JDK build, flags, archive
   * @param mode whether the process is fresh
   * @param warmUp content of the instance that a warm process has solved before
   * @param runsAtATime how many runs share the machine; at least 1
   */
  public record Surroundings(
      String machineClass,
      SortedMap<String, String> launch,
      Mode mode,
      Optional<Digest> warmUp,
      int runsAtATime) {
    public Surroundings {
      Objects.requireNonNull(machineClass, "machineClass");
      launch = Collections.unmodifiableSortedMap(new TreeMap<>(launch));
      if (warmUp.isPresent() != (mode == Mode.WARM)) {
        throw new IllegalArgumentException("a warm process, and no other, has a warm-up instance");
      }
      if (runsAtATime < 1) {
        throw new IllegalArgumentException("at least 1 run at a time, not " + runsAtATime);
      }
    }
  }

  public KeyParts {
    Objects.requireNonNull(model, "model");
    Objects.requireNonNull(search, "search");
    Objects.requireNonNull(backend, "backend");
    Objects.requireNonNull(goal, "goal");
    Objects.requireNonNull(limits, "limits");
    options = Collections.unmodifiableSortedMap(new TreeMap<>(options));
    evidence = Collections.unmodifiableSortedSet(new TreeSet<>(evidence));
  }

  /**
   * The key under which answers, checks and work-limited runs are reused.
   *
   * @param platform empty if the backend declares itself portable
   */
  public RunKey workKey(Optional<Platform> platform) {
    Digester digester = common("work");
    digester.add(platform.isPresent() ? 1 : 0);
    platform.ifPresent(p -> digester.add(p.machineClass()).add(p.jdk()));
    return key(digester);
  }

  /** The key of a run whose wall time is measured. */
  public RunKey wallKey(Surroundings surroundings) {
    Digester digester = common("wall").add(surroundings.machineClass());
    add(digester, surroundings.launch());
    digester.add(surroundings.mode().name());
    add(digester, surroundings.warmUp());
    return key(digester.add(surroundings.runsAtATime()));
  }

  private Digester common(String kind) {
    Digester digester = new Digester().add(FORM).add(kind).add(model.hex());
    add(digester, search);
    add(digester.add(backend.hex()), options);
    addGoal(digester.add(seed).add(threads));
    addLimits(digester);
    digester.add(evidence.size());
    evidence.forEach(digester::add);
    return digester;
  }

  private void addGoal(Digester digester) {
    digester.add(goal.kind().name()).add(goal.projection().size());
    goal.projection().forEach(digester::add);
    OptionalLong atMost = goal.atMost();
    digester.add(atMost.isPresent() ? 1 : 0).add(atMost.orElse(0));
  }

  private void addLimits(Digester digester) {
    Limits.Work none = new Limits.Work("seconds", limits.wallSeconds());
    Limits.Work amount = limits.work().orElse(none);
    digester.add(limits.work().isPresent() ? "work" : "wall");
    digester.add(amount.unit()).add(Double.doubleToLongBits(amount.amount()));
    digester.add(limits.memoryBytes());
  }

  private static void add(Digester digester, Optional<Digest> digest) {
    digester.add(digest.isPresent() ? 1 : 0);
    digest.ifPresent(d -> digester.add(d.hex()));
  }

  private static void add(Digester digester, SortedMap<String, String> map) {
    digester.add(map.size());
    map.forEach((name, value) -> digester.add(name).add(value));
  }

  private static RunKey key(Digester digester) {
    return RunKey.parse(digester.digest().hex().substring(0, 32));
  }
}
