package steelyard.harness.process;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/**
 * What is needed to find the processes of one child again; in a file, a key and a value a line.
 *
 * @param run names the run to a reader
 * @param tag in the environment of its processes
 * @param host and {@code boot}: where pids mean what they say
 * @param owner the harness that started it
 * @param first the first process, once it is started
 * @param earliestTicks no process of the child was started before
 */
record LiveNote(
    String run,
    String tag,
    String host,
    String boot,
    ProcessId owner,
    Optional<ProcessId> first,
    long earliestTicks) {

  LiveNote with(ProcessId started) {
    return new LiveNote(run, tag, host, boot, owner, Optional.of(started), earliestTicks);
  }

  String fileName() {
    return tag.replace('/', '_') + LiveTable.SUFFIX;
  }

  /** Written beside and moved, so that a note is whole or not there. */
  void write(Path folder) throws IOException {
    StringBuilder text = new StringBuilder();
    text.append("run ").append(run).append('\n');
    text.append("tag ").append(tag).append('\n');
    text.append("host ").append(host).append('\n');
    text.append("boot ").append(boot).append('\n');
    append(text, "owner", owner);
    first.ifPresent(id -> append(text, "first", id));
    text.append("earliest ").append(earliestTicks).append('\n');
    Path beside = folder.resolve(fileName() + ".new");
    Files.writeString(beside, text);
    Files.move(beside, folder.resolve(fileName()), StandardCopyOption.ATOMIC_MOVE);
  }

  private static void append(StringBuilder text, String key, ProcessId id) {
    text.append(key).append(' ').append(id.pid()).append('@').append(id.startTicks()).append('\n');
  }

  /** Empty if the file has gone or is not a note. */
  static Optional<LiveNote> read(Path file) {
    try {
      Map<String, String> fields = new TreeMap<>();
      for (String line : Files.readAllLines(file, StandardCharsets.UTF_8)) {
        int space = line.indexOf(' ');
        fields.put(line.substring(0, space), line.substring(space + 1));
      }
      return parse(fields);
    } catch (IOException | IndexOutOfBoundsException | NumberFormatException e) {
      return Optional.empty();
    }
  }

  private static Optional<LiveNote> parse(Map<String, String> fields) {
    for (String key : new String[] {"run", "tag", "host", "boot", "owner", "earliest"}) {
      if (!fields.containsKey(key)) {
        return Optional.empty();
      }
    }
    return Optional.of(
        new LiveNote(
            fields.get("run"),
            fields.get("tag"),
            fields.get("host"),
            fields.get("boot"),
            id(fields.get("owner")),
            Optional.ofNullable(fields.get("first")).map(LiveNote::id),
            Long.parseLong(fields.get("earliest"))));
  }

  private static ProcessId id(String text) {
    int at = text.indexOf('@');
    return new ProcessId(
        Long.parseLong(text.substring(0, at)), Long.parseLong(text.substring(at + 1)));
  }
}
