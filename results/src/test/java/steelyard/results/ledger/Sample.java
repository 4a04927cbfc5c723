package steelyard.results.ledger;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.TreeSet;

/** A run of the tileworks' firing family, to be varied: what a test does not say is ordinary. */
final class Sample {

  static final Instant MIDNIGHT = Instant.parse("2026-03-02T00:00:00Z");
  static final Limits MINUTE = new Limits(60, Optional.empty(), 2L << 30);
  static final Limits WORK =
      new Limits(600, Optional.of(new Limits.Work("conflicts", 100_000)), 2L << 30);
  static final Session NIGHT =
      new Session(
          "session-1",
          "0.1.0",
          "kiln-house",
          new TreeMap<>(SortedMapOf.pairs("cores", "2", "kernel", "6.1", "processor", "x86-64")),
          new TreeMap<>(SortedMapOf.pairs("flags", "-Xmx512m", "jdk", "17.0.15")),
          MIDNIGHT);

  private String run = "3fa2c9d1";
  private RunKey key = key("a");
  private int attempt;
  private Optional<Place> place = Optional.of(new Place("sweep-1", "nightly", 0, 0));
  private String code = "firing code";
  private String instance = "week-07";
  private Digest content = digest("week-07");
  private List<String> amendments = List.of("load-bound");
  private Optional<String> alias = Optional.empty();
  private Optional<ModelFacts> model = Optional.of(model(content.hex(), "load-bound"));
  private BackendBuild backend = new BackendBuild("cpsat", "cpsat", "9.15", digest("cpsat"));
  private String setting = "default";
  private long seed;
  private Limits limits = MINUTE;
  private Session session = NIGHT;
  private Times times = times(400_000_000L);
  private Outcome outcome = optimal(40);
  private SortedMap<String, Long> counters =
      SortedMapOf.counters("decisions", 120L, "failures", 7L);
  private boolean disturbed;

  static Sample run(String id) {
    Sample sample = new Sample();
    sample.run = id;
    return sample;
  }

  Sample key(RunKey value) {
    key = value;
    return this;
  }

  Sample attempt(int value) {
    attempt = value;
    return this;
  }

  Sample at(String sweep, int block, int position) {
    place = Optional.of(new Place(sweep, "nightly", block, position));
    return this;
  }

  Sample inForeground() {
    place = Optional.empty();
    return this;
  }

  Sample instance(String name) {
    return instance(name, name);
  }

  /** An instance whose name does not tell its content. */
  Sample instance(String name, String bytes) {
    instance = name;
    content = digest(bytes);
    return rebuilt();
  }

  Sample plain() {
    return amendments();
  }

  Sample amendments(String... names) {
    amendments = List.of(names);
    return rebuilt();
  }

  /** Another version of the family's code, which builds another plain model. */
  Sample code(String version) {
    code = version;
    model = Optional.of(model(content.hex() + version, String.join("+", amendments)));
    return this;
  }

  Sample alias(String value) {
    alias = Optional.of(value);
    return this;
  }

  Sample model(ModelFacts value) {
    model = Optional.of(value);
    return this;
  }

  Sample unbuilt() {
    model = Optional.empty();
    return this;
  }

  Sample backend(String name) {
    backend = new BackendBuild(name, name, "1.0", digest(name));
    return this;
  }

  Sample setting(String name) {
    setting = name;
    return this;
  }

  Sample seed(long value) {
    seed = value;
    return this;
  }

  Sample limits(Limits value) {
    limits = value;
    return this;
  }

  Sample session(Session value) {
    session = value;
    return this;
  }

  Sample times(Times value) {
    times = value;
    return this;
  }

  Sample outcome(Outcome value) {
    outcome = value;
    return this;
  }

  Sample counters(SortedMap<String, Long> value) {
    counters = value;
    return this;
  }

  Sample disturbed() {
    disturbed = true;
    return this;
  }

  private Sample rebuilt() {
    model = Optional.of(model(content.hex(), String.join("+", amendments)));
    return this;
  }

