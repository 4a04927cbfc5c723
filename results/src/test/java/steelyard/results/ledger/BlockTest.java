package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.util.List;
import org.junit.jupiter.api.Test;

class BlockTest {

  @Test
  void is_of_one_instance() {
    Cell here = Sample.run("any0").cell(0);
    Cell elsewhere = Sample.run("any0").instance("week-08").cell(1);

    assertThat(new Block(0, 0, List.of(here)).instance().name()).isEqualTo("week-07");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Block(4, 0, List.of(here, elsewhere)))
        .withMessage("block 4 has cells of two instances: 'week-07' and 'week-08'");
  }

  @Test
  void has_one_cell_at_each_position() {
    Cell cell = Sample.run("any0").cell(0);

    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Block(4, 0, List.of(cell, cell)))
        .withMessage("block 4 has two cells at position 0");
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Block(4, 0, List.of()))
        .withMessage("block 4 has no cells");
  }
}
