package steelyard.adapters.cpsat;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Optional;
import java.util.Properties;
import java.util.Set;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Description;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.SolveRequest;
import steelyard.variants.model.Model;

/**
 * The CP-SAT solver of OR-tools. A model's branching is followed as long as its phases have an
 * equivalent; from the first phase by weighted degree on, the solver's own search decides.
 */
public final class CpSatBackend implements Backend {
  /** Share of the memory that the Java heap gets: the solver itself is native. */
  private static final double HEAP_SHARE = 0.2;

  private static final String COORDINATES =
      "/META-INF/maven/com.google.ortools/ortools-java/pom.properties";

  @Override
  public Description describe() {
    return new Description(
        "cpsat",
        version(),
        true,
        false,
        Set.of(Goal.Satisfy.class, Goal.Optimise.class, Goal.Enumerate.class),
        WorkUnits.all(),
        CpSatSettings.all(),
        HEAP_SHARE);
  }

  /** The version of the library on the class path, asked of its jar and not of its code. */
  private static String version() {
    try (InputStream in = CpSatBackend.class.getResourceAsStream(COORDINATES)) {
      if (in == null) {
        return "not installed";
      }
      Properties coordinates = new Properties();
      coordinates.load(in);
      return coordinates.getProperty("version", "unknown");
    } catch (IOException e) {
      throw new UncheckedIOException("cannot read " + COORDINATES, e);
    }
  }

  @Override
  public Optional<Refusal> load() {
    try {
      return NativeLibrary.load().map(Refusal::new);
    } catch (LinkageError e) {
      return Optional.of(unfit(e));
    }
  }

  @Override
  public Lowered lower(Model model, SolveRequest request, Monitor monitor) {
    try {
      return CpSatLowering.of(model, request, monitor);
    } catch (LinkageError e) {
      return unfit(e);
    }
  }

  private static Refusal unfit(LinkageError e) {
    return new Refusal(
        "cpsat needs ortools-java 9.15 on the class path, where version "
            + version()
            + " does not fit ("
            + e
            + "): add the library, or take another backend");
  }
}
