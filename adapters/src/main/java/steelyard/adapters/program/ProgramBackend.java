package steelyard.adapters.program;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import steelyard.adapters.sat.encoding.EncodingSettings;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Description;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Probe;
import steelyard.adapters.spi.Programs;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Work;
import steelyard.variants.model.Model;

/**
 * A solver program that a setting names, run as a child process. The format {@code dimacs} is for
 * SAT solvers that read DIMACS CNF and answer as the SAT competitions ask; an objective is improved
 * by calling the solver again.
 */
public final class ProgramBackend implements Backend {
  static final String NAME = "program";
  static final String FORMAT = "format";
  static final String COMMAND = "command";
  static final String VERSION_COMMAND = "version-command";

  private static final List<String> PLACEHOLDERS =
      List.of(Template.CNF, Template.SEED, Template.SECONDS, Template.THREADS);

  @Override
  public Description describe() {
    return new Description(
        NAME,
        "any",
        false,
        false,
        Set.of(Goal.Satisfy.class, Goal.Optimise.class, Goal.Enumerate.class),
        List.of(Calls.COUNTER),
        settings(),
        0.4);
  }

  private static List<Setting> settings() {
    List<Setting> settings = new ArrayList<>();
    settings.add(
        Setting.choice(FORMAT, List.of("dimacs"), "what the program reads and answers in"));
    settings.add(
        Setting.command(
            COMMAND,
            "cadical --seed={seed} {cnf}",
            "the program and its arguments; {cnf}, {seed}, {seconds} (left until the limit) and"
                + " {threads} are filled in; no shell"));
    settings.add(
        Setting.command(
            VERSION_COMMAND, "{program} --version", "what prints the program's version"));
    settings.addAll(EncodingSettings.declared());
    return settings;
  }

  @Override
  public Probe probe(Settings settings, Programs programs) {
    Template command = Template.of(settings.text(COMMAND));
    Template version = Template.of(settings.text(VERSION_COMMAND));
    Optional<String> mistake = mistake(command).or(() -> mistakeInVersion(version));
    return mistake.isPresent()
        ? new Refusal(mistake.get())
        : new Trial(command, version, programs).probe(settings);
  }

  @Override
  public Lowered lower(Model model, SolveRequest request, Monitor monitor) {
    Template command = Template.of(request.settings().text(COMMAND));
    Optional<String> mistake = mistake(command).or(() -> mistake(request, command));
    return mistake.isPresent()
        ? new Refusal(mistake.get())
        : ProgramLowering.of(model, request, command, monitor);
  }

  private static Optional<String> mistake(Template command) {
    Optional<String> unknown = command.unknown(PLACEHOLDERS);
    if (unknown.isPresent()) {
      return Optional.of(
          "command has the placeholder {" + unknown.get() + "}; known are " + braced(PLACEHOLDERS));
    }
    return command.has(Template.CNF)
        ? Optional.empty()
        : Optional.of("command does not say where the formula's file goes: it lacks {cnf}");
  }

  private static Optional<String> mistakeInVersion(Template version) {
    return version
        .unknown(List.of(Template.PROGRAM))
        .map(name -> "version-command has the placeholder {" + name + "}; known is {program}");
  }

  private static String braced(List<String> names) {
    return String.join(", ", names.stream().map(name -> "{" + name + "}").toList());
  }

  private static Optional<String> mistake(SolveRequest request, Template command) {
    Optional<Work> work = request.deadline().work();
    if (work.isPresent() && !work.get().unit().equals(Calls.COUNTER)) {
      return Optional.of("program counts work in calls, not in " + work.get().unit());
    }
    if (request.threads() != 1 && !command.has(Template.THREADS)) {
      return Optional.of(
          "command does not say how many threads: it lacks {threads}, and the run has "
              + request.threads());
    }
    return request.programs().find(command.program()).isPresent()
        ? Optional.empty()
        : Optional.of(missing(command.program()));
  }

  /** The Debian packages of solvers that this was tested with, by program. */
  private static final Map<String, String> PACKAGES =
      Map.of("cadical", "cadical", "picosat", "picosat");

  /** What to do about a program that is not there. */
  static String missing(String program) {
    if (program.indexOf('/') >= 0) {
      return "program '" + program + "' is not there or not executable";
    }
    String cure =
        PACKAGES.containsKey(program)
            ? "install it, on Debian with: sudo apt-get install " + PACKAGES.get(program)
            : "install it, or give its path in command";
    return "program '" + program + "' is not on the search path; " + cure;
  }
}
