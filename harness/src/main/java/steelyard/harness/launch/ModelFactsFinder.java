package steelyard.harness.launch;

import static java.util.stream.Collectors.toList;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Collectors;
import steelyard.harness.process.Exit;
import steelyard.harness.process.ProcessLimits;
import steelyard.harness.worker.Event;
import steelyard.harness.worker.Phases;
import steelyard.harness.worker.Wire;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.ModelFacts;
import steelyard.results.ledger.Models;
import steelyard.results.ledger.Recipe;
import steelyard.results.ledger.RecipeKey;
import steelyard.variants.model.Origin;

/**
 * Finds the digests of the models that recipes build, from memory or by building them in workers: a
 * family that hangs, throws or exits costs its own recipes only.
 */
public final class ModelFactsFinder {
  /** Recipes built by one worker; its start is spread over them. */
  private static final int BATCH = 64;

  private static final Duration START = Duration.ofSeconds(30);
  private static final long MEMORY_BYTES = 2L << 30;
  private static final double HEAP_SHARE = 0.7;

  private final Crew crew;
  private final Memory memory;
  private final Duration perModel;

  /** Where facts are remembered. */
  public interface Memory {
    Optional<Models.Memo> find(RecipeKey key);

    void remember(RecipeKey key, Models.Memo memo);
  }

  /**
   * A finder.
   *
   * @param perModel what reading an instance and building its model may take
   */
  public ModelFactsFinder(Crew crew, Memory memory, Duration perModel) {
    this.crew = crew;
    this.memory = memory;
    this.perModel = perModel;
  }

  /**
   * What each recipe builds, or why it builds nothing.
   *
   * @param recipes plain recipes of the same instances need not be among them
   * @param done told how many of how many are known, as they become known
   */
  public Map<RecipeKey, Models.Memo> find(Collection<Recipe> recipes, Counting done) {
    Map<RecipeKey, Recipe> wanted = new LinkedHashMap<>();
    for (Recipe recipe : recipes) {
      Recipe plain = plain(recipe);
      wanted.putIfAbsent(plain.key(), plain);
      wanted.putIfAbsent(recipe.key(), recipe);
    }
    Map<RecipeKey, Models.Memo> known = new LinkedHashMap<>();
    List<Recipe> open = new ArrayList<>();
    wanted.forEach(
        (key, recipe) ->
            memory.find(key).ifPresentOrElse(m -> known.put(key, m), () -> open.add(recipe)));
    Map<Optional<String>, List<Recipe>> byVersion =
        open.stream().collect(Collectors.groupingBy(Recipe::alias, LinkedHashMap::new, toList()));
    for (List<Recipe> version : byVersion.values()) {
      for (int from = 0; from < version.size() && !crew.stop().stopping(); from += BATCH) {
        done.of(known.size(), wanted.size());
        build(version.subList(from, Math.min(version.size(), from + BATCH)), known);
      }
    }
    done.of(known.size(), wanted.size());
    return known;
  }

  /** Told of progress. */
  public interface Counting {
    void of(int done, int all);
  }

  /** Builds what a batch asks for; after a failure the rest goes to a new worker. */
  private void build(List<Recipe> batch, Map<RecipeKey, Models.Memo> known) {
    List<Recipe> left = new ArrayList<>(batch);
    while (!left.isEmpty() && !crew.stop().stopping()) {
      WorkerEnd end = Errands.once(crew, folder -> task(folder, left));
      List<Event.Built> built = end.all(Event.Built.class).toList();
      for (Event.Built each : built) {
        remember(left.get(each.facts().subject()), each.facts(), known);
      }
      if (built.size() == left.size()) {
        return;
      }
      if (crew.stop().stopping()) {
        return;
      }
      Recipe culprit = left.get(built.size());
      String reason =
          end.last(Event.Failure.class).map(Event.Failure::message).orElseGet(() -> failure(end));
      Models.Memo failed = Models.Memo.failed(reason);
      // What a limit or a crash ended may go well another time: it is not remembered.
      if (end.last(Event.Failure.class).isPresent()) {
        memory.remember(culprit.key(), failed);
      }
      known.put(culprit.key(), failed);
      left.subList(0, built.size() + 1).clear();
    }
  }

