package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CoreLeasesTests {
  /** Three cores of two logical processors each. */
  private static final CpuTopology THREE =
      new CpuTopology(
          List.of(0, 1, 2, 3, 4, 5), List.of(List.of(0, 3), List.of(1, 4), List.of(2, 5)));

  private static final CpuTopology ONE = new CpuTopology(List.of(0), List.of(List.of(0)));

  @TempDir Path folder;

  private CoreLeases leases(CpuTopology topology) {
    return new CoreLeases(folder, topology, topology.allowed().size());
  }

  @Test
  void leaves_one_core_toTheHarness_andUsesOneProcessorOfEach() throws Exception {
    CoreLeases leases = leases(THREE);

    assertThat(leases.slots()).isEqualTo(2);
    try (CoreLeases.Lease both = leases.take(2)) {
      assertThat(both.processors()).containsExactly(1, 2);
    }
  }

  @Test
  void shares_the_only_core_withTheHarness() throws Exception {
    try (CoreLeases.Lease only = leases(ONE).take(1)) {
      assertThat(only.processors()).containsExactly(0);
    }
  }

  @Test
  void keeps_within_aContainersQuota() {
    assertThat(new CoreLeases(folder, THREE, 2).slots()).isEqualTo(1);
    assertThat(new CoreLeases(folder, THREE, 1).slots()).isEqualTo(1);
  }

  @Test
  void gives_different_cores_toTwoHolders_evenThroughTwoTables() throws Exception {
    try (CoreLeases.Lease first = leases(THREE).take(1);
        CoreLeases.Lease second = leases(THREE).take(1)) {
      assertThat(first.processors()).doesNotContainAnyElementsOf(second.processors());
    }
  }

  @Test
  void makes_the_next_wait_untilCoresAreFree() throws Exception {
    CoreLeases leases = leases(THREE);
    CoreLeases.Lease first = leases.take(1);
    CompletableFuture<CoreLeases.Lease> both = CompletableFuture.supplyAsync(() -> take(leases, 2));
    assertThat(both).isNotDone();
    first.close();

    try (CoreLeases.Lease second = both.get(10, TimeUnit.SECONDS)) {
      assertThat(second.processors()).containsExactly(1, 2);
    }
  }

  private static CoreLeases.Lease take(CoreLeases leases, int cores) {
    try {
      return leases.take(cores);
    } catch (Exception e) {
      throw new IllegalStateException(e);
    }
  }

  @Test
  void does_not_free_anothersCore_whenClosedTwice() throws Exception {
    CoreLeases leases = leases(THREE);
    CoreLeases.Lease first = leases.take(2);
    first.close();
    try (CoreLeases.Lease second = leases.take(1)) {
      first.close();
      try (CoreLeases.Lease third = leases.take(1)) {
        assertThat(third.processors()).doesNotContainAnyElementsOf(second.processors());
      }
    }
  }

  @Test
  void refuses_more_thanThereAre() {
    assertThatThrownBy(() -> leases(THREE).take(3))
        .hasMessage("3 cores asked for, 2 can be leased here");
    assertThatThrownBy(() -> leases(THREE).take(0)).isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void takes_over_from_anotherProcess_onlyWhenThatIsKilled() throws Exception {
    Process other =
        new ProcessBuilder(
                JavaCommand.java().toString(),
                "-cp",
                System.getProperty("java.class.path"),
                LeaseProgram.class.getName(),
                folder.toString())
            .start();
    assertThat(Eventually.holds(() -> Files.exists(folder.resolve("held")))).isTrue();
    CompletableFuture<CoreLeases.Lease> ours =
        CompletableFuture.supplyAsync(() -> take(leases(ONE), 1));
    assertThat(ours).isNotDone();
    other.destroyForcibly();

    ours.get(10, TimeUnit.SECONDS).close();
    assertThat(other.waitFor(10, TimeUnit.SECONDS)).isTrue();
  }
}
