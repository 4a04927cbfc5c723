package steelyard.harness.process;

import java.io.IOException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.TimeUnit;

/**
 * The children that run now, a small file for each in one folder, so that a harness that is killed
 * leaves behind what the next command needs to end them.
 *
 * <p>A note counts only on the host and in the boot where it was made, and only once its owner is
 * gone: a harness that still runs, or is suspended, keeps its children.
 */
public final class LiveTable {
  static final String SUFFIX = ".live";

  private static final long END_WITHIN_NANOS = TimeUnit.SECONDS.toNanos(5);
  private static final long NO_SESSION = -1;

  private final Path folder;
  private final ProcFs proc = ProcFs.SYSTEM;

  public LiveTable(Path folder) {
    this.folder = folder.toAbsolutePath();
  }

  /**
   * A run whose harness was gone.
   *
   * @param run its name
   * @param found how many of its processes were still there
   * @param left how many of them could not be ended
   */
  public record Survivor(String run, int found, int left) {}

  /** Notes a child before it is started, so that there is no moment in which it could be lost. */
  Entry enter(String run, String tag, long earliestTicks) throws IOException {
    long pid = ProcessHandle.current().pid();
    ProcessId owner = new ProcessId(pid, proc.stat(pid).map(ProcStat::startTicks).orElse(0L));
    LiveNote note =
        new LiveNote(
            run, tag, proc.hostName(), proc.bootId(), owner, Optional.empty(), earliestTicks);
    try {
      Files.createDirectories(folder);
      note.write(folder);
    } catch (IOException e) {
      throw new IOException("cannot note run " + run + " in " + folder + ": " + e.getMessage(), e);
    }
    return new Entry(note);
  }

  /** One child in the table. */
  final class Entry {
    private final LiveNote note;

    private Entry(LiveNote note) {
      this.note = note;
    }

    /** Adds the first process. Best effort: the tag alone finds all that carry it. */
    void started(long pid) {
      Optional<ProcStat> stat = proc.stat(pid);
      try {
        if (stat.isPresent()) {
          note.with(stat.get().id()).write(folder);
        }
      } catch (IOException e) {
        return; // the note without the process stands
      }
    }

    /** The child is gone. A note that cannot be removed names nobody, and goes the next time. */
    void leave() {
      try {
        Files.deleteIfExists(folder.resolve(note.fileName()));
      } catch (IOException e) {
        return;
      }
    }
  }

  /**
   * Ends what children of dead harnesses are still there, and forgets them.
   *
   * @return those of which something was found, in the order of their files' names
   * @throws IOException if the folder cannot be read or a note not removed
   */
  public List<Survivor> endSurvivors() throws IOException {
    List<Survivor> survivors = new ArrayList<>();
    for (Path file : files()) {
      Optional<LiveNote> note = LiveNote.read(file).filter(this::orphaned);
      if (note.isPresent()) {
        Kin.Ended ended = end(note.get());
        if (ended.found() > 0) {
          survivors.add(new Survivor(note.get().run(), ended.found(), ended.left()));
        }
        if (ended.left() == 0) {
          Files.deleteIfExists(file);
        }
      }
    }
    return survivors;
  }

  private boolean orphaned(LiveNote note) {
    return note.host().equals(proc.hostName())
        && (!note.boot().equals(proc.bootId()) || !proc.alive(note.owner()));
  }

  /**
   * The session is believed only while its leader lives: once that has gone, its number may have
   * been given to a stranger, and only the tag tells.
   */
  private Kin.Ended end(LiveNote note) {
    if (!note.boot().equals(proc.bootId())) {
      return new Kin.Ended(0, 0);
    }
    ProcessId first =
        note.first().filter(proc::alive).orElse(new ProcessId(NO_SESSION, note.earliestTicks()));
    return new Kin(proc, first, note.tag()).end(Tools.detect(), END_WITHIN_NANOS);
  }

  private List<Path> files() throws IOException {
    if (!Files.isDirectory(folder)) {
      return List.of();
    }
    List<Path> files = new ArrayList<>();
    try (DirectoryStream<Path> entries = Files.newDirectoryStream(folder, "*" + SUFFIX)) {
      entries.forEach(files::add);
    }
    files.sort(null);
    return files;
  }
}
