package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Invented process tables; the first process of the run is 50, started at tick 1000. */
class KinTests {
  private static final String TAG = "tag-1";

  @TempDir Path table;
  private Kin kin;

  @BeforeEach
  void startRun() throws IOException {
    kin = new Kin(new ProcFs(table), new ProcessId(50, 1000), TAG);
    process(50, 'S', 7, 50, 1000, "STEELYARD_RUN=" + TAG + "\0");
  }

  private void process(long pid, char state, long parent, long session, long start, String environ)
      throws IOException {
    Path folder = Files.createDirectories(table.resolve(Long.toString(pid)));
    String stat =
        "%d (p) %c %d %d %d 0 -1 0 0 0 0 0 1 1 0 0 20 0 1 0 %d 0 0\n"
            .formatted(pid, state, parent, pid, session, start);
    Files.writeString(folder.resolve("stat"), stat);
    Files.writeString(folder.resolve("environ"), environ);
    Files.writeString(folder.resolve("cmdline"), environ.isEmpty() ? "" : "program\0");
    Files.writeString(folder.resolve("status"), "VmHWM:\t 20 kB\nVmRSS:\t 10 kB\n");
  }

  private void ends(long pid) throws IOException {
    Path folder = table.resolve(Long.toString(pid));
    for (String file : new String[] {"stat", "environ", "cmdline", "status"}) {
      Files.delete(folder.resolve(file));
    }
    Files.delete(folder);
  }

  private Iterable<Long> seen() {
    return kin.look().stream().map(ProcStat::pid).toList();
  }

  @Test
  void counts_session_tag_andParent() throws IOException {
    process(51, 'R', 1, 50, 1001, "OTHER=1\0");
    process(52, 'R', 1, 52, 1001, "A=1\0STEELYARD_RUN=" + TAG + "\0");
    process(53, 'R', 52, 53, 1002, "OTHER=1\0");
    process(54, 'R', 1, 54, 1002, "STEELYARD_RUN=" + TAG + "/inner\0");

    assertThat(seen()).containsExactly(50L, 51L, 52L, 53L, 54L);
  }

  @Test
  void leaves_strangers_alone() throws IOException {
    process(40, 'R', 1, 40, 999, "STEELYARD_RUN=" + TAG + "\0");
    process(51, 'R', 1, 51, 1001, "STEELYARD_RUN=" + TAG + "0\0");
    process(52, 'R', 1, 52, 1001, "STEELYARD_RUN=outer/" + TAG + "\0");
    process(53, 'R', 1, 53, 1001, "NOT_STEELYARD_RUN=" + TAG + "\0");

    assertThat(seen()).containsExactly(50L);
  }

  @Test
  void counts_zombie_asGone() throws IOException {
    process(50, 'Z', 7, 50, 1000, "");

    assertThat(seen()).isEmpty();
  }

  @Test
  void keeps_member_whenItsParentGoesAndItsEnvironmentIsCleared() throws IOException {
    process(52, 'R', 50, 50, 1001, "OTHER=1\0");
    assertThat(seen()).containsExactly(50L, 52L);
    ends(50);
    process(52, 'R', 1, 52, 1001, "OTHER=1\0");

    assertThat(seen()).containsExactly(52L);
  }

  @Test
  void waits_for_environment_whenAProgramIsBeingLoaded() throws IOException {
    process(52, 'R', 1, 52, 1001, "");
    assertThat(seen()).containsExactly(50L);
    process(52, 'R', 1, 52, 1001, "STEELYARD_RUN=" + TAG + "\0");

    assertThat(seen()).containsExactly(50L, 52L);
  }

  @Test
  void does_not_take_aStrangerForAMember_whenAPidIsUsedAgain() throws IOException {
    process(52, 'R', 50, 50, 1001, "OTHER=1\0");
    assertThat(seen()).containsExactly(50L, 52L);
    ends(52);
    assertThat(seen()).containsExactly(50L);
    process(52, 'R', 1, 52, 2000, "OTHER=1\0");
    process(53, 'R', 52, 53, 2001, "OTHER=1\0");

    assertThat(seen()).containsExactly(50L);
  }
}
