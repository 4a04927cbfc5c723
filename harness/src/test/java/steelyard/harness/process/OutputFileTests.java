package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class OutputFileTests {
  @TempDir Path folder;
  private Path file;

  @BeforeEach
  void nameFile() {
    file = folder.resolve("stderr");
  }

  @Test
  void replaces_whatATerminalWouldObey() throws IOException {
    Files.writeString(file, "one\ttwo\n\u001b[31mred\u0007\u202e\u2028 grün \0end\n");

    assertThat(OutputFile.tail(file)).isEqualTo("one\ttwo\n?[31mred??? grün ?end");
  }

  @Test
  void replaces_bytes_thatAreNoText() throws IOException {
    Files.write(file, new byte[] {'a', (byte) 0xff, 'b'});

    assertThat(OutputFile.tail(file)).isEqualTo("a\ufffdb");
  }

  @Test
  void keeps_whole_lastLines_whenTheFileIsLong() throws IOException {
    Files.writeString(file, "a line of twenty by\n".repeat(1000) + "last");

    assertThat(OutputFile.tail(file)).startsWith("a line of").endsWith("\nlast");
    assertThat(OutputFile.tail(file).getBytes(StandardCharsets.UTF_8))
        .hasSizeBetween(OutputFile.TAIL_BYTES - 40, OutputFile.TAIL_BYTES);
  }

  @Test
  void is_empty_whenThereIsNoFile() {
    assertThat(OutputFile.tail(file)).isEmpty();
  }
}
