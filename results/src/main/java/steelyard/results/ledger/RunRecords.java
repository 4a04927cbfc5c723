package steelyard.results.ledger;

import static java.nio.charset.StandardCharsets.UTF_8;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;

/**
 * Reads and writes run records as JSON.
 *
 * <p>The file is pure ASCII and keeps every {@code long} as a plain JSON integer, exact for this
 * program and for every reader with 64-bit integers. {@link #export} is for readers that keep
 * numbers as doubles: there, integers beyond 2^53 in magnitude are strings.
 */
public final class RunRecords {

  /** The record's name within its run's folder. */
  public static final String FILE_NAME = "record.json";

  private static final String BESIDE = FILE_NAME + ".tmp";

  private RunRecords() {}

  /**
   * Makes a run's record durable: when this returns, the record survives a kill and a power cut;
   * before, the folder has no record at all.
   *
   * @param folder the run's folder, which exists
   * @return the record's file
   * @throws LedgerProblem if it cannot be written
   */
  public static Path write(Path folder, RunRecord record) {
    Path beside = folder.resolve(BESIDE);
    Path file = folder.resolve(FILE_NAME);
    try {
      writeDurably(beside, RecordJson.pretty(record));
      Files.move(beside, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
      syncFolder(folder);
      return file;
    } catch (IOException e) {
      throw new LedgerProblem(
          "%s: the run's record cannot be written: %s".formatted(file, Reasons.of(e)),
          "make room or allow writing there, then run it again",
          e);
    }
  }

  /**
   * Reads a record's file.
   *
   * @throws LedgerProblem if it is missing, cannot be read or is not a record
   */
  public static RunRecord read(Path file) {
    try {
      return fromJson(Files.readString(file, UTF_8), file.toString());
    } catch (NoSuchFileException e) {
      throw new LedgerProblem(file + ": there is no record", "the run has not finished", e);
    } catch (IOException e) {
      throw new LedgerProblem(
          "%s: cannot be read: %s".formatted(file, Reasons.of(e)), "check the file", e);
    }
  }

  /** The record as one line of JSON, from which {@link #fromJson} makes an equal one. */
  public static String toJson(RunRecord record) {
    return RecordJson.compact(record);
  }

  /** The record as indented JSON in which integers beyond 2^53 are strings. */
  public static String export(RunRecord record) {
    return RecordJson.export(record);
  }

  /**
   * The record that this JSON says.
   *
   * @param where what to call the text in a message
   * @throws LedgerProblem if it is not a record: a property is unknown, missing or of a wrong kind
   */
  public static RunRecord fromJson(String json, String where) {
    return RecordJson.parse(json, where);
  }

  private static void writeDurably(Path file, String text) throws IOException {
    try (FileChannel channel =
        FileChannel.open(
            file,
            StandardOpenOption.CREATE,
            StandardOpenOption.TRUNCATE_EXISTING,
            StandardOpenOption.WRITE)) {
      ByteBuffer bytes = ByteBuffer.wrap(text.getBytes(UTF_8));
      while (bytes.hasRemaining()) {
        channel.write(bytes);
      }
      channel.force(true);
    }
  }

  /** The move itself is durable only once the folder is. */
  private static void syncFolder(Path folder) throws IOException {
    try (FileChannel channel = FileChannel.open(folder, StandardOpenOption.READ)) {
      channel.force(true);
    }
  }
}
