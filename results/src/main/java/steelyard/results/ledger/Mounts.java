package steelyard.results.ledger;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Stream;

/**
 * Tells on what kind of file system a path lies, by Linux's table of mounts (proc(5), fstab(5)).
 *
 * @param entries mount points and their types, in the order of mounting
 */
record Mounts(List<Mounts.Entry> entries) {

  private static final Path TABLE = Path.of("/proc/mounts");

  /**
   * File systems that several machines can mount at once. There, the locks and the shared memory of
   * a write-ahead log do not hold (SQLite documentation, "Write-Ahead Logging", section 1).
   */
  private static final Set<String> SHARED =
      Set.of(
          "afs",
          "beegfs",
          "ceph",
          "cifs",
          "coda",
          "fuse.ceph",
          "fuse.ceph-fuse",
          "fuse.cephfs",
          "fuse.glusterfs",
          "fuse.juicefs",
          "fuse.s3fs",
          "fuse.sshfs",
          "gfs2",
          "glusterfs",
          "gpfs",
          "lustre",
          "ncpfs",
          "nfs",
          "nfs4",
          "ocfs2",
          "orangefs",
          "panfs",
          "smb3",
          "smbfs");

  record Entry(Path point, String type) {}

  /** The table of this machine; empty where there is none. */
  static Mounts ofThisMachine() {
    try {
      return parse(Files.readString(TABLE));
    } catch (IOException e) {
      return new Mounts(List.of());
    }
  }

  static Mounts parse(String table) {
    return new Mounts(table.lines().flatMap(Mounts::entry).toList());
  }

  /**
   * The type of a path's file system, if several machines can mount it at once.
   *
   * @param path absolute; need not exist
   */
  Optional<String> shared(Path path) {
    Entry home = null;
    for (Entry entry : entries) {
      boolean nearer = home == null || entry.point().getNameCount() >= home.point().getNameCount();
      if (nearer && path.startsWith(entry.point())) {
        home = entry; // of two mounts on one point, the later hides the earlier
      }
    }
    return Optional.ofNullable(home).map(Entry::type).filter(SHARED::contains);
  }

  private static Stream<Entry> entry(String line) {
    List<String> fields = Stream.of(line.split(" ", -1)).toList();
    return fields.size() < 3
        ? Stream.empty()
        : Stream.of(new Entry(Path.of(unescaped(fields.get(1))), fields.get(2)));
  }

  /** Blank, tab, newline and backslash stand as three octal digits behind a backslash. */
  private static String unescaped(String field) {
    return field
        .replace("\\040", " ")
        .replace("\\011", "\t")
        .replace("\\012", "\n")
        .replace("\\134", "\\");
  }
}
