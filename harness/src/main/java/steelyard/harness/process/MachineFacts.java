package steelyard.harness.process;

import com.sun.management.OperatingSystemMXBean;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.function.Function;
import oshi.SystemInfo;

/**
 * The machine that runs are made on. Reading it takes about a second, so once per sweep.
 *
 * @param host name of the machine
 * @param processor model of the processor, as far as a virtual machine shows it
 * @param topology logical processors that we may use, by physical core
 * @param memoryBytes of the machine, or of the container if that has less
 * @param system distribution and version
 * @param kernel name and version
 * @param architecture as the JDK names it
 * @param jdk vendor, runtime and version, build included
 * @param virtualisation what hints at a virtual machine or a container; "none seen" otherwise
 * @param governor of the processor's clock; "not shown" where it is hidden
 */
public record MachineFacts(
    String host,
    String processor,
    CpuTopology topology,
    long memoryBytes,
    String system,
    String kernel,
    String architecture,
    String jdk,
    String virtualisation,
    String governor) {

  private static final Path SYS = Path.of("/sys");

  /** Of the machine that this process runs on. */
  public static MachineFacts here() {
    ProcFs proc = ProcFs.SYSTEM;
    return new MachineFacts(
        proc.hostName(),
        processorName(proc),
        CpuTopology.here(),
        totalMemoryBytes(),
        fromHardware(info -> info.getOperatingSystem().toString())
            .orElse(System.getProperty("os.name")),
        System.getProperty("os.name") + " " + System.getProperty("os.version"),
        System.getProperty("os.arch"),
        runningJdk(),
        hintsOfVirtualisation(proc),
        line(SYS.resolve("devices/system/cpu/cpu0/cpufreq/scaling_governor")).orElse("not shown"));
  }

  /**
   * Machines on which times may be compared at all: same model of processor, same major version of
   * the JDK, same operating system and architecture.
   */
  public String machineClass() {
    String os = kernel.substring(0, Math.max(0, kernel.indexOf(' ')));
    return processor + ", JDK " + Runtime.version().feature() + ", " + os + " " + architecture;
  }

  private static String processorName(ProcFs proc) {
    String name =
        fromHardware(info -> info.getHardware().getProcessor().getProcessorIdentifier().getName())
            .filter(text -> !text.isBlank())
            .or(() -> field(proc.text("cpuinfo").orElse(""), "model name"))
            .orElse("unknown processor");
    return name.strip().replaceAll("\\s+", " ");
  }

  /** The library reaches into the system by native code, which a machine may forbid. */
  private static Optional<String> fromHardware(Function<SystemInfo, String> question) {
    try {
      return Optional.ofNullable(question.apply(new SystemInfo()));
    } catch (RuntimeException | LinkageError e) {
      return Optional.empty();
    }
  }

  private static long totalMemoryBytes() {
    return ManagementFactory.getPlatformMXBean(OperatingSystemMXBean.class).getTotalMemorySize();
  }

  private static String runningJdk() {
    return System.getProperty("java.vendor")
        + " "
        + System.getProperty("java.vm.name")
        + " "
        + System.getProperty("java.runtime.version");
  }

  private static String hintsOfVirtualisation(ProcFs proc) {
    String flags = field(proc.text("cpuinfo").orElse(""), "flags").orElse("") + " ";
    String product = line(SYS.resolve("class/dmi/id/product_name")).orElse("");
    boolean container =
        Files.exists(Path.of("/.dockerenv")) || Files.exists(Path.of("/run/.containerenv"));
    if (flags.contains(" hypervisor ")) {
      return (container ? "container on " : "") + ("virtual machine " + product).strip();
    }
    return container ? "container" : "none seen";
  }

  private static Optional<String> field(String text, String key) {
    return text.lines()
        .filter(line -> line.startsWith(key) && line.indexOf(':') > 0)
        .map(line -> line.substring(line.indexOf(':') + 1).strip())
        .findFirst();
  }

  private static Optional<String> line(Path file) {
    try {
      return Files.readString(file).lines().findFirst();
    } catch (IOException e) {
      return Optional.empty();
    }
  }
}
