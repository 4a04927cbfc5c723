package steelyard.variants.catalog.workshop;

import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Implied constraints on how long a plan lasts. */
final class TimeBounds {
  private TimeBounds() {}

  /**
   * A station's visits, each from its head on and with its tail after it, make a one-machine
   * problem that every plan solves; its preemptive optimum is no longer than the plan.
   */
  static void loadBound(Workshop workshop, Change change) {
    IntVar makespan = change.variable(Names.MAKESPAN);
    Group group = change.group("no shorter than a station's work");
    for (int station = 0; station < workshop.stations(); station++) {
      group.post(makespan.ge(JacksonBound.of(workshop.visits(station))));
    }
  }

  /**
   * A station does nothing before its first start, then at least all its visits one after the
   * other, and the visit that ends last has its tail before it.
   */
  static void loadFromFirst(Workshop workshop, Change change) {
    Starts starts = new Starts(workshop, change::variable);
    IntVar makespan = change.variable(Names.MAKESPAN);
    Group group = change.group("a station's work after its first start");
    for (int station = 0; station < workshop.stations(); station++) {
      List<Visit> visits = workshop.visits(station);
      if (!visits.isEmpty()) {
        int load = visits.stream().mapToInt(Visit::minutes).sum();
        int tail = visits.stream().mapToInt(Visit::tail).min().orElseThrow();
        IntVar first =
            change.define(
                "first[" + station + "]", Term.min(visits.stream().map(starts::of).toList()));
        group.post(first.plus(load + tail).le(makespan));
      }
    }
  }

  /** The operations after a start follow one after the other: summed up from the route. */
  static void workLeft(Workshop workshop, Change change) {
    Starts starts = new Starts(workshop, change::variable);
    IntVar makespan = change.variable(Names.MAKESPAN);
    Group group = change.group("a mould's work after each start");
    for (int m = 0; m < workshop.moulds().size(); m++) {
      Mould mould = workshop.mould(m);
      int index = m;
      IntStream.range(0, mould.lastStep())
          .forEach(step -> group.post(starts.end(index, step).plus(mould.tail(step)).le(makespan)));
    }
  }
}
