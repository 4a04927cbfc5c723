package steelyard.results.brief;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.Collectors;
import steelyard.results.brief.Facts.Against;
import steelyard.results.brief.Facts.ClassAgainst;
import steelyard.results.brief.Facts.Extreme;
import steelyard.results.brief.Facts.GroundCount;
import steelyard.results.brief.Facts.Open;
import steelyard.results.brief.Facts.Pair;
import steelyard.results.brief.Facts.Point;
import steelyard.results.brief.Facts.Tally;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Observation;
import steelyard.results.statistics.Outcome;
import steelyard.results.statistics.PairRule;
import steelyard.results.statistics.PairRule.Comparison;
import steelyard.results.statistics.PairRule.Ground;
import steelyard.results.statistics.Scores;
import steelyard.results.statistics.SolveTime;
import steelyard.results.statistics.TimeRatio;

/**
 * Compares two candidates over the runs that belong together: the same instance, seed and block
 * under the same limits. Wall times from different blocks are never compared.
 */
final class Comparing {

  /** What two runs must share to be a pair. */
  private record Slot(String family, String instance, long seed, int block, Limits limits) {
    static Slot of(Observation run) {
      return new Slot(run.family(), run.instance(), run.seed(), run.block(), run.limits());
    }
  }

  private record Match(Observation before, Observation after, Comparison comparison) {

    InstanceKey instance() {
      return InstanceKey.of(before);
    }

    boolean bothTimed() {
      return Measure.timed(before) && Measure.timed(after);
    }
  }

  private final Rules rules;

  Comparing(Rules rules) {
    this.rules = rules;
  }

  /** Everything that is said of one pair of candidates, their runs in the order given. */
  Pair pair(
      String beforeName, List<Observation> before, String afterName, List<Observation> after) {
    List<Match> matches = match(before, after);
    List<ClassAgainst> classes = new ArrayList<>();
    grouped(matches, match -> match.before().instanceClass())
        .forEach((name, some) -> classes.add(new ClassAgainst(name, against(beforeName, some))));
    classes.sort(Comparator.comparing(ClassAgainst::instanceClass, NaturalOrder.BY_NUMBER));
    return new Pair(
        beforeName,
        afterName,
        against(beforeName, matches),
        classes,
        grounds(matches),
        open(matches),
        after.size() - matches.size(),
        matches.stream().map(Comparing::point).toList());
  }

  /** The comparison without its points, as the table of candidates shows it. */
  Against against(String beforeName, List<Observation> before, List<Observation> after) {
    return against(beforeName, match(before, after));
  }

  private List<Match> match(List<Observation> before, List<Observation> after) {
    PairRule rule = new PairRule(rules.margin());
    Map<Slot, Observation> partners =
        after.stream().collect(Collectors.toMap(Slot::of, Function.identity()));
    List<Match> matches = new ArrayList<>();
    for (Observation first : before) {
      Observation second = partners.get(Slot.of(first));
      if (second != null) {
        matches.add(new Match(first, second, compare(rule, first, second)));
      }
    }
    return matches;
  }

  private static Comparison compare(PairRule rule, Observation before, Observation after) {
    boolean same =
        before.model().equals(after.model())
            && before.backend().equals(after.backend())
            && before.setting().equals(after.setting());
    return same || before.run().equals(after.run())
        ? new Comparison(Outcome.UNCHANGED, Ground.NONE)
        : rule.compare(Measure.attainment(before), Measure.attainment(after));
  }

  private Against against(String beforeName, List<Match> matches) {
    Map<InstanceKey, List<Match>> instances = grouped(matches, Match::instance);
    return new Against(
        beforeName,
        instances.size(),
        tally(instances.values()),
        penalised(instances.values(), Match::before),
        penalised(instances.values(), Match::after),
        extreme(instances, Outcome.LOSS, TimeRatio.Kind.AT_MOST, BY_RATIO.reversed()),
        extreme(instances, Outcome.WIN, TimeRatio.Kind.AT_LEAST, BY_RATIO));
  }

  private static final Comparator<Extreme> BY_RATIO =
      Comparator.comparingDouble(extreme -> extreme.ratio().value());

