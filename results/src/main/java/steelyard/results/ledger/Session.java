package steelyard.results.ledger;

import java.time.Instant;
import java.util.SortedMap;

/**
 * One stretch of a harness at work on one machine.
 *
 * @param id the session's id
 * @param harness the harness's version
 * @param machineClass machines of one class are taken as equally fast
 * @param machine facts of the machine, such as processor, cores, memory, kernel
 * @param launch how workers were launched: JDK build, flags, archive
 * @param started when it began
 */
public record Session(
    String id,
    String harness,
    String machineClass,
    SortedMap<String, String> machine,
    SortedMap<String, String> launch,
    Instant started) {
  public Session {
    Text.requireId("session", id);
    Text.require("harness", harness);
    Text.requireName("machineClass", machineClass);
    machine = Sorted.copy("machine", machine);
    launch = Sorted.copy("launch", launch);
    Text.require("started", started);
  }
}
