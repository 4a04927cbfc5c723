package steelyard.harness.sweep;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.harness.sweep.text.SweepProblem;

/** Whatever a file holds, it is read or its mistakes are told; nothing else is ever thrown. */
class BrokenSweepTests {

  private static final int FILES = 120;

  private static final List<String> PIECES =
      List.of(
          "",
          " ",
          "\n",
          "\t",
          ":",
          ": ",
          "- ",
          "[",
          "]",
          "{",
          "}",
          "'",
          "\"",
          "#",
          "&a ",
          "*a",
          "!x ",
          "~",
          "null",
          "-1",
          "3.5",
          "1e9",
          "99999999999999999999",
          "plain+",
          " on ",
          "/",
          "?",
          "%",
          "\u0000",
          "\u00e9",
          "\uD83D\uDE00",
          "|\n",
          "---\n",
          "...\n",
          "<<: ");

  @TempDir Path folder;

  private int good;
  private int bad;

  private String mutated(UniformRandomProvider random, String text) {
    StringBuilder changed = new StringBuilder(text);
    for (int i = random.nextInt(3); i >= 0; i--) {
      int from = random.nextInt(changed.length());
      int to = Math.min(changed.length(), from + random.nextInt(6));
      changed.replace(from, to, PIECES.get(random.nextInt(PIECES.size())));
    }
    return changed.toString();
  }

  private void read(Path file, String text) {
    try {
      Files.writeString(file, text);
      Plan.of(SweepFile.read(folder.resolve("sweep.yaml"), Samples.catalogue()));
      good++;
    } catch (SweepProblem e) {
      bad++;
      assertThat(e.lines()).isNotEmpty().noneMatch(line -> line.contains("\n"));
    } catch (IOException | RuntimeException e) {
      fail("on this text:\n" + text, e);
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void tellsWhatIsWrong_inABrokenSweepFile(long seed) throws IOException {
    UniformRandomProvider random = new SplitMix64(seed);
    String text =
        Files.readString(Samples.resource("example.yaml"))
            .replace("folder: kiln", "folder: " + Samples.resource("kiln"));
    for (int i = 0; i < FILES; i++) {
      read(folder.resolve("sweep.yaml"), mutated(random, text));
    }
    assertThat(good).isPositive();
    assertThat(bad).isPositive();
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void tellsWhatIsWrong_inABrokenIndex(long seed) throws IOException {
    UniformRandomProvider random = new SplitMix64(seed);
    String text = Files.readString(Samples.resource("kiln/instances.csv"));
    for (String name : List.of("spring", "autumn")) {
      Files.createDirectory(folder.resolve(name));
    }
    for (String name :
        List.of("spring/a1", "spring/a2", "spring/b1", "autumn/11", "autumn/12", "autumn/20")) {
      Files.writeString(folder.resolve(name + ".txt"), name);
    }
    Files.writeString(
        folder.resolve("sweep.yaml"),
        "name: x\nfamily: kiln\nvariants: plain\nbackends: sat\ninstances: {folder: .}\n");
    for (int i = 0; i < FILES; i++) {
      read(folder.resolve("instances.csv"), mutated(random, text));
    }
    assertThat(good).isPositive();
    assertThat(bad).isPositive();
  }

  @Test
  void tellsWhatIsWrong_inARandomFile() {
    UniformRandomProvider random = new SplitMix64(7);
    for (int i = 0; i < FILES; i++) {
      StringBuilder text = new StringBuilder();
      for (int k = random.nextInt(40); k >= 0; k--) {
        text.append(PIECES.get(random.nextInt(PIECES.size())));
      }
      read(folder.resolve("sweep.yaml"), text.toString());
    }
  }
}
