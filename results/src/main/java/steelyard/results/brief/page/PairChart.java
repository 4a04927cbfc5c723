package steelyard.results.brief.page;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import steelyard.results.brief.Facts;
import steelyard.results.brief.Facts.Pair;
import steelyard.results.brief.Facts.Point;
import steelyard.results.brief.Words;
import steelyard.results.brief.chart.Scatter;
import steelyard.results.brief.chart.Scatter.Dot;
import steelyard.results.ledger.Limits;

/** The scatter of a pair of candidates, and the marks that tell its classes apart. */
public final class PairChart {

  private final Facts facts;
  private final Map<Integer, String> legends = new HashMap<>();

  PairChart(Facts facts) {
    this.facts = facts;
  }

  /** Whether a chart of times says anything about this pair. */
  public boolean drawn(Pair pair) {
    return facts.scope().timed() && !pair.points().isEmpty();
  }

  /** The chart. */
  public String svg(Pair pair, int index) {
    double limit =
        facts.scope().limits().stream().mapToDouble(Limits::wallSeconds).max().orElseThrow();
    List<Dot> dots =
        pair.points().stream()
            .map(point -> new Dot(point.before(), point.after(), mark(point.instanceClass())))
            .toList();
    return Scatter.svg(
        "pair-" + index + "-chart",
        "Seconds before and after, one mark for each pair of runs",
        description(pair),
        dots,
        limit,
        facts.rules().floorSeconds());
  }

  private static String description(Pair pair) {
    long answered = pair.points().stream().filter(PairChart::bothAnswered).count();
    long faster =
        pair.points().stream()
            .filter(PairChart::bothAnswered)
            .filter(point -> point.after().seconds() < point.before().seconds())
            .count();
    return "Before, across: "
        + Words.name(pair.before())
        + ". After, upwards: "
        + Words.name(pair.after())
        + ". Of "
        + Words.plural(answered, "pair")
        + " that both answered, "
        + faster
        + " lie below the diagonal, where after is faster. On the rails for runs without an answer"
        + " by the limit: before only "
        + pair.open().beforeOnly()
        + ", after only "
        + pair.open().afterOnly()
        + ", both "
        + pair.open().both()
        + ". The table lists every pair.";
  }

  private static boolean bothAnswered(Point point) {
    return !point.before().censored() && !point.after().censored();
  }

  /** The mark of a class, for the head of its row. */
  public String legend(String instanceClass) {
    return legends.computeIfAbsent(mark(instanceClass), Scatter::legend);
  }

  private int mark(String instanceClass) {
    return Math.max(0, facts.scope().classes().indexOf(instanceClass));
  }
}
