package steelyard.harness.process;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;

/** Holds the core of a machine with one core until standard input ends, and is then killed. */
final class LeaseProgram {
  private LeaseProgram() {}

  public static void main(String[] args) throws Exception {
    Path folder = Path.of(args[0]);
    CpuTopology oneCore = new CpuTopology(List.of(0), List.of(List.of(0)));
    CoreLeases.Lease lease = new CoreLeases(folder, oneCore, 1).take(1);
    Files.writeString(folder.resolve("held"), lease.processors().toString());
    System.in.readAllBytes();
    Runtime.getRuntime().halt(0);
  }
}
