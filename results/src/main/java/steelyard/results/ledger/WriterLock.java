package steelyard.results.ledger;

import static java.nio.charset.StandardCharsets.UTF_8;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;

/**
 * Keeps a ledger to one writer: a lock of the kernel's on a file beside it, gone with the process
 * however that ends. The file stays and names its last holder.
 */
final class WriterLock implements AutoCloseable {

  /**
   * What this process holds. POSIX drops a process's locks on a file as soon as it closes any
   * descriptor of that file (fcntl(2)), so a second attempt from within must not even open it.
   */
  private static final Map<Path, Holder> HELD = new ConcurrentHashMap<>();

  private final Path file;
  private final FileChannel channel;

  private WriterLock(Path file, FileChannel channel) {
    this.file = file;
    this.channel = channel;
  }

  /**
   * Takes the lock of a ledger.
   *
   * @param ledger the ledger's real path; need not exist, its folder does
   * @throws LedgerProblem if another writer has it; the message says who
   */
  static WriterLock take(Path ledger, Holder holder) {
    Path file = ledger.resolveSibling(ledger.getFileName() + ".lock");
    Holder own = HELD.putIfAbsent(file, holder);
    if (own != null) {
      throw taken(ledger, own.line());
    }
    try {
      return lock(ledger, file, holder);
    } catch (IOException | RuntimeException e) {
      HELD.remove(file);
      throw e instanceof IOException io ? Problems.of(ledger, io) : (RuntimeException) e;
    }
  }

  private static WriterLock lock(Path ledger, Path file, Holder holder) throws IOException {
    FileChannel channel =
        FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.WRITE);
    try {
      FileLock lock = channel.tryLock();
      if (lock == null) {
        throw taken(ledger, lastHolder(file));
      }
      channel.truncate(0);
      channel.write(ByteBuffer.wrap((holder.line() + "\n").getBytes(UTF_8)));
      return new WriterLock(file, channel);
    } catch (IOException | RuntimeException e) {
      channel.close();
      throw e;
    }
  }

  private static LedgerProblem taken(Path ledger, String holder) {
    return new LedgerProblem(
        "%s: in use by %s".formatted(ledger, holder), "wait until it ends, or name another ledger");
  }

  private static String lastHolder(Path file) {
    try {
      String line = Files.readString(file).strip();
      return line.isEmpty() ? "another process" : line;
    } catch (IOException e) {
      return "another process";
    }
  }

  @Override
  public void close() {
    try {
      channel.close();
    } catch (IOException e) {
      throw Problems.of(file, e);
    } finally {
      HELD.remove(file);
    }
  }
}
