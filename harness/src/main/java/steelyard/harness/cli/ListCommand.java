package steelyard.harness.cli;

import java.io.PrintWriter;
import java.nio.file.Files;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import steelyard.adapters.spi.Setting;
import steelyard.harness.sweep.Catalogue;
import steelyard.harness.sweep.SingleChoice;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.SweepSummary;

/** Lists what there is. */
@Command(
    name = "list",
    description = "Lists families with their amendments, backends with their options, or sweeps.",
    mixinStandardHelpOptions = true,
    footerHeading = "%nExamples:%n",
    footer = {
      "  steelyard list families",
      "  steelyard list instances workshop",
      "  steelyard list backends",
      "  steelyard list sweeps"
    })
final class ListCommand implements Callable<Integer> {
  enum What {
    families,
    instances,
    backends,
    sweeps
  }

  @Mixin private Shared shared;
  @Spec private CommandSpec spec;

  @Parameters(
      index = "0",
      arity = "0..1",
      defaultValue = "families",
      paramLabel = "WHAT",
      description = "One of: ${COMPLETION-CANDIDATES}. Default: ${DEFAULT-VALUE}")
  private What what;

  @Parameters(
      index = "1",
      arity = "0..1",
      paramLabel = "FAMILY",
      description = "Whose instances to list.")
  private String family;

  @Override
  public Integer call() {
    PrintWriter out = spec.commandLine().getOut();
    if (what == What.sweeps) {
      sweeps(out);
      return ExitStatus.OK;
    }
    try (Desk desk = Desk.open(shared.jars())) {
      Catalogue catalogue = desk.catalogue();
      switch (what) {
        case backends -> backends(catalogue, out);
        case instances -> instances(catalogue, out);
        default -> catalogue.families().forEach(f -> family(f, out));
      }
    }
    return ExitStatus.OK;
  }

  private static void family(Catalogue.Family family, PrintWriter out) {
    out.println(family.label());
    Columns.wrapped(out, "  ", family.summary());
    for (Catalogue.Amendment amendment : family.amendments()) {
      out.println("  + " + amendment.name() + " (" + amendment.role() + ")");
      Columns.wrapped(out, "      ", amendment.summary());
      if (!amendment.requires().isEmpty()) {
        out.println("      requires " + String.join(", ", amendment.requires()));
      }
      if (!amendment.excludes().isEmpty()) {
        out.println("      excludes " + String.join(", ", amendment.excludes()));
      }
    }
  }

  private static void backends(Catalogue catalogue, PrintWriter out) {
    for (Catalogue.Backend backend : catalogue.backends()) {
      out.println(backend.name() + " " + backend.version());
      out.println("  work limits in: " + String.join(", ", backend.workUnits()));
      out.println(
          "  a model's branching " + (backend.followsBranching() ? "is followed" : "is ignored"));
      for (Setting setting : backend.settings()) {
        String values =
            switch (setting.kind()) {
              case SWITCH -> "true, false";
              case CHOICE -> String.join(", ", setting.choices());
              case INTEGER -> Columns.range(setting, true);
              case REAL -> Columns.range(setting, false);
              case COMMAND -> "a program and its arguments";
            };
        out.println("  " + setting.name() + " = " + setting.defaultText() + "  (" + values + ")");
        Columns.wrapped(out, "      ", setting.help());
      }
    }
    catalogue
        .missing()
        .forEach(m -> Columns.wrapped(out, "", m.name() + " cannot run here: " + m.reason()));
  }

  private void instances(Catalogue catalogue, PrintWriter out) {
    for (Catalogue.Family each : catalogue.families()) {
      if (family == null || each.name().equals(family)) {
        SingleChoice.listed(each).forEach(line -> out.println(each.label() + "  " + line));
      }
    }
    if (family != null) {
      SingleChoice.family(catalogue, family);
    }
  }

  private void sweeps(PrintWriter out) {
    if (!Files.exists(shared.file())) {
      out.println("no sweeps yet in " + shared.folder());
      return;
    }
    try (Ledger ledger = Ledger.read(shared.file())) {
      for (SweepSummary sweep : ledger.plans().sweeps()) {
        out.println(
            sweep.name()
                + "  "
                + sweep.runs()
                + " of "
                + sweep.cells()
                + " runs  "
                + sweep.planned().map(at -> at.toString().substring(0, 16)).orElse("")
                + "  "
                + sweep.id());
      }
    }
  }
}
