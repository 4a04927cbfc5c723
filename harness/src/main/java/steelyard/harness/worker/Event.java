package steelyard.harness.worker;

import java.util.Collections;
import java.util.List;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.variants.model.Digest;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;

/** Something that a worker says, in a line of its {@code events.jsonl}. */
public sealed interface Event {

  /**
   * One of {@link Phases} begins.
   *
   * @param cpuNanos processor time of the process so far, in steps of the kernel's clock; empty
   *     where it cannot be read
   */
  record Phase(String name, OptionalLong cpuNanos) implements Event {}

  /** Within a phase, a step of the backend's own begins, such as {@code presolve}. */
  record Step(String name) implements Event {}

  /** What was built. */
  record Built(Built.Facts facts) implements Event {
    /**
     * The model's digests and size.
     *
     * @param subject which subject of a digest order; 0 in a run
     * @param groups digest and number of postings by group
     */
    public record Facts(
        int subject,
        Digest asBuilt,
        Digest search,
        Digest canonical,
        int variables,
        int postings,
        boolean minimize,
        SortedMap<String, Group> groups) {
      public Facts {
        groups = Collections.unmodifiableSortedMap(new TreeMap<>(groups));
      }
    }

    /** One group of the model. */
    public record Group(Digest digest, int postings) {}
  }

  /**
   * One statement of a model.
   *
   * @param group the group that it belongs to
   * @param text for people
   */
  record Stated(String group, String text) implements Event {}

  /**
   * How large the lowering is.
   *
   * @param byGroup amounts of {@code unit} by group
   * @param how by kind of relation
   */
  record Lowered(
      SortedMap<String, Long> totals,
      String unit,
      SortedMap<String, Long> byGroup,
      SortedMap<String, String> how)
      implements Event {
    public Lowered {
      totals = Collections.unmodifiableSortedMap(new TreeMap<>(totals));
      byGroup = Collections.unmodifiableSortedMap(new TreeMap<>(byGroup));
      how = Collections.unmodifiableSortedMap(new TreeMap<>(how));
    }
  }

  /** A solution: the values of the decision variables, and the objective recomputed from them. */
  record Solution(OptionalLong objective, Ints decisions) implements Event {}

  /** Solutions that were not written, because the file has reached its size. */
  record Thinned(long solutions) implements Event {}

  /** A proved bound. */
  record Bound(long value) implements Event {}

  /** A counter's final value. */
  record Count(String name, long value) implements Event {}

  /** A measure by posting. */
  record Blame(String measure, Longs byPosting) implements Event {}

  /** How the solve ended. */
  record Result(SolveOutcome outcome) implements Event {}

  /** The run came to nothing, for a reason that a person can act on. */
  record Failure(Failure.Kind kind, String message) implements Event {
    /** Whose fault it is. */
    public enum Kind {
      /** An instance, a name or a setting is not what it must be. */
      BAD_INPUT,
      /** The family's own code threw. */
      FAMILY,
      /** The backend cannot take this model, or its library cannot be used. */
      UNSUPPORTED,
      /** The adapter or its library threw. */
      BACKEND
    }
  }

  /**
   * A family that is there.
   *
   * @param place where its class was loaded from, a jar or a folder
   * @param inside the package of its class
   */
  record Family(
      String name, String summary, String place, String inside, List<Amendment> amendments)
      implements Event {
    public Family {
      amendments = List.copyOf(amendments);
    }
  }

  /** An amendment of a family. */
  record Amendment(
      String name, String role, String summary, List<String> requires, List<String> excludes) {
    public Amendment {
      requires = requires.stream().sorted().toList();
      excludes = excludes.stream().sorted().toList();
    }
  }

  /** A backend that is there. */
  record Backend(steelyard.adapters.spi.Description description) implements Event {}

  /**
   * A program that a backend would start, tried out.
   *
   * @param file its executable file
   * @param version what it says of itself
   */
  record Program(String file, String version) implements Event {}

  /** A backend that is known and cannot run here. */
  record Missing(String name, String reason) implements Event {}

  /** Nanoseconds of the calibration task. */
  record Calibrated(long nanos) implements Event {}
}
