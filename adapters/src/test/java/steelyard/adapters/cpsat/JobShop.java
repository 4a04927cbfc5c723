package steelyard.adapters.cpsat;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.BiConsumer;
import java.util.stream.IntStream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Model;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.ModelBuilder;

/**
 * Two job shops of Fisher &amp; Thompson (1963), "Probabilistic Learning Combinations of Local
 * Job-Shop Scheduling Rules", in Industrial Scheduling, Prentice-Hall, 225-251, as distributed in
 * the OR-Library (Beasley 1990, "OR-Library: Distributing Test Problems by Electronic Mail", JORS
 * 41(11):1069-1072). A row is a job: machine, duration, machine, duration, ...
 */
final class JobShop {
  /** Smallest makespan: 55. */
  static final int[][] FT06 = {
    {2, 1, 0, 3, 1, 6, 3, 7, 5, 3, 4, 6},
    {1, 8, 2, 5, 4, 10, 5, 10, 0, 10, 3, 4},
    {2, 5, 3, 4, 5, 8, 0, 9, 1, 1, 4, 7},
    {1, 5, 0, 5, 2, 5, 3, 3, 4, 8, 5, 9},
    {2, 9, 1, 3, 4, 5, 5, 4, 0, 3, 3, 1},
    {1, 3, 3, 3, 5, 9, 0, 10, 4, 4, 2, 1}
  };

  /**
   * Smallest makespan: 930, first proved by Carlier &amp; Pinson (1989), "An Algorithm for Solving
   * the Job-Shop Problem", Management Science 35(2):164-176. Too hard to be proved while a test
   * runs, so that a limit is what ends it.
   */
  static final int[][] FT10 = {
    {0, 29, 1, 78, 2, 9, 3, 36, 4, 49, 5, 11, 6, 62, 7, 56, 8, 44, 9, 21},
    {0, 43, 2, 90, 4, 75, 9, 11, 3, 69, 1, 28, 6, 46, 5, 46, 7, 72, 8, 30},
    {1, 91, 0, 85, 3, 39, 2, 74, 8, 90, 5, 10, 7, 12, 6, 89, 9, 45, 4, 33},
    {1, 81, 2, 95, 0, 71, 4, 99, 6, 9, 8, 52, 7, 85, 3, 98, 9, 22, 5, 43},
    {2, 14, 0, 6, 1, 22, 5, 61, 3, 26, 4, 69, 8, 21, 7, 49, 9, 72, 6, 53},
    {2, 84, 1, 2, 5, 52, 3, 95, 8, 48, 9, 72, 0, 47, 6, 65, 4, 6, 7, 25},
    {1, 46, 0, 37, 3, 61, 2, 13, 6, 32, 5, 21, 9, 32, 8, 89, 7, 30, 4, 55},
    {2, 31, 0, 86, 1, 46, 5, 74, 4, 32, 6, 88, 8, 19, 9, 48, 7, 36, 3, 79},
    {0, 76, 1, 69, 3, 76, 5, 51, 2, 85, 9, 11, 6, 40, 7, 89, 4, 26, 8, 74},
    {1, 85, 0, 13, 2, 61, 6, 7, 8, 64, 9, 76, 5, 47, 3, 52, 4, 90, 7, 45}
  };

  private JobShop() {}

  /** The variable that is minimised. */
  static final String MAKESPAN = "makespan";

  /** Operations in order within jobs, no two at once on a machine, the makespan minimised. */
  static Model model(int[][] jobs) {
    return model(jobs, Draft::minimize);
  }

  /** The same with a goal of its own, made of the makespan. */
  static Model model(int[][] jobs, BiConsumer<Draft, IntVar> goal) {
    return ModelBuilder.of(
        draft -> {
          int horizon =
              IntStream.range(0, jobs.length)
                  .map(
                      j ->
                          IntStream.range(0, jobs[j].length / 2).map(k -> jobs[j][2 * k + 1]).sum())
                  .sum();
          IntVar makespan = draft.integer(MAKESPAN, Domain.between(0, horizon));
          Map<Integer, List<Task>> byMachine = new TreeMap<>();
          for (int j = 0; j < jobs.length; j++) {
            Task previous = Task.fixed(makespan, 0);
            for (int k = 0; k < jobs[j].length / 2; k++) {
              IntVar start = draft.integer("start[" + j + "," + k + "]", 0, horizon);
              Task task = Task.fixed(start, jobs[j][2 * k + 1]);
              byMachine.computeIfAbsent(jobs[j][2 * k], m -> new ArrayList<>()).add(task);
              if (k > 0) {
                draft.group("order").post(previous.end().le(task.start()));
              }
              previous = task;
            }
            draft.group("makespan").post(previous.end().le(makespan));
          }
          byMachine
              .values()
              .forEach(tasks -> draft.group("machines").post(new NoOverlap(Tasks.of(tasks))));
          goal.accept(draft, makespan);
        });
  }
}
