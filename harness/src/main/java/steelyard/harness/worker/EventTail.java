package steelyard.harness.worker;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Reads a growing file of events. A last line without its end is left for later; a line that is not
 * an event, or out of sequence, is counted and dropped: the worker, or somebody, forged it.
 */
public final class EventTail {
  /** The most that is taken in at a time. */
  private static final int CHUNK = 1 << 20;

  /** A longer line is not ours. */
  private static final int MOST_LINE = 64 << 20;

  private final Path file;
  private long position;
  private byte[] rest = new byte[0];
  private long next;
  private long forged;

  public EventTail(Path file) {
    this.file = file;
  }

  /** The events that came in since the last call; none while the file is not there. */
  public List<StampedEvent> next() throws IOException {
    List<StampedEvent> events = new ArrayList<>();
    try (FileChannel channel = FileChannel.open(file, StandardOpenOption.READ)) {
      ByteBuffer buffer = ByteBuffer.allocate(CHUNK);
      while (channel.read(buffer, position) > 0) {
        position += buffer.position();
        take(buffer.array(), buffer.position(), events);
        buffer.clear();
      }
    } catch (NoSuchFileException e) {
      return events;
    }
    return events;
  }

  private void take(byte[] bytes, int length, List<StampedEvent> events) {
    int from = 0;
    for (int i = 0; i < length; i++) {
      if (bytes[i] == '\n') {
        line(joined(rest, Arrays.copyOfRange(bytes, from, i)), events);
        rest = new byte[0];
        from = i + 1;
      }
    }
    rest = joined(rest, Arrays.copyOfRange(bytes, from, length));
    if (rest.length > MOST_LINE) {
      rest = new byte[0];
      forged++;
    }
  }

  private void line(byte[] bytes, List<StampedEvent> events) {
    try {
      StampedEvent event = EventCodec.read(new String(bytes, StandardCharsets.UTF_8));
      if (event.number() == next) {
        events.add(event);
        next++;
      } else {
        forged++;
      }
    } catch (IOException e) {
      forged++;
    }
  }

  private static byte[] joined(byte[] head, byte[] tail) {
    if (head.length == 0) {
      return tail;
    }
    byte[] both = Arrays.copyOf(head, head.length + tail.length);
    System.arraycopy(tail, 0, both, head.length, tail.length);
    return both;
  }

  /** How many lines were no events of the worker. */
  public long forged() {
    return forged;
  }
}
