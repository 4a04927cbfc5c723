package steelyard.variants.catalog.workshop;

import java.util.List;

/**
 * A mould and the way that it goes.
 *
 * @param route its operations in order, at least one; a station may come twice
 */
record Mould(List<Operation> route) {
  Mould {
    route = List.copyOf(route);
    if (route.isEmpty()) {
      throw new IllegalArgumentException("a mould without operations");
    }
  }

  int minutes(int step) {
    return route.get(step).minutes();
  }

  int lastStep() {
    return route.size() - 1;
  }

  /** Minutes of work before {@code step}: no plan starts it earlier. */
  int head(int step) {
    return minutesOf(route.subList(0, step));
  }

  /** Minutes of work after {@code step}: no plan is done sooner after its end. */
  int tail(int step) {
    return minutesOf(route.subList(step + 1, route.size()));
  }

  private static int minutesOf(List<Operation> operations) {
    return operations.stream().mapToInt(Operation::minutes).sum();
  }
}
