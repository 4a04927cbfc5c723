package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ProcFsTests {
  private static final long SELF = ProcessHandle.current().pid();

  @TempDir Path root;

  /** The fields in the order of proc_pid_stat(5), Linux man-pages 6.9; numbered values. */
  @Test
  void reads_stat_whenTheNameHoldsParenthesesAndSpaces() {
    String line =
        "4711 (a ) S (b) c) R 1 2 3 0 -1 4194304 10 11 12 13 700 80 9 1 20 0 1 0 123456 1000 100";

    assertThat(ProcStat.parse(line))
        .hasValue(new ProcStat(4711, 'R', 1, 2, 3, 700 + 80, 9 + 1, 123456));
  }

  @Test
  void reads_nothing_whenStatIsTorn() {
    assertThat(ProcStat.parse("")).isEmpty();
    assertThat(ProcStat.parse("4711 (sh")).isEmpty();
    assertThat(ProcStat.parse("4711 (sh) R 1 2")).isEmpty();
    assertThat(ProcStat.parse("4711 (sh) R 1 two 3 0 0 0 0 0 0 0 0 0 0 0 0 0 0 0 0")).isEmpty();
  }

  @Test
  void sees_itself_asTheJdkDoes() {
    ProcStat self = ProcFs.SYSTEM.stat(SELF).orElseThrow();

    assertThat(self.alive()).isTrue();
    assertThat(self.parent())
        .isEqualTo(ProcessHandle.current().parent().map(ProcessHandle::pid).orElse(0L));
    assertThat(ProcFs.SYSTEM.pids()).contains(SELF);
    assertThat(ProcFs.SYSTEM.alive(self.id())).isTrue();
    assertThat(ProcFs.SYSTEM.alive(new ProcessId(SELF, self.startTicks() + 1))).isFalse();
    assertThat(ProcFs.SYSTEM.uptimeTicks().orElseThrow()).isGreaterThanOrEqualTo(self.startTicks());
  }

  @Test
  void reads_environment_byWholeNames() throws IOException {
    Files.createDirectories(root.resolve("7"));
    Files.writeString(root.resolve("7").resolve("environ"), "XTILE=1\0TILE=blue=2\0A=TILE=3\0");
    String environment = new ProcFs(root).environment(7);

    assertThat(ProcFs.variable(environment, "TILE")).hasValue("blue=2");
    assertThat(ProcFs.variable(environment, "XTILE")).hasValue("1");
    assertThat(ProcFs.variable(environment, "ILE")).isEmpty();
    assertThat(new ProcFs(root).environment(8)).isEmpty();
  }

  @Test
  void says_that_it_isNotAvailable_whenThereIsNoProcessFileSystem() {
    assertThat(new ProcFs(root).available()).isFalse();
    assertThat(ProcFs.SYSTEM.available()).isTrue();
  }
}
