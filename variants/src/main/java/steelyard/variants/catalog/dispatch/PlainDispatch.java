package steelyard.variants.catalog.dispatch;

import java.util.HashMap;
import java.util.Map;
import java.util.stream.IntStream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Subcircuit;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.Group;

/**
 * The plain model: for each truck a tour over some of the stops, for each stop when unloading
 * begins, and a case for each leg that can be driven.
 */
final class PlainDispatch {
  private final Dispatch day;
  private final Draft draft;
  private final Map<String, IntVar> byName = new HashMap<>();
  private final Tours tours;

  private PlainDispatch(Dispatch day, Draft draft) {
    this.day = day;
    this.draft = draft;
    this.tours = new Tours(day, byName::get);
  }

  static void write(Dispatch day, Draft draft) {
    PlainDispatch model = new PlainDispatch(day, draft);
    day.truckNumbers().forEach(model::truck);
    day.stops().forEach(model::stop);
    day.truckNumbers().forEach(model::inTime);
    draft.minimize(model.tours.driving().plus(model.tours.sending()));
  }

  private void truck(int truck) {
    for (int stop = 0; stop <= day.orders().size(); stop++) {
      IntVar next = keep(draft.integer(Names.next(truck, stop), ways(truck, stop)));
      keep(draft.define(Names.calls(truck, stop), next.ne(stop)));
      keep(draft.define(Names.cost(truck, stop), Term.at(day.costs().from(stop), next)));
    }
    draft.group(Names.TOURS).post(new Subcircuit(tours.nexts(truck)));
    Group fromWorks = draft.group(Names.FROM_WORKS);
    day.stops()
        .forEach(
            stop -> fromWorks.post(tours.isThere(truck, stop).implies(tours.isThere(truck, 0))));
    draft.group(Names.LOADS).post(tours.load(truck).le(day.truck(truck).pallets()));
  }

  /** Where the truck can go from the stop: nowhere where it does not get in. */
  private Domain ways(int truck, int stop) {
    return day.fits(truck, stop)
        ? Domain.of(IntStream.rangeClosed(0, day.orders().size()).filter(to -> day.fits(truck, to)))
        : Domain.of(stop);
  }

  private void stop(int stop) {
    Order order = day.order(stop);
    IntVar begin = keep(draft.integer(Names.begin(stop), order.opens(), order.closes()));
    Term calling = tours.calling(stop);
    if (order.isOurs()) {
      draft.group(Names.DELIVERED).post(calling.eq(1));
    } else {
      draft.group(Names.DELIVERED).post(calling.le(1));
      IntVar left = keep(draft.define(Names.left(stop), calling.le(0)));
      draft.group(Names.IDLE).post(left.eq(1).implies(begin.eq(order.opens())));
    }
  }

  private void inTime(int truck) {
    Group times = draft.group(Names.TIMES);
    for (int from = 0; from <= day.orders().size(); from++) {
      for (int to = 0; to <= day.orders().size(); to++) {
        if (from != to && day.fits(truck, from) && day.fits(truck, to)) {
          times.post(tours.goes(truck, from, to).implies(isInTime(truck, from, to)));
        }
      }
    }
  }

  private Formula isInTime(int truck, int from, int to) {
    Term left = from == 0 ? Term.constant(0) : tours.begin(from);
    Term latest = to == 0 ? Term.constant(day.truck(truck).shift()) : tours.begin(to);
    return left.plus(day.between(from, to)).le(latest);
  }

  private IntVar keep(IntVar variable) {
    byName.put(variable.name(), variable);
    return variable;
  }
}
