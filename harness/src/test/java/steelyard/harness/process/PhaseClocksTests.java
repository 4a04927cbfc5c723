package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

/** All times in nanoseconds; the child starts at a time close to where the clock wraps. */
class PhaseClocksTests {
  private static final long START = Long.MAX_VALUE - 500;

  private final ProcessLimits limits =
      new ProcessLimits(
          Duration.ofNanos(1000),
          Set.of("lower", "solve"),
          Duration.ofNanos(50),
          new TreeMap<>(Map.of("start", Duration.ofNanos(300), "load", Duration.ofNanos(400))),
          Duration.ofNanos(200),
          1 << 20,
          1 << 20);
  private final PhaseClocks clocks = new PhaseClocks(limits, START);

  /** {@link System#nanoTime} may wrap around. */
  private static long at(long nanos) {
    return START + nanos;
  }

  private void mark(String phase, long claimed, long earlierLook, long thisLook) {
    clocks.mark(new PhaseMark(phase, at(claimed)), at(earlierLook), at(thisLook));
  }

  @Test
  void counts_start_fromTheStart() {
    assertThat(clocks.phase()).isEqualTo("start");
    assertThat(clocks.nanosLeft(at(120))).isEqualTo(180);
  }

  @Test
  void starts_main_clock_atTheMark_notWhenItIsSeen() {
    mark("lower", 210, 200, 250);

    assertThat(clocks.clock().main()).isTrue();
    assertThat(clocks.nanosLeft(at(710))).isEqualTo(500);
  }

  @Test
  void runs_one_main_clock_throughAllMainPhases() {
    mark("lower", 100, 100, 100);
    mark("solve", 600, 600, 600);
    mark("finish", 900, 900, 900);
    clocks.stopAt(at(950));

    assertThat(clocks.mainNanos()).isEqualTo(800);
    assertThat(clocks.nanosLeft(at(950))).isEqualTo(150);
  }

  @Test
  void takes_mark_forTheEarlierLook_whenItClaimsATimeBefore() {
    mark("lower", 10, 200, 250);

    assertThat(clocks.nanosLeft(at(300))).isEqualTo(900);
  }

  @Test
  void takes_mark_forTheTimeSeen_whenItClaimsTheFuture() {
    mark("lower", 5000, 200, 250);

    assertThat(clocks.nanosLeft(at(300))).isEqualTo(950);
  }

  @Test
  void keeps_claims_besideWhatWasSeen() {
    mark("lower", 5000, 200, 250);

    assertThat(clocks.marks()).containsExactly(new Exit.Mark("lower", 5000, 250));
  }

  @Test
  void gives_no_fresh_allowance_whenChildGoesToAndFro() {
    mark("load", 100, 100, 100);
    mark("lower", 300, 300, 300);
    mark("load", 400, 400, 400);

    assertThat(clocks.nanosLeft(at(500))).isEqualTo(400 - 200 - 100);
  }

  @Test
  void lets_unknown_phases_shareOneAllowance() {
    mark("a", 100, 100, 100);
    mark("b", 190, 190, 190);

    assertThat(clocks.nanosLeft(at(290))).isEqualTo(200 - 90 - 100);
  }

  @Test
  void keeps_first_marks_only_whenChildFloodsThem() {
    for (int i = 0; i < 1000; i++) {
      mark("phase " + i, i, i, i);
    }

    assertThat(clocks.marks()).hasSize(100);
    assertThat(clocks.phase()).isEqualTo("phase 999");
  }
}
