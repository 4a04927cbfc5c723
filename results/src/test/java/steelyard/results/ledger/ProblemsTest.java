package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import org.jdbi.v3.core.ConnectionException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.sqlite.SQLiteErrorCode;
import org.sqlite.SQLiteException;

class ProblemsTest {

  private static final Path FILE = Path.of("ledger.db");

  @ParameterizedTest
  @CsvSource({
    "SQLITE_BUSY, another process keeps it locked",
    "SQLITE_BUSY_SNAPSHOT, another process keeps it locked",
    "SQLITE_READONLY, it can only be read",
    "SQLITE_READONLY_DIRECTORY, it can only be read",
    "SQLITE_IOERR_FSYNC, reading or writing failed",
    "SQLITE_CORRUPT, it is damaged",
    "SQLITE_FULL, the disk is full",
    "SQLITE_CANTOPEN, it cannot be opened",
    "SQLITE_NOTADB, not a ledger",
    "SQLITE_MISUSE, the database failed"
  })
  void say_what_is_wrong_by_the_databases_code(SQLiteErrorCode code, String expected) {
    Throwable failure = new ConnectionException(new SQLiteException("detail\nmore", code));

    assertThat(Problems.of(FILE, failure))
        .hasMessageStartingWith("ledger.db: " + expected)
        .hasMessageContaining("; ")
        .hasMessageNotContaining("\n");
  }

  @Test
  void keep_a_problem_that_is_told_already() {
    LedgerProblem told = new LedgerProblem("block 3: odd", "mend it");

    assertThat(Problems.of(FILE, new IllegalStateException(told))).isSameAs(told);
  }

  @Test
  void tell_of_a_failure_that_is_not_the_databases() {
    assertThat(Problems.of(FILE, new IllegalStateException("odd")))
        .hasMessage(
            "ledger.db: the database failed: odd; check the disk; the records in the run folders are"
                + " safe");
  }
}
