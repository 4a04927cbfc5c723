package steelyard.adapters.spi;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * Starts the solver programs of a run, one at a time; given by the worker, because nothing else
 * starts processes. A program starts in {@link #folder} and reads nothing on standard input.
 */
public interface Programs {
  /** For a run in which no program may be started. */
  Programs NONE =
      new Programs() {
        @Override
        public Path folder() {
          throw new IllegalStateException("this run has no folder for programs");
        }

        @Override
        public Optional<Path> find(String program) {
          return Optional.empty();
        }

        @Override
        public Ended run(Call call, Deadline deadline) {
          throw new IllegalStateException("this run starts no programs");
        }
      };

  /** The run's own folder, where its files go. */
  Path folder();

  /** The executable file of that path, or of that name in the search path. */
  Optional<Path> find(String program);

  /**
   * Runs a program until it ends, or ends it, and all that came of it, once the deadline says stop
   * or it has written too much.
   *
   * @throws IOException if it cannot be started; one clear sentence
   */
  Ended run(Call call, Deadline deadline) throws IOException;

  /**
   * A program to run. No shell is involved.
   *
   * @param command the program, by path or name, and its arguments
   * @param output the file that gets its standard output, emptied first
   * @param errors the file that gets its standard error, emptied first
   * @param mostOutputBytes the program is ended when it has written more to {@code output}
   */
  record Call(List<String> command, Path output, Path errors, long mostOutputBytes) {
    public Call {
      command = List.copyOf(command);
      if (command.isEmpty()) {
        throw new IllegalArgumentException("a command has at least the program's name");
      }
      Objects.requireNonNull(output, "output");
      Objects.requireNonNull(errors, "errors");
    }
  }

  /**
   * How a program ended.
   *
   * @param code exit code, or 128 and the number of the signal that ended it
   * @param lastWords the end of standard error, printable
   */
  record Ended(How how, int code, String lastWords) {
    /** Who ended it. */
    public enum How {
      /** It ended of its own accord, or somebody else killed it. */
      ITSELF,
      /** The deadline said stop. */
      STOPPED,
      /** It wrote more than allowed. */
      WROTE_TOO_MUCH
    }

    public Ended {
      Objects.requireNonNull(how, "how");
      Objects.requireNonNull(lastWords, "lastWords");
    }
  }
}
