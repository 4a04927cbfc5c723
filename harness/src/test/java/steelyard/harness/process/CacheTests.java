package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CacheTests {
  private static final String USER = System.getProperty("user.name");

  @TempDir Path temporary;

  private CacheFolder locate(Map<String, String> environment, Path home) throws IOException {
    Path tmp = Files.createDirectories(temporary.resolve("tmp"));
    return CacheFolder.locate(environment, home, tmp, USER);
  }

  /**
   * XDG Base Directory Specification 0.8: the variable if it is set and absolute, else ~/.cache.
   */
  @Test
  void follows_the_standard_whereCachesGo() throws IOException {
    Path home = temporary.resolve("home");
    Path set = temporary.resolve("set");

    assertThat(locate(Map.of("XDG_CACHE_HOME", set.toString()), home))
        .isEqualTo(new CacheFolder(set.resolve("steelyard"), Optional.empty()));
    Path usual = home.resolve(".cache/steelyard");
    assertThat(locate(Map.of(), home).root()).isEqualTo(usual);
    assertThat(locate(Map.of("XDG_CACHE_HOME", ""), home).root()).isEqualTo(usual);
    assertThat(locate(Map.of("XDG_CACHE_HOME", "relative"), home).root()).isEqualTo(usual);
  }

  @Test
  void falls_back_toAFolderOfItsOwn_withOneWarning_whenTheUsualCannotBeWritten()
      throws IOException {
    Path file = Files.createFile(temporary.resolve("file"));
    CacheFolder cache = locate(Map.of("XDG_CACHE_HOME", file.toString()), temporary);

    assertThat(cache.root()).isEqualTo(temporary.resolve("tmp/steelyard-" + USER));
    assertThat(PosixFilePermissions.toString(Files.getPosixFilePermissions(cache.root())))
        .isEqualTo("rwx------");
    assertThat(cache.warning())
        .hasValueSatisfying(line -> assertThat(line).contains("set XDG_CACHE_HOME"));
    assertThat(locate(Map.of("XDG_CACHE_HOME", file.toString()), temporary)).isEqualTo(cache);
  }

  @Test
  void does_not_follow_aLink_thatSomebodyPlanted() throws IOException {
    Path file = Files.createFile(temporary.resolve("file"));
    Path tmp = Files.createDirectories(temporary.resolve("tmp"));
    Files.createSymbolicLink(tmp.resolve("steelyard-" + USER), temporary);
    CacheFolder cache = locate(Map.of("XDG_CACHE_HOME", file.toString()), temporary);

    assertThat(cache.root()).isNotEqualTo(tmp.resolve("steelyard-" + USER)).hasParent(tmp);
  }

  private Path nativesJar() throws IOException {
    TreeMap<String, byte[]> files = new TreeMap<>();
    files.put("natives-test/one.so", "one".getBytes(StandardCharsets.UTF_8));
    files.put("natives-test/two.so", "two, longer".getBytes(StandardCharsets.UTF_8));
    files.put("natives-test/deeper/three.so", new byte[0]);
    files.put("other/four.so", new byte[0]);
    return TestJars.withFiles(temporary.resolve("natives of a test.jar"), files);
  }

  private NativeCache natives() {
    return new NativeCache(new CacheFolder(temporary.resolve("my cache"), Optional.empty()));
  }

  @Test
  void unpacks_natives_onceForManyAtATime() throws IOException {
    Path jar = nativesJar();
    var folders = IntStream.range(0, 8).parallel().mapToObj(i -> unpacked(jar)).distinct().toList();

    assertThat(folders).singleElement().asString().contains("natives-test-");
    try (var files = Files.list(folders.get(0))) {
      assertThat(files.map(file -> file.getFileName().toString()))
          .containsExactlyInAnyOrder("one.so", "two.so");
    }
    assertThat(folders.get(0).resolve("two.so")).hasContent("two, longer");
  }

  private Path unpacked(Path jar) {
    try {
      return natives().unpacked(jar, "natives-test");
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Test
  void puts_back_whatIsTornOrMissing() throws IOException {
    Path jar = nativesJar();
    Path folder = unpacked(jar);
    Files.writeString(folder.resolve("one.so"), "o");
    Files.delete(folder.resolve("two.so"));
    unpacked(jar);

    assertThat(folder.resolve("one.so")).hasContent("one");
    assertThat(folder.resolve("two.so")).hasContent("two, longer");
  }

  @Test
  void keeps_two_builds_ofALibraryApart() throws IOException {
    Path jar = nativesJar();
    Path first = unpacked(jar);
    TreeMap<String, byte[]> files = new TreeMap<>();
    files.put("natives-test/one.so", "ONE".getBytes(StandardCharsets.UTF_8));
    TestJars.withFiles(jar, files);

    assertThat(unpacked(jar)).isNotEqualTo(first);
    assertThat(first.resolve("one.so")).hasContent("one");
  }

  @Test
  void refuses_jar_withoutNatives() throws IOException {
    Path jar = nativesJar();

    assertThatThrownBy(() -> natives().unpacked(jar, "elsewhere"))
        .isInstanceOf(IOException.class)
        .hasMessage("jar " + jar + " holds no files in elsewhere");
  }
}
