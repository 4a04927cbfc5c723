package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import steelyard.adapters.spi.Goal;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Model;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/** The corners of tasks: empty ones, absent ones, and a capacity that is negative. */
class TasksTest {
  private static final Domain TIMES = Domain.between(0, 4);
  private static final Task FOUR_LONG = Task.fixed(View.constant(0), 4);
  private static final Task EMPTY = Task.fixed(View.of(0), 0);

  @Test
  void anEmptyTaskDoesNotLieInsideAnother_whenTasksMayNotOverlap() {
    assertThat(starts(NoOverlap.of(FOUR_LONG, EMPTY))).containsExactlyInAnyOrder(0, 4);
  }

  @Test
  void emptyTasksShareAMoment() {
    assertThat(starts(NoOverlap.of(EMPTY, Task.fixed(View.constant(2), 0)))).hasSize(5);
  }

  @Test
  void anEmptyTaskNeedsNoCapacity() {
    Cumulative resource =
        new Cumulative(Tasks.of(FOUR_LONG, EMPTY), Views.ofConstants(1, 9), View.constant(1));
    assertThat(starts(resource)).hasSize(5);
  }

  @Test
  void anAbsentTaskStartsAnywhere() {
    Atom present = Atom.is(1, 1);
    Task optional = new Task(View.of(0), View.constant(2), View.of(0).shifted(2), present);
    List<Ints> all = solutions(List.of(TIMES, Domain.BOOLEAN), NoOverlap.of(FOUR_LONG, optional));
    assertThat(all).hasSize(5 + 1).contains(Ints.of(4, 1), Ints.of(0, 0));
  }

  @Test
  void aTaskWithoutDemandNeedsACapacityOfZero() {
    Cumulative resource =
        new Cumulative(Tasks.of(FOUR_LONG), Views.ofConstants(0), View.of(0).shifted(-2));
    assertThat(starts(resource)).containsExactlyInAnyOrder(2, 3, 4);
  }

  @Test
  void nothingIsSaidOfTheCapacity_whenNoTaskRuns() {
    Cumulative resource =
        new Cumulative(
            Tasks.of(Task.fixed(View.constant(1), 0)),
            Views.ofConstants(3),
            View.of(0).shifted(-4));
    assertThat(starts(resource)).hasSize(5);
  }

  private static List<Integer> starts(Constraint constraint) {
    return solutions(List.of(TIMES), constraint).stream().map(s -> s.get(0)).toList();
  }

  private static List<Ints> solutions(List<Domain> domains, Constraint constraint) {
    Model model = Solving.flat(domains, List.of(constraint), Optional.empty());
    Ints all = Ints.of(IntStream.range(0, domains.size()).toArray());
    return Solving.solve(model, new Goal.Enumerate(all, Long.MAX_VALUE)).heard().solutions;
  }
}
