package steelyard.variants.catalog.workshop;

import steelyard.variants.model.Branching.ValueOrder;
import steelyard.variants.model.Branching.VariableOrder;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;

/** Branchings and a hint; they change no solutions. */
final class SearchOrders {
  private SearchOrders() {}

  static void earliestFirst(Workshop workshop, Change change) {
    Views starts = Views.of(new Starts(workshop, change::variable).all().toList());
    change.branch(starts, VariableOrder.SMALLEST_MIN, ValueOrder.MIN);
  }

  /** Once every order is decided, the earliest starts make a plan. */
  static void orderFirst(Workshop workshop, Change change) {
    Views orders =
        Views.of(
            Pair.all(workshop).stream()
                .map(pair -> change.variable(Orders.name(pair.one(), pair.other())))
                .toList());
    change.branch(orders, VariableOrder.WEIGHTED_DEGREE, ValueOrder.MAX);
    earliestFirst(workshop, change);
  }

  static void greedyHint(Workshop workshop, Change change) {
    Starts starts = new Starts(workshop, change::variable);
    GreedyPlan plan = GreedyPlan.of(workshop);
    for (int m = 0; m < workshop.moulds().size(); m++) {
      for (int step = 0; step <= workshop.mould(m).lastStep(); step++) {
        change.hint(starts.of(m, step), plan.start(m, step));
      }
    }
  }
}
