package steelyard.harness.worker;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Optional;

/**
 * Writes events, each at once and whole: the page cache outlives the process, and syncing inside a
 * solve would distort it. Beyond a size solutions are held back; the last one is always written.
 */
final class EventWriter implements AutoCloseable {
  static final long MOST_BYTES = 64L << 20;

  private final FileChannel channel;
  private final long mostBytes;
  private long number;
  private long bytes;
  private long thinned;
  private Optional<StampedEvent> held = Optional.empty();

  EventWriter(Path file) throws IOException {
    this(file, MOST_BYTES);
  }

  EventWriter(Path file, long mostBytes) throws IOException {
    this.mostBytes = mostBytes;
    channel =
        FileChannel.open(
            file,
            StandardOpenOption.CREATE,
            StandardOpenOption.WRITE,
            StandardOpenOption.TRUNCATE_EXISTING);
  }

  synchronized void write(Event event) {
    StampedEvent stamped = new StampedEvent(number, System.nanoTime(), event);
    if (event instanceof Event.Solution && bytes > mostBytes) {
      thinned += held.isPresent() ? 1 : 0;
      held = Optional.of(stamped);
    } else {
      append(stamped);
    }
  }

  /** Says that a phase begins. */
  void phase(String name) {
    write(new Event.Phase(name, OwnCpu.nanos()));
  }

  private void append(StampedEvent stamped) {
    try {
      StampedEvent next = new StampedEvent(number, stamped.nanos(), stamped.event());
      ByteBuffer line = ByteBuffer.wrap(EventCodec.write(next).getBytes(StandardCharsets.UTF_8));
      bytes += line.remaining();
      while (line.hasRemaining()) {
        channel.write(line);
      }
      number++;
    } catch (IOException e) {
      throw new UncheckedIOException("cannot write events: " + e.getMessage(), e);
    }
  }

  /** Writes what was held back. */
  synchronized void flush() {
    if (thinned > 0) {
      append(new StampedEvent(number, System.nanoTime(), new Event.Thinned(thinned)));
      thinned = 0;
    }
    held.ifPresent(this::append);
    held = Optional.empty();
  }

  @Override
  public synchronized void close() {
    flush();
    try {
      channel.close();
    } catch (IOException e) {
      throw new UncheckedIOException("cannot write events: " + e.getMessage(), e);
    }
  }
}
