package steelyard.harness.local;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.TreeSet;
import steelyard.harness.launch.ModelFactsFinder;
import steelyard.harness.sweep.Block;
import steelyard.harness.sweep.Candidate;
import steelyard.harness.sweep.Catalogue;
import steelyard.harness.sweep.Contest;
import steelyard.harness.sweep.Instance;
import steelyard.harness.sweep.KeyParts;
import steelyard.harness.sweep.Plan;
import steelyard.results.ledger.Conditions;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Goal;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.ModelFacts;
import steelyard.results.ledger.Models;
import steelyard.results.ledger.Recipe;
import steelyard.results.ledger.RecipeKey;
import steelyard.results.ledger.RunKey;
import steelyard.results.ledger.Session;
import steelyard.variants.model.Digester;

/** A plan together with what its models are: the keys of its runs follow from both. */
public final class KeyedPlan {
  private final Plan plan;
  private final Catalogue catalogue;
  private final Map<RecipeKey, Models.Memo> models;
  private final Session session;
  private final int runsAtATime;

  private KeyedPlan(
      Plan plan,
      Catalogue catalogue,
      Map<RecipeKey, Models.Memo> models,
      Session session,
      int runsAtATime) {
    this.plan = plan;
    this.catalogue = catalogue;
    this.models = models;
    this.session = session;
    this.runsAtATime = runsAtATime;
  }

  /**
   * Finds what the plan's recipes build.
   *
   * @param done told how many models are known
   */
  public static KeyedPlan of(
      Plan plan,
      Catalogue catalogue,
      ModelFactsFinder finder,
      Session session,
      int runsAtATime,
      ModelFactsFinder.Counting done) {
    Set<Recipe> recipes = new LinkedHashSet<>();
    for (Contest contest : plan.sweep().contests()) {
      for (Instance instance : contest.instances()) {
        contest.candidates().forEach(c -> recipes.add(contest.recipe(c, instance)));
      }
    }
    return new KeyedPlan(plan, catalogue, finder.find(recipes, done), session, runsAtATime);
  }

  public Plan plan() {
    return plan;
  }

  /** Recipes that build no model, with the reason. */
  public SortedMap<String, String> failures() {
    SortedMap<String, String> failures = new TreeMap<>();
    for (Contest contest : plan.sweep().contests()) {
      for (Instance instance : contest.instances()) {
        for (Candidate candidate : contest.candidates()) {
          memo(contest, candidate, instance)
              .failure()
              .ifPresent(
                  r -> failures.put(candidate.variant().name() + " of " + instance.name(), r));
        }
      }
    }
    return failures;
  }

  /** The key of a candidate's run in a block. */
  RunKey key(Block block, Candidate candidate) {
    Contest contest = block.contest();
    Optional<ModelFacts> facts = memo(contest, candidate, block.instance()).model();
    KeyParts parts =
        new KeyParts(
            facts.map(ModelFacts::asBuilt).orElseGet(() -> unbuilt(block, candidate)),
            follows(candidate) ? facts.map(ModelFacts::search) : Optional.empty(),
            candidate.setup().backend().code(),
            candidate.setup().setting().options(),
            block.seed(),
            candidate.setup().threads(),
            Goal.optimise(),
            candidate.setup().limits(),
            new TreeSet<>());
    Limits limits = candidate.setup().limits();
    return limits.work().isPresent() ? parts.workKey(platform(candidate)) : parts.wallKey(around());
  }

  private Optional<KeyParts.Platform> platform(Candidate candidate) {
    return backend(candidate).portable()
        ? Optional.empty()
        : Optional.of(
            new KeyParts.Platform(
                session.machineClass(), session.launch().getOrDefault("jdk", "unknown")));
  }

  private KeyParts.Surroundings around() {
    return new KeyParts.Surroundings(
        session.machineClass(),
        session.launch(),
        Conditions.Mode.COLD,
        Optional.empty(),
        runsAtATime);
  }

  private static Digest unbuilt(Block block, Candidate candidate) {
    Recipe recipe = block.contest().recipe(candidate, block.instance());
    Digester digester = new Digester().add("not built").add(recipe.family());
    digester.add(recipe.familyCode().hex()).add(recipe.instance().content().hex());
    recipe.amendments().forEach(digester::add);
    return new Digest(digester.digest().hex());
  }

  Optional<Digest> plainCanonical(Block block, Candidate candidate) {
    return memo(block.contest(), candidate, block.instance())
        .model()
        .map(ModelFacts::plainCanonical);
  }

  double heapShare(Candidate candidate) {
    return backend(candidate).heapShare();
  }

  private boolean follows(Candidate candidate) {
    return backend(candidate).followsBranching();
  }

  private Catalogue.Backend backend(Candidate candidate) {
    return catalogue.backend(candidate.setup().backend().adapter()).orElseThrow();
  }

  private Models.Memo memo(Contest contest, Candidate candidate, Instance instance) {
    Models.Memo memo = models.get(contest.recipe(candidate, instance).key());
    return memo == null ? Models.Memo.failed("its model was not built: stopped before") : memo;
  }

  /** The plan as the ledger keeps it. */
  List<steelyard.results.ledger.Block> forLedger() {
    List<steelyard.results.ledger.Block> blocks = new ArrayList<>();
    for (Block block : plan.blocks()) {
      List<steelyard.results.ledger.Cell> cells = new ArrayList<>();
      for (int position = 0; position < block.order().size(); position++) {
        Candidate candidate = block.order().get(position);
        cells.add(
            new steelyard.results.ledger.Cell(
                position,
                block.contest().recipe(candidate, block.instance()),
                candidate.setup().backend(),
                candidate.setup().setting(),
                key(block, candidate)));
      }
      blocks.add(new steelyard.results.ledger.Block(block.number(), block.seed(), cells));
    }
    return blocks;
  }

  /** What decides the plan: equal digests are one sweep, to be resumed. */
  Digest digest() {
    Digester digester = new Digester().add(plan.sweep().name());
    for (Block block : plan.blocks()) {
      digester.add(block.contest().family()).add(block.instance().name()).add(block.seed());
      for (Candidate candidate : block.order()) {
        digester.add(candidate.name()).add(key(block, candidate).hex());
      }
    }
    return new Digest(digester.digest().hex());
  }
}
