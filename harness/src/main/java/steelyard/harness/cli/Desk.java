package steelyard.harness.cli;

import java.io.IOException;
import java.time.Clock;
import java.util.OptionalInt;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.harness.launch.Crew;
import steelyard.harness.launch.Describing;
import steelyard.harness.launch.HarnessProblem;
import steelyard.harness.launch.Installation;
import steelyard.harness.launch.ProgramBuilds;
import steelyard.harness.local.RunIds;
import steelyard.harness.process.CacheFolder;
import steelyard.harness.process.CoreLeases;
import steelyard.harness.process.Launcher;
import steelyard.harness.process.LiveTable;
import steelyard.harness.process.MachineFacts;
import steelyard.harness.process.StopSignals;
import steelyard.harness.process.StopSwitch;
import steelyard.harness.process.Tools;
import steelyard.harness.sweep.Builds;
import steelyard.harness.sweep.Catalogue;
import steelyard.harness.sweep.FamilyJars;
import steelyard.results.ledger.Session;

/** What a command that starts workers works with; ends them all when it is closed. */
final class Desk implements AutoCloseable {
  /** The one clock; everything below gets its times from here. */
  private final Clock clock = Clock.systemUTC();

  private final StopSwitch stop = new StopSwitch();
  private final Launcher launcher;
  private final StopSignals signals;
  private final Crew crew;

  private Desk(Installation installation, CacheFolder cache) throws IOException {
    LiveTable live = new LiveTable(cache.folder("live"));
    live.endSurvivors();
    launcher = Launcher.noting(live, Tools.detect());
    signals = StopSignals.install(stop, launcher);
    crew = new Crew(installation, launcher, cache, stop);
  }

  static Desk open(FamilyJars jars) {
    try {
      return new Desk(Installation.here().with(jars.byAlias()), CacheFolder.here());
    } catch (IOException e) {
      throw HarnessProblem.of("cannot prepare the cache folder", e);
    }
  }

  Clock clock() {
    return clock;
  }

  Crew crew() {
    return crew;
  }

  Catalogue catalogue() {
    return new Describing(crew).catalogue();
  }

  /** Which build of a backend runs. */
  Builds builds() {
    return new ProgramBuilds(crew);
  }

  /** A session on this machine; reading its facts takes about a second. */
  Session session(MachineFacts facts) {
    SortedMap<String, String> machine = new TreeMap<>();
    machine.put("host", facts.host());
    machine.put("processor", facts.processor());
    machine.put("memory", Long.toString(facts.memoryBytes()));
    machine.put("system", facts.system());
    machine.put("kernel", facts.kernel());
    machine.put("jdk", facts.jdk());
    machine.put("virtualisation", facts.virtualisation());
    return new Session(
        RunIds.next(),
        Versions.OWN,
        facts.machineClass(),
        machine,
        crew.profile(),
        clock.instant());
  }

  CoreLeases leases(MachineFacts facts) {
    try {
      return CoreLeases.on(crew.cache(), facts.topology());
    } catch (IOException e) {
      throw HarnessProblem.of("cannot lease cores", e);
    }
  }

  /** The exit status that a signal asks for, if one came. */
  OptionalInt signalStatus() {
    return signals.exitStatus();
  }

  @Override
  public void close() {
    launcher.endAll();
    signals.close();
  }
}
