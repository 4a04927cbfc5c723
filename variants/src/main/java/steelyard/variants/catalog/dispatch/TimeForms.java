package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Table;
import steelyard.variants.model.Table.Polarity;
import steelyard.variants.model.Term;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Other ways to say that a truck is there in time, and what its way costs. */
final class TimeForms {
  private final Dispatch day;
  private final Change change;
  private final Tours tours;

  private TimeForms(Dispatch day, Change change) {
    this.day = day;
    this.change = change;
    this.tours = new Tours(day, change::variable);
  }

  /**
   * The time at the next stop is looked up by where the truck goes, instead of a case for each leg:
   * element constraints of Van Hentenryck &amp; Carillon (1988), "Generality versus Specificity: an
   * Experience with AI and OR Techniques", AAAI, 660-664. A truck that does not call is in time for
   * itself.
   */
  static void byElement(Dispatch day, Change change) {
    TimeForms forms = new TimeForms(day, change);
    forms.withdrawCases();
    forms.eachWay(
        (truck, from) ->
            forms.requireInTime(
                truck, from, Term.at(forms.ways(from), forms.tours.next(truck, from))));
  }

  /**
   * The next stop, how long and how dear the way there is are together a row of a table. Time and
   * cost do not go hand in hand, so that the table knows more than an array for each.
   */
  static void byTable(Dispatch day, Change change) {
    TimeForms forms = new TimeForms(day, change);
    forms.withdrawCases();
    List<Term> prices = new ArrayList<>();
    Group legs = change.group("a way with its length and its price");
    forms.eachWay(
        (truck, from) -> {
          Ints ways = forms.ways(from);
          Ints costs = day.costs().from(from);
          IntVar way = change.integer("way[" + truck + "." + from + "]", domain(ways));
          IntVar price = change.integer("price[" + truck + "." + from + "]", domain(costs));
          Views scope = Views.of(forms.tours.next(truck, from), way, price);
          legs.post(new Table(scope, rows(ways, costs), Polarity.ALLOWED));
          forms.requireInTime(truck, from, way);
          prices.add(price);
        });
    change.minimize(Term.sum(prices).plus(forms.tours.sending()));
  }

  /** There are none where no truck gets in anywhere. */
  private void withdrawCases() {
    if (day.stops().anyMatch(stop -> day.truckNumbers().anyMatch(t -> day.fits(t, stop)))) {
      change.withdraw(Names.TIMES);
    }
  }

  /** Something said of a truck's way from a stop. */
  private interface EachWay {
    void say(int truck, int from);
  }

  private void eachWay(EachWay what) {
    day.truckNumbers()
        .forEach(
            truck ->
                IntStream.rangeClosed(0, day.orders().size())
                    .filter(from -> day.fits(truck, from))
                    .forEach(from -> what.say(truck, from)));
  }

  private void requireInTime(int truck, int from, Term way) {
    List<Term> latest = new ArrayList<>();
    latest.add(Term.constant(from == 0 ? 0 : day.truck(truck).shift()));
    day.stops().forEach(stop -> latest.add(tours.begin(stop)));
    Term left = from == 0 ? Term.constant(0) : tours.begin(from);
    change.group(Names.TIMES).post(left.plus(way).le(Term.at(latest, tours.next(truck, from))));
  }

  /** Quarters from each stop to the next, unloading included; 0 to the stop itself. */
  private Ints ways(int from) {
    return Ints.of(
        IntStream.rangeClosed(0, day.orders().size())
            .map(to -> to == from ? 0 : day.between(from, to))
            .toArray());
  }

  private static Domain domain(Ints values) {
    return Domain.of(values.stream());
  }

  private static Tuples rows(Ints ways, Ints costs) {
    List<int[]> rows = new ArrayList<>();
    for (int to = 0; to < ways.size(); to++) {
      rows.add(new int[] {to, ways.get(to), costs.get(to)});
    }
    return Tuples.of(3, rows);
  }
}
