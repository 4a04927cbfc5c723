package steelyard.harness.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.OptionalInt;
import java.util.SortedMap;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import steelyard.harness.launch.Crew;
import steelyard.harness.launch.HarnessProblem;
import steelyard.harness.launch.Judges;
import steelyard.harness.launch.ModelFactsFinder;
import steelyard.harness.local.KeyedPlan;
import steelyard.harness.local.SweepRun;
import steelyard.harness.process.CoreLeases;
import steelyard.harness.process.MachineFacts;
import steelyard.harness.sweep.BriefChoices;
import steelyard.harness.sweep.Plan;
import steelyard.harness.sweep.Sweep;
import steelyard.harness.sweep.SweepFile;
import steelyard.harness.sweep.text.Phrases;
import steelyard.results.brief.Facts;
import steelyard.results.ledger.Holder;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.Session;

/** Runs a sweep. */
@Command(
    name = "sweep",
    description = {
      "Runs every candidate of a sweep file over its instances, checks the answers and writes the"
          + " brief. The same command goes on where a stopped sweep stood."
    },
    mixinStandardHelpOptions = true,
    footerHeading = "%nExamples:%n",
    footer = {
      "  steelyard sweep nightly.yaml",
      "  steelyard sweep nightly.yaml --ledger /data/ledger > brief.txt"
    })
final class SweepCommand implements Callable<Integer> {
  @Mixin private Shared shared;
  @Spec private CommandSpec spec;

  @Parameters(paramLabel = "FILE", description = "The sweep file, in YAML.")
  private Path file;

  @Option(names = "--quiet", description = "Say nothing while it runs.")
  private boolean quiet;

  @Override
  public Integer call() {
    PrintWriter out = spec.commandLine().getOut();
    PrintWriter err = spec.commandLine().getErr();
    try (Desk desk = Desk.open(SweepFile.familyJars(file).with(shared.jars()))) {
      Sweep sweep = SweepFile.read(file, desk.catalogue(), desk.builds());
      sweep.remarks().forEach(remark -> err.println(Columns.visible(remark)));
      Plan plan = Plan.of(sweep);
      Holder holder =
          new Holder(
              ProcessHandle.current().pid(), "sweep " + sweep.name(), desk.clock().instant());
      try (Ledger ledger = Ledger.write(ledgerFile(), holder)) {
        return run(desk, ledger, plan, out, err);
      }
    }
  }

  private Path ledgerFile() {
    try {
      Files.createDirectories(shared.folder());
    } catch (IOException e) {
      throw HarnessProblem.of("cannot make the ledger's folder " + shared.folder(), e);
    }
    return shared.file();
  }

  private int run(Desk desk, Ledger ledger, Plan plan, PrintWriter out, PrintWriter err) {
    MachineFacts machine = MachineFacts.here();
    Session session = desk.session(machine);
    ledger.sessions().add(session);
    CoreLeases leases = desk.leases(machine);
    int atATime = Math.min(leases.slots(), plan.sweep().cores());
    err.println(size(plan, atATime));
    Crew crew = desk.crew();
    ModelFactsFinder finder =
        new ModelFactsFinder(crew, ModelFactsFinder.in(ledger.models()), plan.sweep().build());
    steelyard.results.ledger.Sweep sweep;
    try (Telling telling = Telling.on(err, quiet)) {
      KeyedPlan keyed =
          KeyedPlan.of(plan, desk.catalogue(), finder, session, atATime, telling::models);
      keyed.failures().forEach((what, why) -> telling.line(what + ": " + why));
      sweep =
          new SweepRun(crew, ledger, session, leases, desk.clock(), telling)
              .carryOut(
                  keyed,
                  text(),
                  shared.folder(),
                  Judges.code(crew.installation()),
                  begun -> Briefs.keep(BriefChoices.of(plan.sweep()), begun.id(), shared.folder()));
    }
    Briefs briefs = new Briefs(ledger, shared.folder());
    SortedMap<String, Facts> facts = briefs.facts(sweep);
    briefs.report(sweep, facts, out);
    OptionalInt signal = desk.signalStatus();
    return signal.orElse(Briefs.isSound(facts) ? ExitStatus.OK : ExitStatus.FINDING);
  }

  private static String size(Plan plan, int atATime) {
    Plan.Summary size = plan.summary();
    String asked =
        atATime < plan.sweep().cores()
            ? "; " + plan.sweep().cores() + " cores asked for, physical cores to be had: " + atATime
            : "";
    return String.format(
        Locale.ROOT,
        "%s, %s, %s; %s at worst%s",
        Phrases.count(size.candidates(), "candidate"),
        Phrases.count(size.instances(), "instance"),
        Phrases.count(size.runs(), "run"),
        Columns.duration(size.coreHoursAtWorst() * 3600 / atATime),
        asked);
  }

  private String text() {
    try {
      return Files.readString(file);
    } catch (IOException e) {
      throw HarnessProblem.of("cannot read " + file, e);
    }
  }
}