  Recipe recipe() {
    String variant = amendments.isEmpty() ? "plain" : "plain+" + String.join("+", amendments);
    return new Recipe(
        "firing",
        alias,
        digest(code),
        new Recipe.Instance(instance, "data/" + instance + ".txt", content, "winter", 2.5),
        amendments,
        alias.map(a -> variant + "@" + a).orElse(variant));
  }

  Cell cell(int position) {
    return new Cell(position, recipe(), backend, setting(), key);
  }

  private Setting setting() {
    return new Setting(
        setting, SortedMapOf.pairs("linearization", setting.equals("default") ? "1" : "2"));
  }

  RunRecord record() {
    return new RunRecord(
        run,
        key,
        attempt,
        place,
        recipe(),
        model,
        backend,
        setting(),
        new Conditions(seed, 1, Goal.optimise(), limits, new TreeSet<>(), Conditions.Mode.COLD),
        session,
        times,
        outcome,
        new PeakMemory(123_456_789, "VmHWM"),
        counters,
        Optional.of(
            new Sizes(
                SortedMapOf.counters("clauses", 900L),
                new TreeMap<>(
                    java.util.Map.of(
                        "one lot per firing", SortedMapOf.counters("clauses", 700L))))),
        trace(),
        new Exit(OptionalInt.of(0), ""),
        disturbed,
        MIDNIGHT.plusSeconds(90));
  }

  private Trace trace() {
    if (!outcome.hasSolution()) {
      return Trace.empty();
    }
    return new Trace(
        1,
        List.of(new Trace.Solution(250_000_000, outcome.objective(), Decisions.of(3, -1, 0, 12))),
        0,
        List.of());
  }

  static Outcome optimal(long objective) {
    return outcome(Status.OPTIMAL, Ending.COMPLETED, OptionalLong.of(objective));
  }

  static Outcome feasible(long objective) {
    return outcome(Status.FEASIBLE, Ending.TIME_LIMIT, OptionalLong.of(objective));
  }

  static Outcome infeasible() {
    return outcome(Status.INFEASIBLE, Ending.COMPLETED, OptionalLong.empty());
  }

  static Outcome unknown(Ending ending) {
    return outcome(Status.UNKNOWN, ending, OptionalLong.empty());
  }

  private static Outcome outcome(Status status, Ending ending, OptionalLong objective) {
    return new Outcome(
        status,
        ending,
        Optional.of("EXHAUSTED"),
        Optional.empty(),
        Optional.empty(),
        true,
        objective,
        status == Status.OPTIMAL ? objective : OptionalLong.empty());
  }

  static Times times(long solveNanos) {
    TreeMap<Times.Phase, Times.Span> phases = new TreeMap<>();
    phases.put(Times.Phase.START, new Times.Span(110_000_000, OptionalLong.empty()));
    phases.put(Times.Phase.LOWER, new Times.Span(90_000_000, OptionalLong.of(80_000_000)));
    phases.put(Times.Phase.SOLVE, new Times.Span(solveNanos, OptionalLong.of(solveNanos)));
    phases.put(Times.Phase.ANSWER, new Times.Span(10_000_000, OptionalLong.of(9_000_000)));
    return new Times(phases, 0);
  }

  /** The model that a recipe builds: equal for equal content and amendments. */
  static ModelFacts model(String content, String amendments) {
    TreeMap<String, ModelFacts.Group> groups = new TreeMap<>();
    groups.put("one lot per firing", new ModelFacts.Group(digest("lots " + content), 30));
    if (!amendments.isEmpty()) {
      groups.put(amendments, new ModelFacts.Group(digest(amendments + content), 1));
    }
    return new ModelFacts(
        digest("built " + content + amendments),
        digest("search"),
        digest("canonical " + content + amendments),
        digest("canonical " + content),
        48,
        30 + groups.size() - 1,
        groups);
  }

  static RunKey key(String of) {
    return RunKey.of(java.util.Arrays.copyOf(hash(of), 16));
  }

  static Digest digest(String of) {
    return Digest.of(hash(of));
  }

  private static byte[] hash(String of) {
    try {
      return MessageDigest.getInstance("SHA-256").digest(of.getBytes(StandardCharsets.UTF_8));
    } catch (NoSuchAlgorithmException e) {
      throw new AssertionError(e);
    }
  }
}
