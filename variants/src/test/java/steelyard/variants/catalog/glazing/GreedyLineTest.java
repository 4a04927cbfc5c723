package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import java.util.OptionalLong;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class GreedyLineTest {
  @TempDir private Path folder;

  @Test
  void takes_what_is_most_in_demand_where_it_breaks_no_rule() {
    GlazeLine line = Lines.read(folder, "5 1 2", "1", "2", "0 3 0", "1 2 1");
    assertThat(GreedyLine.of(line)).containsExactly(1, 0, 1, 0, 0);
  }

  @Test
  void breaks_a_rule_rather_than_to_stop() {
    GlazeLine line = Lines.read(folder, "2 1 1", "1", "2", "0 2 1");
    assertThat(GreedyLine.of(line)).containsExactly(0, 0);
    assertThat(GreedyLine.cost(line)).isEmpty();
  }

  @Test
  void prefers_what_costs_less() {
    GlazeLine line =
        Lines.read(
            folder, "4 1 2", "1", "2", "0 2 0", "1 2 1", "glaze 0 1", "change 3", "excess 2");
    assertThat(GreedyLine.of(line)).containsExactly(1, 1, 0, 0);
    assertThat(GreedyLine.cost(line)).isEqualTo(OptionalLong.of(5));
  }

  @Test
  void orders_all_tiles_of_any_line() {
    LongStream.range(0, 100)
        .mapToObj(RandomLine::of)
        .forEach(
            line -> {
              List<Integer> kinds = GreedyLine.of(line);
              for (int k = 0; k < line.kinds().size(); k++) {
                int kind = k;
                assertThat(kinds.stream().filter(each -> each == kind))
                    .hasSize(line.kinds().get(k).tiles());
              }
            });
  }
}
