package steelyard.results.brief;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.Function;
import java.util.function.Predicate;
import java.util.function.ToDoubleFunction;
import java.util.stream.Collectors;
import steelyard.results.brief.BriefContext.Asked;
import steelyard.results.brief.Facts.ClassTable;
import steelyard.results.brief.Facts.Pair;
import steelyard.results.brief.Facts.Row;
import steelyard.results.brief.Facts.Run;
import steelyard.results.brief.Facts.Scope;
import steelyard.results.brief.Facts.Score;
import steelyard.results.brief.Facts.Trust;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Claim;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Observation;
import steelyard.results.statistics.Scores;
import steelyard.results.statistics.SolveTime;

/** What do these runs say? Turns observations into the facts that every page shows. */
public final class Brief {

  private static final Comparator<Observation> BY_INSTANCE =
      Comparator.comparing(Observation::family, NaturalOrder.BY_NUMBER)
          .thenComparing(Observation::instance, NaturalOrder.BY_NUMBER)
          .thenComparing(Observation::candidate, NaturalOrder.BY_NUMBER)
          .thenComparingLong(Observation::seed)
          .thenComparingInt(Observation::block);

  /** What a sweep runs once; a repetition replaces what was there. */
  private record Cell(String candidate, InstanceKey instance, long seed, int block) {
    static Cell of(Observation run) {
      return new Cell(run.candidate(), InstanceKey.of(run), run.seed(), run.block());
    }
  }

  private final BriefContext context;
  private final Comparing comparing;
  private final List<Observation> runs;
  private final Map<String, List<Observation>> byCandidate;
  private final Map<String, List<Observation>> finished;

  private Brief(BriefContext context, List<Observation> observations) {
    this.context = context;
    this.comparing = new Comparing(context.rules());
    Map<Cell, Observation> latest = new LinkedHashMap<>();
    observations.forEach(run -> latest.put(Cell.of(run), run));
    this.runs = latest.values().stream().sorted(BY_INSTANCE).toList();
    this.byCandidate = byCandidate(runs);
    this.finished = byCandidate(runs.stream().filter(r -> r.ending() != Ending.STOPPED).toList());
  }

  /**
   * The facts of a sweep, finished or under way.
   *
   * @param observations in any order, except that of two runs of one candidate on the same
   *     instance, seed and block the later one counts; runs that were stopped from outside are
   *     shown but count for nothing
   */
  public static Facts of(BriefContext context, List<Observation> observations) {
    return new Brief(context, observations).facts();
  }

  private Facts facts() {
    List<Row> rows = rows(run -> true);
    List<String> classes = distinct(Observation::instanceClass);
    return new Facts(
        context.plan(),
        context.site(),
        context.rules(),
        scope(classes),
        trust(),
        Troubles.of(context.findings(), byCandidate),
        verdict(rows),
        rows,
        classes.size() < 2 ? List.of() : classes.stream().map(this::classTable).toList(),
        pairs(rows),
        runs.stream().map(this::run).toList());
  }

  private static Map<String, List<Observation>> byCandidate(List<Observation> runs) {
    return runs.stream()
        .collect(
            Collectors.groupingBy(Observation::candidate, LinkedHashMap::new, Collectors.toList()));
  }

  private Scope scope(List<String> classes) {
    return new Scope(
        distinct(Observation::family),
        (int) runs.stream().map(InstanceKey::of).distinct().count(),
        classes,
        runs.stream().map(Observation::seed).distinct().sorted().toList(),
        runs.stream().map(Observation::limits).distinct().toList(),
        runs.stream().allMatch(Measure::timed));
  }

  private List<String> distinct(Function<Observation, String> field) {
    return runs.stream().map(field).distinct().sorted(NaturalOrder.BY_NUMBER).toList();
  }

  private Trust trust() {
    return new Trust(
        count(run -> run.check() == Check.VALID),
        count(run -> run.check() == Check.INVALID),
        count(run -> run.check() == Check.UNCHECKED && run.objective().isPresent()),
        count(run -> run.claim() == Claim.PROVED),
        count(run -> run.claim() == Claim.AGREED),
        count(run -> run.claim() == Claim.ALONE),
        count(run -> run.claim() == Claim.CONTRADICTED));
  }

  private int count(Predicate<Observation> holds) {
    return (int) runs.stream().filter(holds).count();
  }

