package steelyard.variants.catalog.workshop;

import java.util.ArrayList;
import java.util.List;

/**
 * A plan made without looking ahead: of each mould's next operation, the one that can start first
 * comes next; of several, the one with most work after it, then the lower mould number. Its length
 * bounds the shortest plan from above (a non-delay schedule by most work remaining; common
 * practice).
 */
final class GreedyPlan {
  private final Workshop workshop;
  private final int[] stationFree;
  private final int[] mouldFree;
  private final List<List<Integer>> starts = new ArrayList<>();

  private GreedyPlan(Workshop workshop) {
    this.workshop = workshop;
    this.stationFree = new int[workshop.stations()];
    this.mouldFree = new int[workshop.moulds().size()];
    workshop.moulds().forEach(mould -> starts.add(new ArrayList<>()));
  }

  static GreedyPlan of(Workshop workshop) {
    GreedyPlan plan = new GreedyPlan(workshop);
    int operations = workshop.moulds().stream().mapToInt(mould -> mould.route().size()).sum();
    for (int i = 0; i < operations; i++) {
      plan.place(plan.next());
    }
    return plan;
  }

  /** When the last mould is done. */
  int makespan() {
    int latest = 0;
    for (int done : mouldFree) {
      latest = Math.max(latest, done);
    }
    return latest;
  }

  int start(int mould, int step) {
    return starts.get(mould).get(step);
  }

  private int next() {
    int best = -1;
    for (int m = 0; m < mouldFree.length; m++) {
      if (!isDone(m) && (best < 0 || comesBefore(m, best))) {
        best = m;
      }
    }
    return best;
  }

  private boolean comesBefore(int mould, int other) {
    int earlier = Integer.compare(earliestStart(mould), earliestStart(other));
    return earlier != 0 ? earlier < 0 : workAfter(mould) > workAfter(other);
  }

  private void place(int mould) {
    int start = earliestStart(mould);
    Operation operation = nextOf(mould);
    starts.get(mould).add(start);
    mouldFree[mould] = start + operation.minutes();
    if (operation.minutes() > 0) {
      stationFree[operation.station()] = mouldFree[mould];
    }
  }

  private int earliestStart(int mould) {
    Operation operation = nextOf(mould);
    return operation.minutes() == 0
        ? mouldFree[mould]
        : Math.max(mouldFree[mould], stationFree[operation.station()]);
  }

  private boolean isDone(int mould) {
    return step(mould) > workshop.mould(mould).lastStep();
  }

  private Operation nextOf(int mould) {
    return workshop.mould(mould).route().get(step(mould));
  }

  private int workAfter(int mould) {
    return workshop.mould(mould).tail(step(mould));
  }

  private int step(int mould) {
    return starts.get(mould).size();
  }
}
