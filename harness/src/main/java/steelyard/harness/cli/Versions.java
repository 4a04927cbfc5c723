package steelyard.harness.cli;

import java.util.ArrayList;
import java.util.List;
import picocli.CommandLine.IVersionProvider;
import steelyard.harness.sweep.Catalogue;
import steelyard.harness.sweep.FamilyJars;

/** Our own version and those of all solvers that are installed. */
final class Versions implements IVersionProvider {
  /** From the jar's manifest; while developing there is none. */
  static final String OWN = version();

  private static String version() {
    String version = Versions.class.getPackage().getImplementationVersion();
    return version == null ? "development" : version;
  }

  @Override
  public String[] getVersion() {
    List<String> lines = new ArrayList<>();
    lines.add("steelyard " + OWN);
    lines.add("java " + Runtime.version());
    try (Desk desk = Desk.open(FamilyJars.none())) {
      Catalogue catalogue = desk.catalogue();
      catalogue.backends().forEach(b -> lines.add(b.name() + " " + b.version()));
      catalogue.missing().forEach(m -> lines.add(m.name() + " cannot run: " + m.reason()));
    }
    return lines.toArray(String[]::new);
  }
}