  private ClassTable classTable(String name) {
    return new ClassTable(name, rows(run -> run.instanceClass().equals(name)));
  }

  private List<Row> rows(Predicate<Observation> included) {
    String service = context.plan().inService();
    List<Observation> before = runsOf(service, included);
    List<Row> rows = new ArrayList<>();
    for (String candidate : byCandidate.keySet()) {
      List<Observation> own = runsOf(candidate, included);
      boolean inService = candidate.equals(service);
      rows.add(
          new Row(
              candidate,
              inService,
              score(own),
              inService ? Optional.empty() : Optional.of(comparing.against(service, before, own))));
    }
    rows.sort(Comparator.comparing((Row row) -> !row.inService()).thenComparing(BEST_FIRST));
    return rows;
  }

  private static final Comparator<Row> BEST_FIRST =
      Comparator.<Row>comparingDouble(r -> r.score().penalisedMean().orElse(Double.MAX_VALUE))
          .thenComparing(Comparator.<Row>comparingDouble(r -> r.score().proved()).reversed())
          .thenComparing(Row::candidate, NaturalOrder.BY_NUMBER);

  private List<Observation> runsOf(String candidate, Predicate<Observation> included) {
    return finished.getOrDefault(candidate, List.of()).stream().filter(included).toList();
  }

  private Score score(List<Observation> own) {
    Collection<List<Observation>> instances =
        own.stream()
            .collect(
                Collectors.groupingBy(InstanceKey::of, LinkedHashMap::new, Collectors.toList()))
            .values();
    Rules rules = context.rules();
    return new Score(
        instances.size(),
        own.size(),
        share(instances, Measure::answered),
        share(instances, Measure::proved),
        time(instances, times -> Scores.penalisedMean(times, rules.penaltyFactor())),
        time(instances, times -> Scores.shiftedGeometricMean(times, rules.shiftSeconds())));
  }

  private static double share(
      Collection<List<Observation>> instances, Predicate<Observation> holds) {
    return Scores.count(
        instances.stream().map(some -> some.stream().map(holds::test).toList()).toList());
  }

  private static OptionalDouble time(
      Collection<List<Observation>> instances, ToDoubleFunction<List<List<SolveTime>>> mean) {
    if (instances.isEmpty() || !instances.stream().flatMap(List::stream).allMatch(Measure::timed)) {
      return OptionalDouble.empty();
    }
    return OptionalDouble.of(
        mean.applyAsDouble(
            instances.stream().map(some -> some.stream().map(Measure::time).toList()).toList()));
  }

  private Verdict verdict(List<Row> rows) {
    Set<String> barred = Troubles.barred(context.findings(), byCandidate);
    List<Verdict.Evidence> others = new ArrayList<>();
    for (Row row : rows) {
      row.against()
          .ifPresent(
              against ->
                  others.add(
                      new Verdict.Evidence(
                          row.candidate(), against, barred.contains(row.candidate()))));
    }
    boolean serviceHasRun = finished.containsKey(context.plan().inService());
    return Verdict.of(context.plan(), serviceHasRun, others, context.rules().margin());
  }

  private List<Pair> pairs(List<Row> rows) {
    List<Asked> asked = context.pairs();
    if (asked.isEmpty()) {
      String service = context.plan().inService();
      asked =
          rows.stream()
              .filter(row -> !row.inService())
              .map(row -> new Asked(service, row.candidate()))
              .toList();
    }
    return asked.stream().map(this::pair).toList();
  }

  private Pair pair(Asked asked) {
    return comparing.pair(
        asked.before(),
        runsOf(asked.before(), run -> true),
        asked.after(),
        runsOf(asked.after(), run -> true));
  }

  private Run run(Observation run) {
    return new Run(
        run.run(),
        run.family(),
        run.instance(),
        run.instanceClass(),
        run.candidate(),
        run.variant(),
        run.backend(),
        run.setting(),
        run.seed(),
        run.block(),
        run.limits(),
        run.status(),
        run.ending(),
        run.check(),
        run.claim(),
        Measure.proved(run),
        run.seconds(),
        run.objective(),
        run.bound(),
        run.peakBytes(),
        run.disturbed(),
        context.rerun().replace(BriefContext.RUN, Shell.quoted(run.run())));
  }
}
