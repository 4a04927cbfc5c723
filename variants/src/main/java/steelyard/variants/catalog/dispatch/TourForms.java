package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Term;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Other ways to say what tours and loads are, and what follows from it. */
final class TourForms {
  private TourForms() {}

  /**
   * Where every way takes time, a round of stops without the works would have to run back in time:
   * no two stops with the same next stop is enough. Times rule out such rounds as the numbers of
   * stops do in Miller, Tucker &amp; Zemlin (1960), "Integer Programming Formulation of Traveling
   * Salesman Problems", Journal of the ACM 7(4):326-329.
   */
  static void toursByTime(Dispatch day, Change change) {
    if (everyWayTakesTime(day)) {
      change.withdraw(Names.TOURS);
      allDifferent(day, change, change.group(Names.TOURS));
    }
  }

  private static boolean everyWayTakesTime(Dispatch day) {
    return day.stops().allMatch(i -> day.stops().allMatch(j -> i == j || day.between(i, j) > 0));
  }

  /** No two stops of a truck have the same next stop. */
  static void differentNext(Dispatch day, Change change) {
    allDifferent(day, change, change.group("no two stops before the same"));
  }

  private static void allDifferent(Dispatch day, Change change, Group group) {
    Tours tours = new Tours(day, change::variable);
    day.truckNumbers().forEach(truck -> group.post(new AllDifferent(tours.nexts(truck))));
  }

  /**
   * The stop before each stop, with the ways into stops, which cost what the ways out of them do.
   */
  static void twoWays(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    Group inverse = change.group("the stop before leads to the stop");
    List<Term> intoStops = new ArrayList<>();
    day.truckNumbers()
        .forEach(
            truck -> {
              List<IntVar> before = new ArrayList<>();
              for (int stop = 0; stop <= day.orders().size(); stop++) {
                before.add(before(truck, stop, day, change, tours));
                intoStops.add(Term.at(into(day.costs(), stop), before.get(stop)));
              }
              inverse.post(new Inverse(tours.nexts(truck), Views.of(before)));
            });
    change.group("ways in cost what ways out do").post(Term.sum(intoStops).eq(tours.driving()));
  }

  private static IntVar before(int truck, int stop, Dispatch day, Change change, Tours tours) {
    List<Term> leads = new ArrayList<>();
    for (int from = 0; from <= day.orders().size(); from++) {
      leads.add(Term.truth(tours.goes(truck, from, stop)));
    }
    long[] numbers = IntStream.rangeClosed(0, day.orders().size()).asLongStream().toArray();
    return change.define("before[" + truck + "." + stop + "]", Term.scalar(leads, numbers));
  }

  private static Ints into(Legs costs, int stop) {
    return Ints.of(IntStream.range(0, costs.stops()).map(from -> costs.get(from, stop)).toArray());
  }

  /**
   * Each order is packed onto a truck or left to the carriers, instead of a sum for each truck:
   * Shaw (2004), "A Constraint for Bin Packing", CP, LNCS 3258:648-662.
   */
  static void packedLoads(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    change.withdraw(Names.LOADS);
    Group loads = change.group(Names.LOADS);
    List<IntVar> on = new ArrayList<>();
    day.stops()
        .forEach(stop -> on.add(change.define("on[" + stop + "]", truckOf(stop, day, tours))));
    List<IntVar> load = new ArrayList<>();
    Term all = Term.constant(day.orders().stream().mapToLong(Order::pallets).sum());
    Term left = all;
    for (int truck = 0; truck < day.trucks().size(); truck++) {
      load.add(change.define("load[" + truck + "]", tours.load(truck)));
      loads.post(load.get(truck).le(day.truck(truck).pallets()));
      left = left.minus(tours.load(truck));
    }
    load.add(change.define("load[carriers]", left));
    Longs pallets = Longs.of(day.orders().stream().mapToLong(Order::pallets).toArray());
    loads.post(new BinPacking(Views.of(on), pallets, Views.of(load)));
  }

  /** The truck's number; one more than the last for the carriers. */
  private static Term truckOf(int stop, Dispatch day, Tours tours) {
    int carriers = day.trucks().size();
    List<IntVar> calls = day.truckNumbers().mapToObj(truck -> tours.calls(truck, stop)).toList();
    long[] less = day.truckNumbers().mapToLong(truck -> truck - (long) carriers).toArray();
    return Term.scalar(calls, less).plus(carriers);
  }
}
