package steelyard.adapters.spi;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;

/** Starts programs for tests of adapters, as a worker would. */
public final class TestPrograms implements Programs, AutoCloseable {
  private final Path folder;

  public TestPrograms(Path folder) {
    this.folder = folder;
  }

  /** In a new folder, which goes when this is closed. */
  public static TestPrograms inTemporaryFolder() {
    try {
      return new TestPrograms(Files.createTempDirectory("programs"));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Override
  public void close() {
    try (Stream<Path> files = Files.list(folder)) {
      for (Path file : files.toList()) {
        Files.delete(file);
      }
      Files.delete(folder);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @Override
  public Path folder() {
    return folder;
  }

  @Override
  public Optional<Path> find(String program) {
    return Stream.of("", "/usr/local/bin/", "/usr/bin/", "/bin/")
        .map(place -> Path.of(place + program))
        .filter(path -> path.isAbsolute() && Files.isExecutable(path))
        .findFirst();
  }

  @Override
  public Ended run(Call call, Deadline deadline) throws IOException {
    Process process =
        new ProcessBuilder(call.command())
            .directory(folder.toFile())
            .redirectOutput(call.output().toFile())
            .redirectError(call.errors().toFile())
            .start();
    try {
      Ended.How how = await(process, call, deadline);
      process.descendants().forEach(ProcessHandle::destroyForcibly);
      int code = process.destroyForcibly().waitFor();
      return new Ended(how, code, Files.readString(call.errors()));
    } catch (InterruptedException e) {
      throw new IOException(e);
    }
  }

  private static Ended.How await(Process process, Call call, Deadline deadline)
      throws IOException, InterruptedException {
    while (!process.waitFor(5, TimeUnit.MILLISECONDS)) {
      if (deadline.stopAsked()) {
        return Ended.How.STOPPED;
      }
      if (Files.size(call.output()) > call.mostOutputBytes()) {
        return Ended.How.WROTE_TOO_MUCH;
      }
    }
    return Ended.How.ITSELF;
  }
}
