package steelyard.adapters.sat.encoding;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.util.List;
import org.junit.jupiter.api.Test;
import steelyard.adapters.spi.SmallModels;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Model;

/** The text of a formula, line for line. */
class DimacsTextTest {
  /**
   * Comments, counts, a clause a line ended by 0: DIMACS (1993), "Satisfiability Suggested Format".
   */
  @Test
  void writesExactCounts_andWhatLiteralsMean() throws IOException {
    Clause clause = Clause.of(Atom.is(0, 4), Atom.atMost(1, 0));
    Model model = SmallModels.of(List.of(Domain.of(1, 4, 9), Domain.BOOLEAN), List.of(clause));
    ModelEncoder encoder = new ModelEncoder(model, 100, ClauseSink.NONE, Limits.NONE);
    encoder.encode();
    StringBuilder text = new StringBuilder();
    DimacsText.write(model, encoder, encoder.sizes(), text);
    assertThat(text.toString().lines())
        .containsExactly(
            "c variable x0 in 1 4 9: 1 says >= 4 .. 2 says >= 9",
            "c   4 says = 4",
            "c variable x1 in 0..1: 3 says >= 1",
            "c clauses 1..1: domains",
            "c clauses 2..5: asserted[0]",
            "p cnf 4 5",
            "-2 1 0",
            "-4 1 0",
            "-4 -2 0",
            "4 -1 2 0",
            "4 -3 0");
  }
}
