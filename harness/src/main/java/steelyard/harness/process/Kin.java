package steelyard.harness.process;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.concurrent.locks.LockSupport;

/**
 * The living processes of one run: its first process and all that come from it.
 *
 * <p>A process belongs if it is in the session that the first process leads, or if its environment
 * carries the run's tag, or if its parent belongs; once it belongs it does for life. A process that
 * is seen and does not belong cannot come to belong later (sessions and environments pass from
 * parent to child only), so each stranger is read once, and a look costs little more than listing
 * {@code /proc}. One that is just being loaded shows no environment yet; it stays undecided.
 *
 * <p>Not for use by two threads at a time.
 */
final class Kin {
  /** The tag of a run in the environment of all its processes. */
  static final String TAG_VARIABLE = "STEELYARD_RUN";

  private static final long NANOS_BETWEEN_ROUNDS = 1_000_000;

  /**
   * Loading a program takes far less; a process that hides its environment for longer is let go.
   */
  private static final long NANOS_TO_LOAD = 200_000_000;

  private final ProcFs proc;
  private final ProcessId first;
  private final String tag;
  private final Set<Long> strangers = new HashSet<>();
  private final Set<ProcessId> members = new HashSet<>();
  private int undecided;

  /**
   * @param first the first process; a start that is not known is given as a lower bound, and all
   *     processes started before it are strangers
   */
  Kin(ProcFs proc, ProcessId first, String tag) {
    this.proc = proc;
    this.first = first;
    this.tag = tag;
  }

  /**
   * What ending the processes found.
   *
   * @param found how many were alive, those that came up meanwhile included
   * @param left how many could not be ended: only what the kernel itself holds
   */
  record Ended(int found, int left) {}

  /** All that are alive now, by ascending pid. */
  List<ProcStat> look() {
    List<Long> pids = proc.pids();
    Set<Long> listed = new HashSet<>(pids);
    strangers.retainAll(listed);
    members.removeIf(member -> !listed.contains(member.pid()));
    undecided = 0;
    List<ProcStat> alive = new ArrayList<>();
    for (long pid : pids) {
      if (!strangers.contains(pid)) {
        proc.stat(pid).ifPresent(stat -> sort(stat, alive));
      }
    }
    return alive;
  }

  private void sort(ProcStat stat, List<ProcStat> alive) {
    switch (belonging(stat)) {
      case YES -> {
        members.add(stat.id());
        if (stat.alive()) {
          alive.add(stat);
        }
      }
      case NO -> strangers.add(stat.pid());
      case NOT_TOLD -> undecided++;
    }
  }

  private enum Belonging {
    YES,
    NO,
    NOT_TOLD
  }

  private Belonging belonging(ProcStat stat) {
    if (stat.startTicks() < first.startTicks()) {
      return Belonging.NO;
    }
    boolean bornHere =
        stat.pid() == first.pid()
            || stat.session() == first.pid()
            || members.contains(stat.id())
            || members.stream().anyMatch(member -> member.pid() == stat.parent());
    return bornHere ? Belonging.YES : byTag(stat);
  }

  /**
   * While execve(2) puts one program in the place of another, environment and command line are both
   * empty. Kernel threads and processes that end have neither, but no memory either.
   */
  private Belonging byTag(ProcStat stat) {
    String environment = proc.environment(stat.pid());
    if (environment.isEmpty() && proc.memory(stat.pid()).residentBytes() > 0) {
      if (proc.commandLine(stat.pid()).isEmpty()) {
        return Belonging.NOT_TOLD;
      }
      environment = proc.environment(stat.pid());
    }
    return ProcFs.variable(environment, TAG_VARIABLE).filter(this::isOurs).isPresent()
        ? Belonging.YES
        : Belonging.NO;
  }

  private boolean isOurs(String otherTag) {
    return otherTag.equals(tag) || otherTag.startsWith(tag + Launch.TAG_SEPARATOR);
  }

  /** Kills all with SIGKILL, whole groups first, and looks again until none is left. */
  Ended end(Tools tools, long withinNanos) {
    long from = System.nanoTime();
    List<ProcStat> left = look();
    Set<ProcessId> found = new HashSet<>();
    while (!settled(left, from) && System.nanoTime() - from < withinNanos) {
      left.forEach(stat -> found.add(stat.id()));
      tools.killGroups(groupsOf(left));
      left.forEach(Kin::kill);
      LockSupport.parkNanos(NANOS_BETWEEN_ROUNDS);
      left = look();
    }
    return new Ended(found.size(), left.size());
  }

  private boolean settled(List<ProcStat> left, long from) {
    boolean decided = undecided == 0 || System.nanoTime() - from > NANOS_TO_LOAD;
    return left.isEmpty() && decided;
  }

  /** Groups within the run's own session; a group of another session may hold strangers. */
  private List<Long> groupsOf(List<ProcStat> processes) {
    return processes.stream()
        .filter(stat -> stat.session() == first.pid())
        .map(ProcStat::group)
        .distinct()
        .toList();
  }

  private static void kill(ProcStat stat) {
    if (stat.pid() != ProcessHandle.current().pid()) {
      ProcessHandle.of(stat.pid()).ifPresent(ProcessHandle::destroyForcibly);
    }
  }
}
