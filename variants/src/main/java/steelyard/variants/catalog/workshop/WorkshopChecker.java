package steelyard.variants.catalog.workshop;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import java.util.TreeMap;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;

/** Checks a plan against the routes alone: reads the starts and nothing else of the answer. */
final class WorkshopChecker {
  private final Workshop workshop;
  private final Answer answer;
  private final List<String> problems = new ArrayList<>();
  private final Map<Integer, List<Stay>> stays = new TreeMap<>();
  private long makespan;

  private WorkshopChecker(Workshop workshop, Answer answer) {
    this.workshop = workshop;
    this.answer = answer;
  }

  /** A mould at a station, in minutes. */
  private record Stay(int mould, long from, long to) {}

  static Check check(Workshop workshop, Answer answer) {
    WorkshopChecker checker = new WorkshopChecker(workshop, answer);
    if (!checker.hasEveryStart()) {
      return new Check(checker.problems, OptionalLong.empty());
    }
    for (int m = 0; m < workshop.moulds().size(); m++) {
      checker.follow(m);
    }
    checker.stays.forEach(checker::checkStation);
    return new Check(checker.problems, OptionalLong.of(checker.makespan));
  }

  private boolean hasEveryStart() {
    for (int m = 0; m < workshop.moulds().size(); m++) {
      for (int step = 0; step < workshop.moulds().get(m).route().size(); step++) {
        if (!answer.values().containsKey(Names.start(m, step))) {
          problems.add("the plan does not say when mould " + m + " starts step " + step);
        }
      }
    }
    return problems.isEmpty();
  }

  private void follow(int mould) {
    long free = 0;
    int step = 0;
    for (Operation operation : workshop.moulds().get(mould).route()) {
      long from = answer.value(Names.start(mould, step));
      if (from < free) {
        problems.add(
            "mould "
                + mould
                + " starts step "
                + step
                + " at minute "
                + from
                + ", but is free only from minute "
                + free
                + " on");
      }
      free = from + operation.minutes();
      if (operation.minutes() > 0) {
        stays
            .computeIfAbsent(operation.station(), s -> new ArrayList<>())
            .add(new Stay(mould, from, free));
      }
      step++;
    }
    makespan = Math.max(makespan, free);
  }

  private void checkStation(int station, List<Stay> visits) {
    visits.sort(Comparator.comparingLong(Stay::from).thenComparingLong(Stay::to));
    for (int i = 1; i < visits.size(); i++) {
      Stay before = visits.get(i - 1);
      Stay after = visits.get(i);
      if (after.from < before.to) {
        problems.add(
            "station "
                + station
                + " has moulds "
                + before.mould
                + " and "
                + after.mould
                + " at once from minute "
                + after.from
                + " on");
      }
    }
  }
}
