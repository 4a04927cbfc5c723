package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.File;
import java.lang.reflect.Method;
import java.net.MalformedURLException;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Refusal;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Model;

/** Where the library, or its native half, is not on the class path, one line says so. */
class MissingLibraryTest {
  @Test
  void namesTheNativeLibrary_whenItsJarIsMissing() throws Exception {
    assertThat(without("ortools-(linux|darwin|win32).*", "reason"))
        .contains("jniortools", "class path", "-Djava.library.path")
        .doesNotContain("\n");
  }

  @Test
  void namesTheLibrary_whenItsJarIsMissing() throws Exception {
    assertThat(without("ortools-java.*", "reason"))
        .contains("ortools-java", "class path")
        .doesNotContain("\n");
  }

  @Test
  void describesItself_whenTheLibraryIsMissing() throws Exception {
    assertThat(without("ortools-java.*", "version")).isEqualTo("not installed");
    assertThat(version()).startsWith("9.");
  }

  /** Calls a method below on a class path without the jars of that name. */
  private static String without(String jar, String method) throws Exception {
    List<URL> kept = new ArrayList<>();
    int left = 0;
    for (String entry : System.getProperty("java.class.path").split(File.pathSeparator, -1)) {
      if (Pattern.matches(jar, Path.of(entry).getFileName().toString())) {
        left++;
      } else {
        kept.add(url(entry));
      }
    }
    assertThat(left).as("jars like %s on the class path", jar).isPositive();
    URL[] urls = kept.toArray(URL[]::new);
    try (URLClassLoader loader = new URLClassLoader(urls, ClassLoader.getPlatformClassLoader())) {
      Class<?> again = loader.loadClass(MissingLibraryTest.class.getName());
      Method called = again.getDeclaredMethod(method);
      called.setAccessible(true);
      return (String) called.invoke(null);
    }
  }

  private static URL url(String entry) throws MalformedURLException {
    return Path.of(entry).toUri().toURL();
  }

  static String version() {
    return new CpSatBackend().describe().version();
  }

  static String reason() {
    Model model = Solving.flat(List.of(Domain.BOOLEAN), List.of(), Optional.empty());
    Lowered lowered =
        new CpSatBackend()
            .lower(model, Solving.request(Map.of(), 1, Limit.none()), new Recording());
    return ((Refusal) lowered).reason();
  }
}
