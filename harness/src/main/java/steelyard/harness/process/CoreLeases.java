package steelyard.harness.process;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.Semaphore;
import java.util.concurrent.TimeUnit;

/**
 * Gives out cores, each to one run at a time on the whole machine.
 *
 * <p>A slot is a physical core, of which a run gets the first logical processor, so that no run
 * shares a core with another. Where there is more than one core, the first is left to the harness.
 * Cores are held by kernel file locks: those of a harness that died are free at once.
 *
 * <p>Those who wait are served in the order in which they came.
 */
public final class CoreLeases {
  private static final long LOOK_AGAIN_MILLIS = 100;

  /**
   * A kernel lock belongs to the whole process and ends when any of its channels on the file is
   * closed, so within this process cores are told apart here.
   */
  private static final Set<Path> HELD_HERE = ConcurrentHashMap.newKeySet();

  private final Path folder;
  private final List<Integer> slots;
  private final Semaphore turn = new Semaphore(1, true);
  private final Semaphore freed = new Semaphore(0);

  /**
   * Leases on this machine.
   *
   * @param cache where the locks lie, the same for every harness of a user
   */
  public static CoreLeases on(CacheFolder cache, CpuTopology topology) throws IOException {
    String host = ProcFs.SYSTEM.hostName();
    Path folder = cache.folder("cores-" + (host.isEmpty() ? "here" : host));
    return new CoreLeases(folder, topology, Runtime.getRuntime().availableProcessors());
  }

  /**
   * @param quota how many processors a container lets us keep busy
   */
  CoreLeases(Path folder, CpuTopology topology, int quota) {
    List<Integer> firsts = topology.cores().stream().map(core -> core.get(0)).toList();
    int usable = Math.max(1, Math.min(firsts.size(), quota));
    this.folder = folder;
    this.slots = usable == 1 ? firsts.subList(0, 1) : firsts.subList(1, usable);
  }

  /** How many cores there are to lease. */
  public int slots() {
    return slots.size();
  }

  /**
   * Waits for cores that nobody on the machine holds.
   *
   * @param cores at least 1, at most {@link #slots}
   * @throws IOException if the locks cannot be made
   */
  public Lease take(int cores) throws IOException, InterruptedException {
    if (cores < 1 || cores > slots.size()) {
      throw new IllegalArgumentException(
          cores + " cores asked for, " + slots.size() + " can be leased here");
    }
    turn.acquire();
    try {
      Optional<Lease> lease = tryTake(cores);
      while (lease.isEmpty()) {
        freed.tryAcquire(LOOK_AGAIN_MILLIS, TimeUnit.MILLISECONDS);
        freed.drainPermits();
        lease = tryTake(cores);
      }
      return lease.get();
    } finally {
      turn.release();
    }
  }

  /**
   * All or none: half of what is needed, held while waiting, would let two harnesses wait forever.
   */
  private Optional<Lease> tryTake(int cores) throws IOException {
    List<Held> held = new ArrayList<>();
    for (int slot : slots) {
      if (held.size() < cores) {
        hold(slot).ifPresent(held::add);
      }
    }
    if (held.size() == cores) {
      return Optional.of(new Lease(this, held));
    }
    held.forEach(Held::release);
    return Optional.empty();
  }

  private Optional<Held> hold(int slot) throws IOException {
    Path file = folder.resolve("core-" + slot + ".lock");
    if (!HELD_HERE.add(file)) {
      return Optional.empty();
    }
    try {
      FileChannel channel =
          FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.WRITE);
      Held held = new Held(slot, file, channel);
      if (channel.tryLock() != null) {
        return Optional.of(held);
      }
      held.release();
      return Optional.empty();
    } catch (IOException e) {
      HELD_HERE.remove(file);
      throw new IOException("cannot lock core " + slot + " by " + file + ": " + e.getMessage(), e);
    }
  }

  private record Held(int processor, Path file, FileChannel channel) {
    void release() {
      if (!channel.isOpen()) {
        return; // released before: by now the core may be another's
      }
      try {
        channel.close();
      } catch (IOException e) {
        throw new UncheckedIOException("cannot release core " + processor, e);
      } finally {
        HELD_HERE.remove(file);
      }
    }
  }

  /** Cores that are ours until closed. */
  public static final class Lease implements AutoCloseable {
    private final CoreLeases from;
    private final List<Held> held;

    private Lease(CoreLeases from, List<Held> held) {
      this.from = from;
      this.held = List.copyOf(held);
    }

    /** The logical processors to run on. */
    public List<Integer> processors() {
      return held.stream().map(Held::processor).toList();
    }

    @Override
    public void close() {
      held.forEach(Held::release);
      from.freed.release();
    }
  }
}
