package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class MachineTests {
  @TempDir Path folder;

  private void write(String file, String text) throws IOException {
    Path path = folder.resolve(file);
    Files.createDirectories(path.getParent());
    Files.writeString(path, text);
  }

  private void core(int processor, int packageId, int coreId) throws IOException {
    String topology = "devices/system/cpu/cpu" + processor + "/topology/";
    write(topology + "physical_package_id", packageId + "\n");
    write(topology + "core_id", coreId + "\n");
  }

  /** List format: cpuset(7), Linux man-pages 6.9, whose example is 0-4,9. */
  @Test
  void reads_lists_ofProcessors() {
    assertThat(CpuTopology.numbers("0-4,9")).containsExactly(0, 1, 2, 3, 4, 9);
    assertThat(CpuTopology.numbers("3")).containsExactly(3);
  }

  @Test
  void groups_processors_byPackageAndCore() throws IOException {
    write("self/status", "Name:\tjava\nCpus_allowed:\tff\nCpus_allowed_list:\t0-3,5\n");
    core(0, 0, 0);
    core(1, 1, 0);
    core(2, 0, 0);
    core(3, 1, 0);
    core(5, 1, 7);

    CpuTopology topology = CpuTopology.read(new ProcFs(folder), folder);

    assertThat(topology.allowed()).containsExactly(0, 1, 2, 3, 5);
    assertThat(topology.cores()).containsExactly(List.of(0, 2), List.of(1, 3), List.of(5));
  }

  @Test
  void takes_each_processor_forACore_whenTheSystemDoesNotSay() throws IOException {
    write("self/status", "Cpus_allowed_list:\t2,4\n");

    assertThat(CpuTopology.read(new ProcFs(folder), folder).cores())
        .containsExactly(List.of(2), List.of(4));
  }

  /** Fields in the order of proc_stat(5), Linux man-pages 6.9; numbered values. */
  @Test
  void tells_stolen_time_andSwapping_betweenTwoMoments() throws IOException {
    write("loadavg", "0.75 0.50 0.25 2/83 4711\n");
    write("stat", "cpu  100 1 20 800 5 0 3 71 50 0\ncpu0 100 1 20 800 5 0 3 71 50 0\n");
    write("vmstat", "nr_free_pages 7\npswpin 10\npswpout 4\n");
    MachineLoad before = MachineLoad.read(new ProcFs(folder));
    write("stat", "cpu  160 1 20 820 5 0 3 91 80 0\n");
    write("vmstat", "pswpin 12\npswpout 9\n");
    MachineLoad after = MachineLoad.read(new ProcFs(folder));

    assertThat(before).isEqualTo(new MachineLoad(0.75, 71, 1000, 14));
    assertThat(after.stolenSince(before)).isCloseTo(0.2, within(1e-12));
    assertThat(after.swappedPagesSince(before)).isEqualTo(7);
    assertThat(before.stolenSince(before)).isZero();
  }

  @Test
  void reads_zero_whenTheSystemSaysNothing() {
    assertThat(MachineLoad.read(new ProcFs(folder))).isEqualTo(new MachineLoad(0, 0, 0, 0));
  }

  @Test
  void knows_this_machine_theSameTwice() {
    MachineFacts facts = MachineFacts.here();

    assertThat(facts.processor()).isNotBlank().doesNotContain("unknown");
    assertThat(facts.topology().allowed())
        .hasSizeGreaterThanOrEqualTo(Runtime.getRuntime().availableProcessors());
    assertThat(facts.memoryBytes()).isGreaterThan(64 * Trial.MEBIBYTE);
    assertThat(facts.machineClass())
        .isEqualTo(
            "%s, JDK %d, Linux %s",
            facts.processor(), Runtime.version().feature(), System.getProperty("os.arch"));
    assertThat(MachineFacts.here()).isEqualTo(facts);
  }
}
