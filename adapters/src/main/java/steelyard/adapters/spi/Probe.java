package steelyard.adapters.spi;

import java.nio.file.Path;
import java.util.Objects;

/** Whether the program that a backend would start can be used. */
public sealed interface Probe permits Probe.Usable, Refusal {
  /**
   * It was found and answered as it should.
   *
   * @param program its executable file
   * @param version what it says of itself, in one line
   */
  record Usable(Path program, String version) implements Probe {
    public Usable {
      Objects.requireNonNull(program, "program");
      Objects.requireNonNull(version, "version");
    }
  }
}
