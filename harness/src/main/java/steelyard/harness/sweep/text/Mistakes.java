package steelyard.harness.sweep.text;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Collects the mistakes of a reading, so that one attempt reports them all.
 *
 * <p>They are reported in the order of the files and, within a file, of the lines.
 */
public final class Mistakes {

  /** How many mistakes are shown; the rest is counted. */
  public static final int SHOWN = 20;

  private record Mistake(int file, Place place, List<String> lines) {}

  private static final Comparator<Mistake> READING_ORDER =
      Comparator.comparingInt(Mistake::file)
          .thenComparingInt(m -> m.place().line())
          .thenComparingInt(m -> m.place().column());

  private final List<String> files = new ArrayList<>();
  private final List<Mistake> mistakes = new ArrayList<>();

  /**
   * Adds a mistake.
   *
   * @param place where it is
   * @param path the value's path in its file, such as {@code backends[2].name}; may be empty
   * @param what what is wrong
   * @param advice what is allowed or what to do, a line each
   */
  public void add(Place place, String path, String what, String... advice) {
    List<String> lines = new ArrayList<>();
    lines.add(place + ": " + (path.isEmpty() ? "" : path + ": ") + what);
    for (String line : advice) {
      lines.add("  " + line);
    }
    if (!files.contains(place.file())) {
      files.add(place.file());
    }
    mistakes.add(new Mistake(files.indexOf(place.file()), place, lines));
  }

  /** How many there are so far. */
  public int count() {
    return mistakes.size();
  }

  /**
   * Ends a reading that cannot go on, or that is complete.
   *
   * @throws SweepProblem if there is any mistake
   */
  public void throwIfAny() {
    if (!mistakes.isEmpty()) {
      throw problem();
    }
  }

  /** The mistakes as one problem; there must be one. */
  public SweepProblem problem() {
    List<String> lines = new ArrayList<>();
    mistakes.stream().sorted(READING_ORDER).limit(SHOWN).forEach(m -> lines.addAll(m.lines()));
    if (mistakes.size() > SHOWN) {
      lines.add("and " + (mistakes.size() - SHOWN) + " more mistakes");
    }
    return new SweepProblem(lines);
  }

  /** The problem that this single mistake is. */
  public static SweepProblem only(Place place, String what, String... advice) {
    Mistakes mistakes = new Mistakes();
    mistakes.add(place, "", what, advice);
    return mistakes.problem();
  }
}
