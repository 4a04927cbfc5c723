package steelyard.harness.cli;

import java.io.PrintWriter;
import java.time.Duration;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import steelyard.harness.launch.Stating;
import steelyard.harness.sweep.Catalogue;
import steelyard.harness.sweep.Instance;
import steelyard.harness.sweep.SingleChoice;
import steelyard.results.ledger.Recipe;

/** Shows what an amendment did to a model. */
@Command(
    name = "compare",
    description = {
      "Shows what tells two variants apart on an instance: constraints added and withdrawn, by"
          + " group, and what changed in variables, objective, branching and hint."
    },
    mixinStandardHelpOptions = true,
    sortOptions = false,
    footerHeading = "%nExamples:%n",
    footer = {
      "  steelyard compare plain plain+no-overlap ft06",
      "  steelyard compare plain@old plain@new monday.txt --family pallets \\",
      "      --family-jar old=yesterday.jar --family-jar new=today.jar"
    })
final class CompareCommand implements Callable<Integer> {
  private static final int LONGEST = 200;
  private static final Duration BUILD = Duration.ofMinutes(5);

  @Mixin private Shared shared;
  @Spec private CommandSpec spec;

  @Parameters(index = "0", paramLabel = "VARIANT", description = "The variant before.")
  private String before;

  @Parameters(index = "1", paramLabel = "VARIANT", description = "The variant after.")
  private String after;

  @Parameters(
      index = "2",
      paramLabel = "INSTANCE",
      description = "The name of an instance that the family ships, or a file.")
  private String instance;

  @Option(
      names = "--family",
      paramLabel = "FAMILY",
      description = "The family. Default: the one that ships the instance.")
  private String family;

  @Option(
      names = "--lines",
      paramLabel = "N",
      defaultValue = "3",
      description = "Constraints written out for each group and side. Default: ${DEFAULT-VALUE}")
  private int lines;

  @Override
  public Integer call() {
    PrintWriter out = spec.commandLine().getOut();
    try (Desk desk = Desk.open(shared.jars())) {
      Catalogue catalogue = desk.catalogue();
      String name = family == null ? SingleChoice.shipping(catalogue, instance) : family;
      Stating stating = new Stating(desk.crew(), BUILD);
      List<Differences.Group> groups =
          Differences.between(
              stating.of(recipe(catalogue, name, before)),
              stating.of(recipe(catalogue, name, after)));
      print(name, groups, out);
      return desk.signalStatus().orElse(ExitStatus.OK);
    }
  }

  private Recipe recipe(Catalogue catalogue, String name, String variant) {
    SingleChoice.Chosen chosen = SingleChoice.variant(catalogue, name, variant);
    Instance data = SingleChoice.instance(SingleChoice.family(catalogue, name), instance);
    return new Recipe(
        name,
        chosen.family().alias(),
        chosen.family().code(),
        data.forRecipe(),
        chosen.variant().amendments(),
        chosen.variant().name());
  }

  private void print(String name, List<Differences.Group> groups, PrintWriter out) {
    out.println(Columns.visible(name + " " + instance + ": " + before + " -> " + after));
    out.println();
    out.println("   before    after  group");
    for (Differences.Group group : groups) {
      out.println(
          Columns.visible(
              String.format(
                  Locale.ROOT,
                  "%9d%9d  %s: %s",
                  group.before(),
                  group.after(),
                  group.name(),
                  group.fate())));
      print('-', group.withdrawn(), out);
      print('+', group.added(), out);
    }
    if (groups.stream().allMatch(Differences.Group::isSame)) {
      out.println("\nThe two say the same on this instance.");
    }
  }

  private void print(char sign, List<String> statements, PrintWriter out) {
    for (String statement : statements.subList(0, Math.min(lines, statements.size()))) {
      Columns.wrapped(
          out, "                      ", sign + " " + shortened(Columns.visible(statement)));
    }
    if (statements.size() > lines) {
      out.println(
          "                      " + sign + " and " + (statements.size() - lines) + " more");
    }
  }

  private static String shortened(String statement) {
    return statement.length() <= LONGEST ? statement : statement.substring(0, LONGEST) + "…";
  }
}
