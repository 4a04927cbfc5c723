package steelyard.harness.cli;

import java.nio.file.Path;
import java.util.List;
import picocli.CommandLine.Option;
import steelyard.harness.sweep.FamilyJars;

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
      paramLabel = "[ALIAS=]JAR",
      description =
          "A jar with families of your own; may be given several times. With an alias its variants"
              + " are named plain@ALIAS.")
  List<String> familyJars = List.of();

  @Option(names = "--debug", description = "Show where a mistake of this program was made.")
  boolean debug;

  /** The jars that were given. */
  FamilyJars jars() {
    return FamilyJars.of(familyJars);
  }

  /** The ledger's file. */
  Path file() {
    return ledger.resolve("runs.db").toAbsolutePath().normalize();
  }

  /** The ledger's folder. */
  Path folder() {
    return ledger.toAbsolutePath().normalize();
  }
}
