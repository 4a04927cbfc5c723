package steelyard.harness.local;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.harness.launch.WorkerEnd;
import steelyard.harness.process.ProcessLimits;
import steelyard.harness.worker.Event;
import steelyard.harness.worker.Phases;
import steelyard.harness.worker.StampedEvent;
import steelyard.results.ledger.Decisions;
import steelyard.results.ledger.Sizes;
import steelyard.results.ledger.Times;
import steelyard.results.ledger.Times.Phase;
import steelyard.results.ledger.Trace;

/** What a worker's events say of phases, solutions, bounds, counters and sizes. Pure. */
final class RunReading {
  private final WorkerEnd end;
  private final Map<Phase, Long> begins = new EnumMap<>(Phase.class);
  private final long endNanos;

  RunReading(WorkerEnd end) {
    this.end = end;
    begins.put(Phase.START, end.startNanos());
    long last = end.startNanos() + end.exit().wallNanos();
    for (StampedEvent stamped : end.events()) {
      if (stamped.event() instanceof Event.Phase phase) {
        if (phase.name().equals(Phases.DONE)) {
          last = Math.min(last, stamped.nanos());
        } else {
          Phase known = Phase.valueOf(phase.name().toUpperCase(Locale.ROOT));
          begins.putIfAbsent(known, stamped.nanos());
        }
      }
    }
    this.endNanos = last;
  }

  /** When the limit's clock started; empty if it did not come to that. */
  OptionalLong clockStart() {
    Long start = begins.get(Phase.LOWER);
    return start == null ? OptionalLong.empty() : OptionalLong.of(start);
  }

  /** Whether an event came before the limit; before the clock starts everything does. */
  boolean inTime(StampedEvent stamped, long limitNanos) {
    OptionalLong start = clockStart();
    return start.isEmpty() || stamped.nanos() - start.getAsLong() <= limitNanos;
  }

  /** The first event of a kind, with its time. */
  Optional<StampedEvent> first(Class<? extends Event> kind) {
    return end.events().stream().filter(s -> kind.isInstance(s.event())).findFirst();
  }

  /** Solutions that came in time, in order. */
  List<StampedEvent> solutions(long limitNanos) {
    return end.events().stream()
        .filter(s -> s.event() instanceof Event.Solution && inTime(s, limitNanos))
        .toList();
  }

  Times times() {
    SortedMap<Phase, Times.Span> spans = new TreeMap<>();
    SortedMap<Phase, Long> cpu = cpu();
    List<Map.Entry<Phase, Long>> ordered = new ArrayList<>(begins.entrySet());
    for (int i = 0; i < ordered.size(); i++) {
      Phase phase = ordered.get(i).getKey();
      long until = i + 1 < ordered.size() ? ordered.get(i + 1).getValue() : endNanos;
      long wall = Math.max(0, until - ordered.get(i).getValue());
      Long used = cpu.get(phase);
      spans.put(
          phase, new Times.Span(wall, used == null ? OptionalLong.empty() : OptionalLong.of(used)));
    }
    return new Times(spans, end.exit().overshootNanos());
  }

  /** Processor time by phase, from what the process said at each mark. */
  private SortedMap<Phase, Long> cpu() {
    SortedMap<Phase, Long> byPhase = new TreeMap<>();
    Phase running = Phase.START;
    long before = 0;
    for (Event.Phase mark : end.all(Event.Phase.class).toList()) {
      if (mark.cpuNanos().isEmpty()) {
        return new TreeMap<>();
      }
      long now = mark.cpuNanos().getAsLong();
      byPhase.merge(running, Math.max(0, now - before), Long::sum);
      before = now;
      if (!mark.name().equals(Phases.DONE)) {
        running = Phase.valueOf(mark.name().toUpperCase(Locale.ROOT));
      }
    }
    return byPhase;
  }

  Trace trace(long limitNanos) {
    if (clockStart().isEmpty()) {
      return Trace.empty();
    }
    long start = clockStart().getAsLong();
    List<Trace.Solution> solutions = new ArrayList<>();
    List<Trace.Bound> bounds = new ArrayList<>();
    long thinned = 0;
    for (StampedEvent stamped : end.events()) {
      long nanos = stamped.nanos() - start;
      if (stamped.event() instanceof Event.Thinned some) {
        thinned += some.solutions();
      } else if (stamped.event() instanceof Event.Solution it && nanos <= limitNanos) {
        Decisions decisions = Decisions.of(it.decisions().toArray());
        solutions.add(new Trace.Solution(nanos, it.objective(), decisions));
      } else if (stamped.event() instanceof Event.Bound bound && nanos <= limitNanos) {
        bounds.add(new Trace.Bound(nanos, bound.value()));
      }
    }
    return new Trace(solutions.size() + thinned, solutions, bounds.size(), bounds);
  }

  SortedMap<String, Long> counters() {
    SortedMap<String, Long> counters = new TreeMap<>();
    end.all(Event.Count.class).forEach(count -> counters.put(count.name(), count.value()));
    return counters;
  }

  Optional<Sizes> sizes() {
    return end.last(Event.Lowered.class).map(RunReading::sizes);
  }

  private static Sizes sizes(Event.Lowered lowered) {
    SortedMap<String, SortedMap<String, Long>> groups = new TreeMap<>();
    lowered
        .byGroup()
        .forEach(
            (group, amount) -> {
              SortedMap<String, Long> sizes = new TreeMap<>();
              sizes.put(lowered.unit(), amount);
              groups.put(group, sizes);
            });
    return new Sizes(lowered.totals(), groups);
  }

  /** The phase in which the process ended, as the harness followed it. */
  String lastPhase() {
    String phase = end.exit().phase();
    return phase.equals(ProcessLimits.START) ? "start" : phase;
  }
}
