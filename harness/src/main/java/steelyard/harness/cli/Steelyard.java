package steelyard.harness.cli;

import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.InvalidPathException;
import java.util.List;
import picocli.AutoComplete;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import steelyard.harness.launch.HarnessProblem;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.results.ledger.LedgerProblem;

/** The command {@code steelyard}. */
@Command(
    name = "steelyard",
    description = "Weighs changes to a constraint model before they go into service.",
    mixinStandardHelpOptions = true,
    versionProvider = Versions.class,
    subcommands = {
      SweepCommand.class,
      BriefCommand.class,
      SolveCommand.class,
      ListCommand.class,
      LowerCommand.class,
      CompareCommand.class,
      ShowCommand.class,
      RerunCommand.class,
      AutoComplete.GenerateCompletion.class,
      CommandLine.HelpCommand.class
    },
    exitCodeListHeading = "%nExit status:%n",
    exitCodeList = {
      "0:done",
      "1:a mistake of this program",
      "2:a mistake in what was given",
      "4:a repeated run differs",
      "5:an invalid solution or a contradiction",
      "129, 130, 143:stopped by a signal; the same command goes on where it stood"
    },
    footerHeading = "%nExamples:%n",
    footer = {
      "  steelyard sweep nightly.yaml",
      "  steelyard brief",
      "  steelyard solve workshop ft06 --backend cpsat --wall 10s",
      "  source <(steelyard generate-completion)"
    })
public final class Steelyard implements Runnable {
  @Spec private CommandSpec spec;

  @Override
  public void run() {
    throw new ParameterException(spec.commandLine(), "a command is missing");
  }

  /** Runs one command and exits with its status. */
  public static void main(String[] args) {
    System.exit(execute(args));
  }

  static int execute(String... args) {
    PrintWriter out = new PrintWriter(System.out, true, StandardCharsets.UTF_8);
    PrintWriter err = new PrintWriter(System.err, true, StandardCharsets.UTF_8);
    return commandLine(out, err).execute(args);
  }

  static CommandLine commandLine(PrintWriter out, PrintWriter err) {
    return new CommandLine(new Steelyard())
        .setOut(out)
        .setErr(err)
        .setColorScheme(CommandLine.Help.defaultColorScheme(Ansi.AUTO))
        .setCaseInsensitiveEnumValuesAllowed(true)
        .setUsageHelpAutoWidth(false)
        .setExitCodeExceptionMapper(Steelyard::status)
        .setParameterExceptionHandler(
            (e, arguments) -> {
              e.getCommandLine().getErr().println(e.getMessage());
              CommandLine.UnmatchedArgumentException.printSuggestions(
                  e, e.getCommandLine().getErr());
              e.getCommandLine()
                  .getErr()
                  .println(
                      "See '" + e.getCommandLine().getCommandSpec().qualifiedName() + " --help'.");
              return ExitStatus.BAD_INPUT;
            })
        .setExecutionExceptionHandler(
            (e, command, result) -> {
              lines(e).forEach(command.getErr()::println);
              boolean debug = result.matchedOptionValue("--debug", false);
              if (debug) {
                e.printStackTrace(command.getErr());
              }
              return status(e);
            });
  }

  /** What to print of an exception. */
  private static List<String> lines(Throwable thrown) {
    if (thrown instanceof SweepProblem problem) {
      return problem.lines();
    }
    if (isExpected(thrown)) {
      return List.of(thrown.getMessage());
    }
    return List.of(
        "a mistake of this program: " + thrown,
        "  run it again with --debug and report what it shows");
  }

  private static boolean isExpected(Throwable thrown) {
    return thrown instanceof SweepProblem
        || thrown instanceof HarnessProblem
        || thrown instanceof LedgerProblem
        || thrown instanceof InvalidPathException;
  }

  /** The exit status for an exception. */
  static int status(Throwable thrown) {
    return isExpected(thrown) || thrown instanceof ParameterException
        ? ExitStatus.BAD_INPUT
        : ExitStatus.INTERNAL;
  }
}
