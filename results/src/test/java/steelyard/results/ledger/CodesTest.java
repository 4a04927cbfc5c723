package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class CodesTest {

  @TempDir private Path folder;

  @Test
  void are_what_the_table_of_words_says() {
    List<String> words = new ArrayList<>();
    Path file = folder.resolve("ledger.db");
    Ledger.write(file, LedgerTest.NIGHTLY).close();
    try (Store store = Opening.toRead(file)) {
      store.scan(
          "SELECT kind, code, name FROM word",
          row -> words.add(row.getString(1) + " " + row.getInt(2) + " " + row.getString(3)));
    }

    List<String> expected = new ArrayList<>();
    for (Codes<?> codes :
        List.of(Codes.STATUS, Codes.ENDING, Codes.VERDICT, Codes.GOAL, Codes.MODE)) {
      for (int i = 0; i < codes.words().size(); i++) {
        expected.add(codes.kind() + " " + i + " " + codes.words().get(i));
      }
    }
    assertThat(words).containsExactlyInAnyOrderElementsOf(expected);
  }

  @Test
  void cover_every_word() {
    assertThat(Codes.STATUS.words()).containsExactlyInAnyOrder(Status.values());
    assertThat(Codes.ENDING.words()).containsExactlyInAnyOrder(Ending.values());
    assertThat(Codes.VERDICT.words()).containsExactlyInAnyOrder(Check.values());
    assertThat(Codes.GOAL.words()).containsExactlyInAnyOrder(Goal.Kind.values());
    assertThat(Codes.MODE.words()).containsExactlyInAnyOrder(Conditions.Mode.values());
    for (Ending ending : EnumSet.allOf(Ending.class)) {
      assertThat(Codes.ENDING.word(Codes.ENDING.of(ending))).isEqualTo(ending);
    }
  }
}
