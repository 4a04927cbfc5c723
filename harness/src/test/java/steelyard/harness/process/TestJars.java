package steelyard.harness.process;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.jar.JarEntry;
import java.util.jar.JarOutputStream;

/** Jars made for a test. */
final class TestJars {
  private TestJars() {}

  /** A jar that holds one class of the tests. */
  static Path withClass(Path jar, Class<?> type) throws IOException {
    String name = type.getName().replace('.', '/') + ".class";
    try (InputStream in = type.getClassLoader().getResourceAsStream(name)) {
      return withFiles(jar, new TreeMap<>(Map.of(name, in.readAllBytes())));
    }
  }

  static Path withFiles(Path jar, SortedMap<String, byte[]> files) throws IOException {
    Files.createDirectories(jar.getParent());
    try (JarOutputStream out = new JarOutputStream(Files.newOutputStream(jar))) {
      for (var file : files.entrySet()) {
        out.putNextEntry(new JarEntry(file.getKey()));
        out.write(file.getValue());
      }
    }
    return jar;
  }
}
