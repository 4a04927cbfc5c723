package steelyard.harness.cli;

import java.nio.file.Path;
import java.util.List;
import picocli.CommandLine.Option;

/** Options that every command takes. */
final class Shared {
  @Option(
      names = "--ledger",
      paramLabel = "FOLDER",
      defaultValue = "ledger",
      description = "Where runs are kept. Default: ${DEFAULT-VALUE}")
  Path ledger;

  @Option(
      names = "--family-jar",
      paramLabel = "JAR",
      description = "A jar with families of your own; may be given several times.")
  List<Path> familyJars = List.of();

  @Option(names = "--debug", description = "Show where a mistake of this program was made.")
  boolean debug;

  /** The ledger's file. */
  Path file() {
    return ledger.resolve("runs.db").toAbsolutePath().normalize();
  }

  /** The ledger's folder. */
  Path folder() {
    return ledger.toAbsolutePath().normalize();
  }
}
