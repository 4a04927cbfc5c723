package steelyard.adapters.cpsat;

import com.google.ortools.Loader;
import com.google.ortools.sat.SolveWrapper;
import java.util.Optional;

/**
 * The library's native half. It is taken from {@code -Djava.library.path} where it is there, else
 * unpacked into {@code java.io.tmpdir}.
 */
final class NativeLibrary {
  private NativeLibrary() {}

  /** Loads it, once in a process; answers in one line why that failed, if it did. */
  static Optional<String> load() {
    try {
      Loader.loadNativeLibraries();
      // The loader is silent where it cannot unpack: only a native call tells.
      new SolveWrapper().delete();
      return Optional.empty();
    } catch (UnsatisfiedLinkError | ExceptionInInitializerError | RuntimeException e) {
      return Optional.of(
          "cpsat cannot load the native library jniortools for "
              + System.getProperty("os.name")
              + " "
              + System.getProperty("os.arch")
              + " ("
              + reason(e)
              + "): put the ortools platform jar of that system on the class path and leave 150 MB"
              + " in java.io.tmpdir, or give its unpacked folder as -Djava.library.path");
    }
  }

  /** The root cause's first line; the loader names an object of the JVM's, which tells nothing. */
  private static String reason(Throwable thrown) {
    Throwable root = thrown;
    while (root.getCause() != null) {
      root = root.getCause();
    }
    String said = root.getMessage() == null ? root.getClass().getSimpleName() : root.getMessage();
    return said.lines().findFirst().orElse("").replaceFirst(" in ClassLoader .*", "");
  }
}
