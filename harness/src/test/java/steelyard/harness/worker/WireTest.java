package steelyard.harness.worker;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.spi.Description;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.Status;
import steelyard.adapters.spi.Work;
import steelyard.variants.model.Digest;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;

class WireTest {
  private static final String NASTY = "a \"b\"\\\n\t\u0007 \u202e<script> 🧱 ../x";
  private static final Digest DIGEST = new Digest("0123456789abcdef".repeat(4));

  @TempDir Path folder;

  static List<Event> events() {
    return List.of(
        new Event.Phase(Phases.SOLVE, OptionalLong.of(30_000_000)),
        new Event.Phase(Phases.DONE, OptionalLong.empty()),
        new Event.Step(NASTY),
        new Event.Solution(OptionalLong.empty(), Ints.of()),
        new Event.Solution(
            OptionalLong.of(Long.MIN_VALUE), Ints.of(Integer.MIN_VALUE, 0, Integer.MAX_VALUE)),
        new Event.Thinned(Long.MAX_VALUE),
        new Event.Bound(-1),
        new Event.Count("failures", (1L << 62) - 1),
        new Event.Blame("failures", Longs.of(1, 0, Long.MAX_VALUE)),
        new Event.Result(
            new SolveOutcome(
                Status.OPTIMAL, OptionalLong.of(7), SolveOutcome.Why.EXHAUSTED, NASTY)),
        new Event.Result(
            SolveOutcome.of(Status.UNKNOWN, OptionalLong.empty(), SolveOutcome.Why.WALL)),
        new Event.Failure(Event.Failure.Kind.FAMILY, NASTY),
        new Event.Built(
            new Event.Built.Facts(
                3,
                DIGEST,
                DIGEST,
                DIGEST,
                10,
                20,
                false,
                new TreeMap<>(Map.of(NASTY, new Event.Built.Group(DIGEST, 4))))),
        new Event.Lowered(
            new TreeMap<>(Map.of("clauses", 12L)),
            "clauses",
            new TreeMap<>(Map.of("one lot per firing", 7L)),
            new TreeMap<>(Map.of("linear", "native"))),
        new Event.Family(
            "workshop",
            NASTY,
            "/a b/c.jar",
            "steelyard.x",
            List.of(new Event.Amendment("a", "implied", "", List.of("b"), List.of()))),
        new Event.Program("/a b/solver", NASTY),
        new Event.Backend(
            new Description(
                "sat",
                "2.3.6",
                false,
                true,
                Set.of(Goal.Satisfy.class, Goal.Optimise.class, Goal.Enumerate.class),
                List.of("conflicts"),
                List.of(
                    Setting.flag("presolve", true, "whether"),
                    Setting.real("share", 0.5, 0, 1, "how much"),
                    Setting.choice("factory", List.of("one", "two"), "which")),
                0.85)),
        new Event.Missing("choco", NASTY),
        new Event.Stated("group " + NASTY, NASTY),
        new Event.Calibrated(123));
  }

  @ParameterizedTest
  @MethodSource("events")
  void an_event_comes_out_as_it_went_in(Event event) throws IOException {
    Path file = folder.resolve(Wire.EVENTS);
    try (EventWriter writer = new EventWriter(file)) {
      writer.write(event);
    }
    assertThat(new EventTail(file).next())
        .singleElement()
        .satisfies(it -> assertThat(it.event()).isEqualTo(event));
    assertThat(Files.readAllLines(file)).hasSize(1);
  }

  @Test
  void an_order_comes_out_as_it_went_in() throws IOException {
    RunOrder order =
        new RunOrder(
            new Subject.OfVariant("workshop", NASTY, Path.of("/tmp/a b"), List.of("x", "y")),
            "sat",
            new TreeMap<>(Map.of("factory", "two")),
            Long.MAX_VALUE,
            2,
            Optional.of(RunOrder.GoalKind.ENUMERATE),
            100,
            0.25,
            Optional.of(new Work("conflicts", 1000)));
    Path file = folder.resolve(Wire.ORDER);
    Wire.write(order, file);
    assertThat(Wire.readOrder(file)).isEqualTo(order);
    assertThat(folder).isDirectoryNotContaining("glob:**.part");
  }

  @Test
  void subjects_and_verdicts_come_out_as_they_went_in() throws IOException {
    List<Subject> subjects = List.of(new Subject.OfVariant("f", "i", Path.of("p"), List.of()));
    Wire.writeSubjects(subjects, folder.resolve("subjects.json"));
    assertThat(Wire.readSubjects(folder.resolve("subjects.json"))).isEqualTo(subjects);
    Verdict verdict =
        new Verdict(2, List.of(NASTY), "shown\n", new TreeMap<>(Map.of("start[1]", -4)));
    Wire.write(verdict, folder.resolve(Wire.VERDICT));
    assertThat(Wire.readVerdict(folder.resolve(Wire.VERDICT))).isEqualTo(verdict);
  }

  @Test
  void says_what_is_wrong_with_an_order() throws IOException {
    Path file = folder.resolve(Wire.ORDER);
    Files.writeString(file, "{\"subject\": {\"kind\": \"riddle\"}}");
    assertThatThrownBy(() -> Wire.readOrder(file))
        .isInstanceOf(IOException.class)
        .hasMessageContaining("unknown kind of subject 'riddle'");
    Files.writeString(file, "{\"subject\": ");
    assertThatThrownBy(() -> Wire.readOrder(file))
        .isInstanceOf(IOException.class)
        .hasMessageContaining("is not a run's order");
  }

  @Test
  void a_torn_last_line_waits_and_a_forged_line_is_dropped() throws IOException {
    Path file = folder.resolve(Wire.EVENTS);
    EventTail tail = new EventTail(file);
    assertThat(tail.next()).isEmpty();
    String first = EventCodec.write(new StampedEvent(0, 5, new Event.Bound(1)));
    String second = EventCodec.write(new StampedEvent(1, 6, new Event.Bound(2)));
    append(file, first + second.substring(0, 9));
    assertThat(tail.next()).extracting(StampedEvent::event).containsExactly(new Event.Bound(1));
    append(file, second.substring(9) + "no event\n" + first);
    assertThat(tail.next()).extracting(StampedEvent::event).containsExactly(new Event.Bound(2));
    assertThat(tail.forged()).isEqualTo(2);
  }

  private static void append(Path file, String text) throws IOException {
    Files.write(
        file,
        text.getBytes(StandardCharsets.UTF_8),
        StandardOpenOption.CREATE,
        StandardOpenOption.APPEND);
  }

  @Test
  void keeps_the_last_solution_and_counts_the_others_beyond_the_size() throws IOException {
    Path file = folder.resolve(Wire.EVENTS);
    try (EventWriter writer = new EventWriter(file, 100)) {
      for (int i = 0; i < 50; i++) {
        writer.write(new Event.Solution(OptionalLong.of(i), Ints.of(i)));
      }
    }
    List<Event> events = new EventTail(file).next().stream().map(StampedEvent::event).toList();
    assertThat(events.get(events.size() - 1))
        .isEqualTo(new Event.Solution(OptionalLong.of(49), Ints.of(49)));
    long kept = events.stream().filter(Event.Solution.class::isInstance).count();
    assertThat(events).contains(new Event.Thinned(50 - kept));
    assertThat(kept).isLessThan(10);
  }
}
