package steelyard.results.ledger;

/**
 * Which solver in which version through which code.
 *
 * @param name the backend's name in the sweep file
 * @param adapter the adapter's name: the technology, by which agreement is counted
 * @param version the version that the solver gives of itself
 * @param code digest of the adapter's code, its libraries, natives or program
 */
public record BackendBuild(String name, String adapter, String version, Digest code) {
  public BackendBuild {
    Text.requireName("backend name", name);
    Text.requireName("adapter", adapter);
    Text.require("version", version);
    Text.require("backend code", code);
  }
}
