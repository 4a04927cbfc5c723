package steelyard.harness.process;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.IntStream;

/**
 * The logical processors that this process may use, and which of them share a physical core.
 *
 * <p>Source: proc_pid_status(5), {@code Cpus_allowed_list}; the kernel's admin-guide/cputopology,
 * {@code physical_package_id} and {@code core_id}.
 *
 * @param allowed numbers of the logical processors allowed, ascending
 * @param cores the same, one list for each physical core, by their first processor
 */
public record CpuTopology(List<Integer> allowed, List<List<Integer>> cores) {
  private static final String ALLOWED = "Cpus_allowed_list:";

  public CpuTopology {
    allowed = List.copyOf(allowed);
    cores = cores.stream().map(List::copyOf).toList();
  }

  public static CpuTopology here() {
    return read(ProcFs.SYSTEM, Path.of("/sys"));
  }

  /** Where the system does not say which processors share a core, each is one. */
  static CpuTopology read(ProcFs proc, Path sys) {
    List<Integer> allowed = proc.text("self/status").map(CpuTopology::allowedIn).orElse(List.of());
    if (allowed.isEmpty()) {
      int processors = Runtime.getRuntime().availableProcessors();
      allowed = IntStream.range(0, processors).boxed().toList();
    }
    SortedMap<String, List<Integer>> byCore = new TreeMap<>();
    for (int processor : allowed) {
      byCore.computeIfAbsent(core(sys, processor), key -> new ArrayList<>()).add(processor);
    }
    List<List<Integer>> cores = new ArrayList<>(byCore.values());
    cores.sort((a, b) -> Integer.compare(a.get(0), b.get(0)));
    return new CpuTopology(allowed, cores);
  }

  private static List<Integer> allowedIn(String status) {
    return status
        .lines()
        .filter(line -> line.startsWith(ALLOWED))
        .findFirst()
        .map(line -> numbers(line.substring(ALLOWED.length()).strip()))
        .orElse(List.of());
  }

  /** A list such as {@code 0-3,8,10-11}. */
  static List<Integer> numbers(String list) {
    List<Integer> numbers = new ArrayList<>();
    for (String part : list.split(",", -1)) {
      int hyphen = part.indexOf('-');
      int from = Integer.parseInt(hyphen < 0 ? part : part.substring(0, hyphen));
      int to = hyphen < 0 ? from : Integer.parseInt(part.substring(hyphen + 1));
      IntStream.rangeClosed(from, to).forEach(numbers::add);
    }
    return numbers;
  }

  private static String core(Path sys, int processor) {
    Path topology = sys.resolve("devices/system/cpu/cpu" + processor + "/topology");
    try {
      return Files.readString(topology.resolve("physical_package_id")).strip()
          + "/"
          + Files.readString(topology.resolve("core_id")).strip();
    } catch (IOException e) {
      return "processor " + processor;
    }
  }
}
