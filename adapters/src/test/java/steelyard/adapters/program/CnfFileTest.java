package steelyard.adapters.program;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.IntStream;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CnfFileTest {
  @TempDir Path folder;

  private CnfFile create(int variables) throws IOException {
    return CnfFile.create(folder.resolve("a formula.cnf"), variables);
  }

  private static void add(CnfFile file, int... literals) {
    file.clause(literals, literals.length);
  }

  /** All but the comment that makes room. */
  private List<String> lines(CnfFile file) throws IOException {
    file.complete();
    List<String> lines = Files.readAllLines(file.path());
    assertThat(lines.get(0)).matches("c *");
    return lines.subList(1, lines.size());
  }

  @Test
  void writes_exact_counts_andOneClauseALine() throws IOException {
    try (CnfFile file = create(2_000_000_000)) {
      assertThat(lines(file)).containsExactly("p cnf 2000000000 0");
      add(file, 1, -2, 2_000_000_000);
      add(file, -2_000_000_000);
      add(file);
      assertThat(lines(file))
          .containsExactly("p cnf 2000000000 3", "1 -2 2000000000 0", "-2000000000 0", "0");
    }
  }

  @Test
  void takes_back_clauses_andGoesOn() throws IOException {
    try (CnfFile file = create(3)) {
      add(file, 1, 2);
      CnfFile.End end = file.end();
      IntStream.range(0, 100_000).forEach(i -> add(file, -3));
      assertThat(lines(file)).hasSize(100_002).startsWith("p cnf 3 100001", "1 2 0", "-3 0");
      file.cutBack(end);
      assertThat(lines(file)).containsExactly("p cnf 3 1", "1 2 0");
      add(file, 3);
      assertThat(lines(file)).containsExactly("p cnf 3 2", "1 2 0", "3 0");
    }
  }

  @Test
  void replaces_what_the_file_held() throws IOException {
    try (CnfFile file = create(1)) {
      IntStream.range(0, 1_000).forEach(i -> add(file, 1));
      file.complete();
    }
    try (CnfFile file = create(1)) {
      assertThat(lines(file)).containsExactly("p cnf 1 0");
    }
  }

  @Test
  void finds_the_first_clause_thatAnAssignmentDoesNotSatisfy() throws IOException {
    UniformRandomProvider random = new SplitMix64(11);
    int variables = 20;
    Assignment assignment = new Assignment(variables);
    IntStream.rangeClosed(1, variables)
        .filter(v -> v % 5 != 0)
        .forEach(v -> assignment.put(random.nextBoolean() ? v : -v));
    try (CnfFile file = create(variables)) {
      long falsified = 0;
      for (int c = 1; c <= 5_000 && falsified == 0; c++) {
        int[] clause =
            random.ints(8, 1, variables + 1).map(v -> random.nextBoolean() ? v : -v).toArray();
        add(file, clause);
        boolean holds = IntStream.of(clause).anyMatch(assignment::makesTrue);
        falsified = holds ? 0 : c;
        file.complete();
        assertThat(file.firstFalse(assignment).orElse(0)).isEqualTo(falsified);
      }
      assertThat(falsified).isPositive();
    }
  }

  @Test
  void finds_an_empty_clause_false() throws IOException {
    try (CnfFile file = create(1)) {
      add(file);
      file.complete();
      assertThat(file.firstFalse(new Assignment(1))).hasValue(1);
    }
  }
}
