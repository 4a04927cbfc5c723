package steelyard.variants.model;

import java.util.Collection;
import java.util.List;
import java.util.Objects;
import java.util.stream.IntStream;

/** A row of tasks, column by column. */
public record Tasks(Views starts, Views durations, Views ends, Atoms presences) {

  public Tasks {
    Objects.requireNonNull(starts, "starts");
    Objects.requireNonNull(durations, "durations");
    Objects.requireNonNull(ends, "ends");
    Objects.requireNonNull(presences, "presences");
    int n = starts.size();
    if (durations.size() != n || ends.size() != n || presences.size() != n) {
      throw new IllegalArgumentException("columns of tasks differ in length");
    }
  }

  public static Tasks of(Task... tasks) {
    return of(List.of(tasks));
  }

  public static Tasks of(Collection<Task> tasks) {
    return new Tasks(
        Views.of(tasks.stream().map(Task::start).toList()),
        Views.of(tasks.stream().map(Task::duration).toList()),
        Views.of(tasks.stream().map(Task::end).toList()),
        Atoms.of(tasks.stream().map(Task::present).toList()));
  }

  public int size() {
    return starts.size();
  }

  public Task get(int i) {
    return new Task(starts.get(i), durations.get(i), ends.get(i), presences.get(i));
  }

  public List<Task> asList() {
    return IntStream.range(0, size()).mapToObj(this::get).toList();
  }

  Tasks mapped(Rewriting rewriting) {
    return new Tasks(
        starts.mapped(rewriting),
        durations.mapped(rewriting),
        ends.mapped(rewriting),
        presences.mapped(rewriting));
  }

  Tasks permuted(int[] order) {
    return new Tasks(
        starts.permuted(order),
        durations.permuted(order),
        ends.permuted(order),
        presences.permuted(order));
  }

  int compareRows(int i, int j) {
    int order = starts.compareRows(i, j);
    order = order != 0 ? order : durations.compareRows(i, j);
    order = order != 0 ? order : ends.compareRows(i, j);
    return order != 0 ? order : presences.compareRows(i, j);
  }
}
