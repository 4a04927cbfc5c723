package steelyard.adapters.program;

import java.io.BufferedInputStream;
import java.io.EOFException;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.OptionalLong;
import steelyard.adapters.sat.encoding.ClauseSink;

/**
 * A formula in a file, in the format of the second DIMACS challenge (1993), to which clauses are
 * added, and from whose end they are taken away, between calls of a solver. A comment before the
 * header makes room for it to grow, so that the counts in it are exact without the file being
 * written again.
 */
final class CnfFile implements ClauseSink, AutoCloseable {
  /** The comment and the header take so many bytes. */
  private static final int HEAD = 64;

  private static final int BUFFER = 1 << 16;

  /** No literal is longer, sign and blank included. */
  private static final int LONGEST_LITERAL = 12;

  private final Path file;
  private final FileChannel channel;
  private final ByteBuffer buffer = ByteBuffer.allocate(BUFFER);
  private final int variables;
  private long clauses;

  private CnfFile(Path file, FileChannel channel, int variables) {
    this.file = file;
    this.channel = channel;
    this.variables = variables;
  }

  /** An empty formula over so many variables, in place of what the file may hold. */
  static CnfFile create(Path file, int variables) throws IOException {
    FileChannel channel =
        FileChannel.open(
            file,
            StandardOpenOption.CREATE,
            StandardOpenOption.WRITE,
            StandardOpenOption.TRUNCATE_EXISTING);
    return new CnfFile(file, channel.position(HEAD), variables);
  }

  Path path() {
    return file;
  }

  int variables() {
    return variables;
  }

  /** Appends a clause. */
  @Override
  public void clause(int[] literals, int size) {
    try {
      for (int i = 0; i < size; i++) {
        require(LONGEST_LITERAL);
        append(literals[i]);
      }
      require(2);
      buffer.put((byte) '0').put((byte) '\n');
      clauses++;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private void require(int bytes) throws IOException {
    if (buffer.remaining() < bytes) {
      flush();
    }
  }

  private void flush() throws IOException {
    buffer.flip();
    while (buffer.hasRemaining()) {
      channel.write(buffer);
    }
    buffer.clear();
  }

  /** The literal and a blank. */
  private void append(int literal) {
    int rest = Math.abs(literal);
    if (literal < 0) {
      buffer.put((byte) '-');
    }
    int digits = 1;
    for (int power = rest / 10; power > 0; power /= 10) {
      digits++;
    }
    int end = buffer.position() + digits;
    for (int at = end - 1; at >= end - digits; at--) {
      buffer.put(at, (byte) ('0' + rest % 10));
      rest /= 10;
    }
    buffer.position(end);
    buffer.put((byte) ' ');
  }

  /** Writes what is not yet in the file, its header last. */
  void complete() throws IOException {
    flush();
    String header = "\np cnf " + variables + " " + clauses + "\n";
    String head = "c" + " ".repeat(HEAD - 1 - header.length()) + header;
    ByteBuffer bytes = ByteBuffer.wrap(head.getBytes(StandardCharsets.US_ASCII));
    while (bytes.hasRemaining()) {
      channel.write(bytes, bytes.position());
    }
  }

  /** The end of a formula, to which it can be cut back. */
  record End(long bytes, long clauses) {}

  End end() throws IOException {
    flush();
    return new End(channel.position(), clauses);
  }

  /** Takes away the clauses that were added after {@code end}. */
  void cutBack(End end) throws IOException {
    flush();
    channel.truncate(end.bytes()).position(end.bytes());
    clauses = end.clauses();
  }

  /**
   * The first clause that has no literal which the assignment makes true, counted from 1. Reads the
   * file as the solver read it, and no more than the buffers into memory.
   */
  OptionalLong firstFalse(Assignment assignment) throws IOException {
    try (InputStream in = new BufferedInputStream(Files.newInputStream(file), BUFFER)) {
      in.skipNBytes(HEAD);
      for (long clause = 1; clause <= clauses; clause++) {
        if (!holds(in, assignment)) {
          return OptionalLong.of(clause);
        }
      }
    }
    return OptionalLong.empty();
  }

  private static boolean holds(InputStream in, Assignment assignment) throws IOException {
    boolean holds = false;
    for (int literal = next(in); literal != 0; literal = next(in)) {
      holds |= assignment.makesTrue(literal);
    }
    return holds;
  }

  private static int next(InputStream in) throws IOException {
    int read = in.read();
    boolean isNegative = read == '-';
    if (isNegative) {
      read = in.read();
    }
    int literal = 0;
    while (read >= '0' && read <= '9') {
      literal = 10 * literal + read - '0';
      read = in.read();
    }
    if (read < 0) {
      throw new EOFException("the formula was cut off");
    }
    return isNegative ? -literal : literal;
  }

  @Override
  public void close() {
    try {
      channel.close();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
