package steelyard.harness.process;

import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.regex.Pattern;

/**
 * What to start and where. No shell is involved: each word of the command reaches the child as it
 * is.
 *
 * @param run names the run to a reader, in the table of live runs
 * @param tag unique to this start; letters, digits and hyphens, as in a UUID
 * @param command the program, by absolute path or by a name in the search path, and its arguments
 * @param folder the working folder; it exists
 * @param environment added to the environment of this process, or in place of what it holds there
 * @param withheld variables of this process that the child does not get
 * @param stdout where standard output goes
 * @param stderr where standard error goes
 * @param cores numbers of the logical processors to run on; empty: wherever the kernel likes
 */
public record Launch(
    String run,
    String tag,
    List<String> command,
    Path folder,
    SortedMap<String, String> environment,
    Set<String> withheld,
    Path stdout,
    Path stderr,
    List<Integer> cores) {

  /** Stands between the tag of a run and that of a program which the run starts in turn. */
  static final String TAG_SEPARATOR = "/";

  private static final Pattern TAG = Pattern.compile("[0-9A-Za-z-]{1,64}");

  public Launch {
    if (run.isBlank() || run.chars().anyMatch(Character::isISOControl)) {
      throw new IllegalArgumentException(
          "a run's name is one line that is not blank: '" + run + "'");
    }
    if (!TAG.matcher(tag).matches()) {
      throw new IllegalArgumentException("tag '" + tag + "' does not match " + TAG);
    }
    if (command.isEmpty()) {
      throw new IllegalArgumentException("the command of run " + run + " is empty");
    }
    command = List.copyOf(command);
    folder = folder.toAbsolutePath();
    environment = Collections.unmodifiableSortedMap(new TreeMap<>(environment));
    withheld = Collections.unmodifiableSortedSet(new TreeSet<>(withheld));
    stdout = stdout.toAbsolutePath();
    stderr = stderr.toAbsolutePath();
    cores = List.copyOf(cores);
  }

  /** In the given folder, with {@code stdout} and {@code stderr} there, not pinned. */
  public static Launch of(String run, String tag, List<String> command, Path folder) {
    return new Launch(
        run,
        tag,
        command,
        folder,
        Collections.emptySortedMap(),
        Set.of(),
        folder.resolve("stdout"),
        folder.resolve("stderr"),
        List.of());
  }

  /** The same on these logical processors. */
  public Launch on(List<Integer> processors) {
    return new Launch(run, tag, command, folder, environment, withheld, stdout, stderr, processors);
  }

  /** The same with its output in these files. */
  public Launch writing(Path output, Path errors) {
    return new Launch(run, tag, command, folder, environment, withheld, output, errors, cores);
  }

  /** The same with one more variable in the environment. */
  public Launch with(String variable, String value) {
    SortedMap<String, String> more = new TreeMap<>(environment);
    more.put(variable, value);
    return new Launch(run, tag, command, folder, more, withheld, stdout, stderr, cores);
  }

  /** The same with these variables of this process kept from the child. */
  public Launch withhold(Set<String> variables) {
    return new Launch(run, tag, command, folder, environment, variables, stdout, stderr, cores);
  }
}