  private static Tally tally(Collection<List<Match>> instances) {
    Map<Outcome, Integer> counts = new EnumMap<>(Outcome.class);
    instances.forEach(pairs -> counts.merge(outcome(pairs), 1, Integer::sum));
    return new Tally(
        counts.getOrDefault(Outcome.WIN, 0),
        counts.getOrDefault(Outcome.LOSS, 0),
        counts.getOrDefault(Outcome.TIE, 0),
        counts.getOrDefault(Outcome.BOTH_OPEN, 0),
        counts.getOrDefault(Outcome.UNCHANGED, 0));
  }

  private static Outcome outcome(List<Match> pairs) {
    return Outcome.ofInstance(pairs.stream().map(pair -> pair.comparison().outcome()).toList());
  }

  private OptionalDouble penalised(
      Collection<List<Match>> instances, Function<Match, Observation> side) {
    if (instances.isEmpty()
        || !instances.stream().flatMap(List::stream).allMatch(Match::bothTimed)) {
      return OptionalDouble.empty();
    }
    List<List<SolveTime>> times =
        instances.stream()
            .map(pairs -> pairs.stream().map(side).map(Measure::time).toList())
            .toList();
    return OptionalDouble.of(Scores.penalisedMean(times, rules.penaltyFactor()));
  }

  /**
   * Of the instances with this outcome the one that comes first, passing over those whose ratio is
   * only bounded from the useless side.
   */
  private Optional<Extreme> extreme(
      Map<InstanceKey, List<Match>> instances,
      Outcome wanted,
      TimeRatio.Kind useless,
      Comparator<Extreme> first) {
    List<Extreme> found = new ArrayList<>();
    instances.forEach(
        (key, pairs) -> {
          if (outcome(pairs) == wanted && pairs.stream().allMatch(Match::bothTimed)) {
            ratio(pairs)
                .filter(ratio -> ratio.kind() != useless)
                .filter(ratio -> wanted == Outcome.LOSS ? ratio.value() > 1 : ratio.value() < 1)
                .ifPresent(r -> found.add(new Extreme(key.family(), key.instance(), r)));
          }
        });
    return found.stream().min(first);
  }

  private Optional<TimeRatio> ratio(List<Match> pairs) {
    return TimeRatio.mean(
        pairs.stream()
            .filter(pair -> pair.comparison().outcome() != Outcome.UNCHANGED)
            .map(
                pair ->
                    TimeRatio.of(
                        Measure.time(pair.before()),
                        Measure.time(pair.after()),
                        rules.floorSeconds()))
            .flatMap(Optional::stream)
            .toList());
  }

  private static List<GroundCount> grounds(List<Match> matches) {
    List<GroundCount> counts = new ArrayList<>();
    for (Ground ground : Ground.values()) {
      if (ground != Ground.NONE) {
        counts.add(
            new GroundCount(
                ground,
                occurrences(matches, new Comparison(Outcome.WIN, ground)),
                occurrences(matches, new Comparison(Outcome.LOSS, ground))));
      }
    }
    return counts;
  }

  private static int occurrences(List<Match> matches, Comparison wanted) {
    return (int) matches.stream().filter(match -> match.comparison().equals(wanted)).count();
  }

  private static Open open(List<Match> matches) {
    int beforeOnly = 0;
    int afterOnly = 0;
    int both = 0;
    for (Match match : matches) {
      boolean before = !Measure.proved(match.before());
      boolean after = !Measure.proved(match.after());
      beforeOnly += before && !after ? 1 : 0;
      afterOnly += after && !before ? 1 : 0;
      both += before && after ? 1 : 0;
    }
    return new Open(beforeOnly, afterOnly, both);
  }

  private static Point point(Match match) {
    Observation before = match.before();
    return new Point(
        before.family(),
        before.instance(),
        before.instanceClass(),
        before.seed(),
        before.run(),
        match.after().run(),
        Measure.time(before),
        Measure.time(match.after()),
        match.comparison().outcome(),
        match.comparison().ground());
  }

  private static <K> Map<K, List<Match>> grouped(List<Match> matches, Function<Match, K> key) {
    return matches.stream()
        .collect(Collectors.groupingBy(key, LinkedHashMap::new, Collectors.toList()));
  }
}