  private String failure(WorkerEnd end) {
    return end.exit().reason().equals(Optional.of(Exit.Reason.PHASE))
        ? String.format(
            Locale.ROOT,
            "its family took more than %.1f s to read and build it",
            perModel.toMillis() / 1e3)
        : "building the model failed: " + end.howItEnded();
  }

  private WorkerTask task(Path folder, List<Recipe> recipes) {
    Path file = folder.resolve("subjects.json");
    try {
      Wire.writeSubjects(new ArrayList<>(recipes.stream().map(Subjects::of).toList()), file);
    } catch (IOException e) {
      throw new UncheckedIOException("cannot write " + file + ": " + e.getMessage(), e);
    }
    return new WorkerTask(
        "digest",
        List.of("digest", file.toString()),
        folder,
        crew.installation().withoutBackends(recipes.get(0).alias()),
        "",
        HEAP_SHARE,
        1,
        List.of(),
        limits(recipes.size()));
  }

  /** A clock for each model, so that one that hangs is known within its own allowance. */
  private ProcessLimits limits(int models) {
    SortedMap<String, Duration> allowances = new TreeMap<>();
    for (int i = 0; i < models; i++) {
      allowances.put(Phases.build(i), perModel);
    }
    return new ProcessLimits(
        START,
        Set.of(ProcessLimits.START),
        ProcessLimits.DEFAULT_GRACE,
        allowances,
        START,
        MEMORY_BYTES,
        ProcessLimits.DEFAULT_OUTPUT_BYTES);
  }

  private void remember(Recipe recipe, Event.Built.Facts facts, Map<RecipeKey, Models.Memo> known) {
    Recipe plain = plain(recipe);
    Digest own = digest(facts.canonical());
    Digest plainCanonical =
        Optional.ofNullable(known.get(plain.key()))
            .flatMap(Models.Memo::model)
            .map(ModelFacts::canonical)
            .orElse(own);
    Models.Memo memo = Models.Memo.built(facts(facts, plainCanonical));
    memory.remember(recipe.key(), memo);
    known.put(recipe.key(), memo);
  }

  /** The facts as the ledger keeps them. */
  public static ModelFacts facts(Event.Built.Facts facts, Digest plainCanonical) {
    SortedMap<String, ModelFacts.Group> groups = new TreeMap<>();
    facts
        .groups()
        .forEach(
            (name, group) ->
                groups.put(name, new ModelFacts.Group(digest(group.digest()), group.postings())));
    return new ModelFacts(
        digest(facts.asBuilt()),
        digest(facts.search()),
        digest(facts.canonical()),
        plainCanonical,
        facts.variables(),
        facts.postings(),
        groups);
  }

  /** A model's digest as the ledger keeps it. */
  public static Digest digest(steelyard.variants.model.Digest digest) {
    return new Digest(digest.hex());
  }

  /** The plain model's recipe on the same instance. */
  public static Recipe plain(Recipe recipe) {
    return new Recipe(
        recipe.family(),
        recipe.alias(),
        recipe.familyCode(),
        recipe.instance(),
        List.of(),
        Origin.PLAIN);
  }

  /** A view of the ledger's memory. */
  public static Memory in(Models models) {
    return new Memory() {
      @Override
      public Optional<Models.Memo> find(RecipeKey key) {
        return models.find(key);
      }

      @Override
      public void remember(RecipeKey key, Models.Memo memo) {
        models.remember(key, memo);
      }
    };
  }

  /** A memory that forgets. */
  public static Memory none() {
    return new Memory() {
      @Override
      public Optional<Models.Memo> find(RecipeKey key) {
        return Optional.empty();
      }

      @Override
      public void remember(RecipeKey key, Models.Memo memo) {
        // nothing is kept
      }
    };
  }
}
