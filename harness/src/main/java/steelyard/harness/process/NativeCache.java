package steelyard.harness.process;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.List;
import java.util.UUID;
import java.util.zip.ZipEntry;
import java.util.zip.ZipException;
import java.util.zip.ZipFile;

/**
 * Native libraries, taken out of their jar once and for all. A library that unpacks itself does so
 * in every process, tens of megabytes each time, and leaves them behind when the process is killed.
 *
 * <p>Each file is unpacked beside and moved into place, in a folder named by the digest of the jar.
 * So a process that is killed leaves no torn file, two that unpack at a time do each other no harm,
 * and a file that went missing is put back.
 */
public final class NativeCache {
  private static final int DIGEST_CHARACTERS = 16;

  private final CacheFolder cache;

  public NativeCache(CacheFolder cache) {
    this.cache = cache;
  }

  /**
   * The folder that holds the files of a jar's folder.
   *
   * @param jar holds native libraries
   * @param inside the folder within the jar; its files are taken, not its subfolders
   * @throws IOException with one sentence if the jar has no such files, or there is no room for
   *     them
   */
  public Path unpacked(Path jar, String inside) throws IOException {
    String digest = Digests.of(jar).substring(0, DIGEST_CHARACTERS);
    Path natives = cache.folder("natives");
    Path target = natives.resolve(inside + "-" + digest);
    try (ZipFile zip = new ZipFile(jar.toFile())) {
      List<? extends ZipEntry> entries = entries(zip, inside + "/");
      if (entries.isEmpty()) {
        throw new IOException("jar " + jar + " holds no files in " + inside);
      }
      Files.createDirectories(target);
      for (ZipEntry entry : entries) {
        Path file = target.resolve(fileName(entry));
        if (!Files.isRegularFile(file) || Files.size(file) != entry.getSize()) {
          unpack(zip, entry, file);
        }
      }
    } catch (ZipException e) {
      throw new IOException(
          "the jar " + jar + " is damaged (" + e.getMessage() + "); install it again", e);
    }
    return target;
  }

  private static List<? extends ZipEntry> entries(ZipFile zip, String prefix) {
    return zip.stream()
        .filter(entry -> !entry.isDirectory() && entry.getName().startsWith(prefix))
        .filter(entry -> entry.getName().indexOf('/', prefix.length()) < 0)
        .toList();
  }

  private static String fileName(ZipEntry entry) {
    return entry.getName().substring(entry.getName().lastIndexOf('/') + 1);
  }

  private static void unpack(ZipFile zip, ZipEntry entry, Path file) throws IOException {
    Path beside = file.resolveSibling("." + UUID.randomUUID());
    try (InputStream in = zip.getInputStream(entry)) {
      Files.copy(in, beside);
      Files.move(beside, file, StandardCopyOption.ATOMIC_MOVE);
    } finally {
      Files.deleteIfExists(beside);
    }
  }
}
