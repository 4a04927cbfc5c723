package steelyard.adapters.program;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Probe;
import steelyard.adapters.spi.Programs;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Work;

/**
 * Tries a program out before it is relied upon: whether it is there, its version, and whether it
 * answers two tiny formulas rightly.
 */
final class Trial {
  private static final long SECONDS = 10;
  private static final long MOST_VERSION_BYTES = 1 << 16;
  private static final int LONGEST_VERSION = 60;

  private final Template command;
  private final Template version;
  private final Programs programs;
  private final Deadline deadline = new Wall(System.nanoTime() + TimeUnit.SECONDS.toNanos(SECONDS));

  Trial(Template command, Template version, Programs programs) {
    this.command = command;
    this.version = version;
    this.programs = programs;
  }

  Probe probe(Settings settings) {
    Optional<Path> program = programs.find(command.program());
    if (program.isEmpty()) {
      return new Refusal(ProgramBackend.missing(command.program()));
    }
    try {
      Calls calls = new Calls(command, new SolveRequest(settings, 0, 1, deadline, programs));
      Answer toUnit = ask(calls, 1);
      Answer toContradiction = ask(calls, 1, -1);
      return toUnit instanceof Answer.Model && toContradiction instanceof Answer.NoModel
          ? new Probe.Usable(program.get(), version(program.get()))
          : new Refusal(wrong(toUnit instanceof Answer.Model ? toContradiction : toUnit));
    } catch (IOException e) {
      return new Refusal("program '" + command.program() + "' cannot be tried: " + e.getMessage());
    }
  }

  /** A formula of unit clauses over one variable. */
  private Answer ask(Calls calls, int... units) throws IOException {
    try (CnfFile formula = CnfFile.create(programs.folder().resolve("trial.cnf"), 1)) {
      for (int literal : units) {
        formula.clause(new int[] {literal}, 1);
      }
      return calls.ask(formula);
    }
  }

  private String wrong(Answer answer) {
    String what =
        answer instanceof Answer.Nothing nothing
            ? nothing.reason()
            : answer instanceof Answer.Stopped
                ? command.program() + ": no answer within " + SECONDS + " s"
                : command.program() + ": a wrong answer";
    return "the program does not answer a trial formula as the SAT competitions ask: " + what;
  }

  /** The first line that it prints; a program that does not tell is told by its file alone. */
  private String version(Path program) throws IOException {
    Path output = programs.folder().resolve("version.out");
    List<String> line = version.with(Map.of(Template.PROGRAM, program.toString()));
    Programs.Call call =
        new Programs.Call(
            line, output, programs.folder().resolve("version.err"), MOST_VERSION_BYTES);
    Programs.Ended ended = programs.run(call, deadline);
    String said = Files.readString(output, StandardCharsets.ISO_8859_1);
    return Stream.concat(said.lines(), ended.lastWords().lines())
        .map(text -> text.replaceAll("[^\\x20-\\x7e]", "").strip())
        .filter(text -> !text.isEmpty())
        .findFirst()
        .map(text -> text.substring(0, Math.min(LONGEST_VERSION, text.length())))
        .orElse("unknown");
  }

  /** A wall limit and nothing else. */
  private record Wall(long endNanos) implements Deadline {
    @Override
    public long nanosLeft() {
      return endNanos - System.nanoTime();
    }

    @Override
    public Optional<Work> work() {
      return Optional.empty();
    }

    @Override
    public boolean stopAsked() {
      return nanosLeft() <= 0;
    }

    @Override
    public void onStop(Runnable wake) {
      // nothing here blocks but the program, which looks at the time itself
    }
  }
}
