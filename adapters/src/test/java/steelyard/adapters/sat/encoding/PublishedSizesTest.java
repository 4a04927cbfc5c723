package steelyard.adapters.sat.encoding;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.adapters.spi.Sizes;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.ModelBuilder;

/** Numbers of variables, clauses and literals that the sources of the encodings give. */
class PublishedSizesTest {
  private final Clauses clauses = new Clauses();
  private final Cnf cnf = new Cnf(clauses, Limits.NONE);

  /** Tamura et al. (2009): a domain of d values has d - 1 literals and d - 2 clauses. */
  @ParameterizedTest
  @CsvSource({"1, 0, 0", "2, 1, 0", "3, 2, 1", "10, 9, 8", "1000, 999, 998"})
  void orderEncoding_ofDValues(int d, int variables, int axioms) {
    new Integers(cnf).add(0, Domain.between(5, 4 + d));
    assertThat(cnf.variables()).isEqualTo(variables);
    assertThat(cnf.clauses()).isEqualTo(axioms);
  }

  /**
   * Sinz (2005), LT-SEQ: k(n - 1) auxiliary variables, 2nk + n - 3k - 1 clauses; the literals are
   * counted from the clauses in the paper.
   */
  @ParameterizedTest
  @CsvSource({
    "4, 1, 3, 8, 16", "10, 1, 9, 26, 52", "100, 1, 99, 296, 592", "5, 2, 8, 18, 38",
    "5, 3, 12, 25, 54", "5, 4, 16, 32, 70", "8, 2, 14, 33, 71", "8, 3, 21, 46, 102",
    "10, 2, 18, 43, 93", "20, 3, 57, 130, 294", "50, 3, 147, 340, 774"
  })
  void sequentialCounter_ofSinz(int n, int most, int auxiliary, int size, int literals) {
    new Cardinality(cnf).counter(inputs(n), most, Cnf.TRUE);
    assertThat(cnf.variables() - n).isEqualTo(auxiliary);
    assertThat(cnf.clauses()).isEqualTo(size).isEqualTo(2L * n * most + n - 3L * most - 1);
    assertThat(cnf.literals()).isEqualTo(literals).isEqualTo(clauses.literals());
  }

  /** n(n - 1)/2 clauses, no auxiliary variable: common practice. */
  @ParameterizedTest
  @CsvSource({"4, 6, 12", "10, 45, 90", "100, 4950, 9900"})
  void pairwise(int n, int size, int literals) {
    new Cardinality(cnf).pairwise(inputs(n), Cnf.TRUE);
    assertThat(cnf.variables()).isEqualTo(n);
    assertThat(cnf.clauses()).isEqualTo(size);
    assertThat(cnf.literals()).isEqualTo(literals);
  }

  /**
   * Bailleux &amp; Boufkhad (2003): a node over p1 and p2 leaves has p1 + p2 outputs and 2((p1 +
   * 1)(p2 + 1) - 1) clauses.
   */
  @ParameterizedTest
  @CsvSource({
    "2, 2, 6",
    "4, 8, 28",
    "5, 12, 44",
    "6, 16, 62",
    "7, 20, 82",
    "8, 24, 104",
    "16, 64, 368",
    "20, 88, 556",
    "32, 160, 1312",
    "50, 286, 3022",
    "100, 672, 11244",
    "128, 896, 18048"
  })
  void totalizer_ofBailleuxAndBoufkhad(int n, int auxiliary, int size) {
    new Cardinality(cnf).totalizer(inputs(n), n);
    assertThat(cnf.variables() - n).isEqualTo(auxiliary);
    assertThat(cnf.clauses()).isEqualTo(size);
  }

  /**
   * x + y &le; 7 over 2..6 is y &le; 5, x &le; 2 or y &le; 4, x &le; 3 or y &le; 3, x &le; 4 or y
   * &le; 2, x &le; 5: Tamura et al. (2009), recalled from memory.
   */
  @Test
  void orderClauses_ofTwoTerms() {
    Integers integers = new Integers(cnf);
    integers.add(0, Domain.between(2, 6));
    integers.add(1, Domain.between(2, 6));
    long size = cnf.clauses();
    long literals = cnf.literals();
    LinearSum sum = new LinearSum(Ints.of(0, 1), Longs.of(1, 1), 0);
    new LinearEncoder(cnf, integers, 0).encode(new Linear(sum, Comparison.LE, 7), Cnf.TRUE);
    assertThat(cnf.clauses() - size).isEqualTo(5);
    assertThat(cnf.literals() - literals).isEqualTo(8);
    assertThat(cnf.variables()).isEqualTo(8);
  }

  /**
   * The pigeonhole formulas of Cook &amp; Reckhow (1979), JSL 44(1):36-50: n(n + 1) variables and
   * (n + 1) + n·n(n + 1)/2 clauses.
   */
  @ParameterizedTest
  @CsvSource({"2, 6, 9, 18", "3, 12, 22, 48", "4, 20, 45, 100"})
  void pigeonhole(int holes, int variables, int size, int literals) {
    Model model =
        ModelBuilder.of(
            draft -> {
              List<List<IntVar>> in = new ArrayList<>();
              for (int p = 0; p <= holes; p++) {
                int pigeon = p;
                in.add(
                    IntStream.range(0, holes)
                        .mapToObj(h -> draft.integer("p" + pigeon + "h" + h, Domain.BOOLEAN))
                        .toList());
                draft
                    .group("pigeon")
                    .post(
                        Formula.any(
                            in.get(p).stream()
                                .map(b -> Formula.literal(Atom.is(b.id(), 1)))
                                .toList()));
              }
              for (int h = 0; h < holes; h++) {
                int hole = h;
                draft
                    .group("hole")
                    .post(Term.sum(in.stream().map(row -> row.get(hole)).toList()).le(1));
              }
            });
    ModelEncoder encoder = new ModelEncoder(model, 1_000, clauses, Limits.NONE);
    encoder.encode();
    Sizes sizes = encoder.sizes();
    assertThat(sizes.totals())
        .containsEntry("variables", (long) variables)
        .containsEntry("clauses", (long) size)
        .containsEntry("literals", (long) literals);
    assertThat(sizes.byPosting().stream().sum()).isEqualTo(size);
  }

  private Literals inputs(int n) {
    int first = cnf.variables(n);
    return Literals.of(IntStream.range(first, first + n).toArray());
  }
}
