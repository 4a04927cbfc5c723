package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.sql.Connection;
import java.sql.DriverManager;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.condition.DisabledIf;
import org.junit.jupiter.api.condition.EnabledOnOs;
import org.junit.jupiter.api.condition.OS;
import org.junit.jupiter.api.io.TempDir;
import org.sqlite.SQLiteConfig;

class LedgerTest {

  static final Holder NIGHTLY = new Holder(4711, "sweep nightly", Sample.MIDNIGHT);

  @TempDir private Path folder;
  private Path file;

  @BeforeEach
  void name() {
    file = folder.resolve("ledger.db");
  }

  @Test
  void keeps_what_was_written_given_it_is_opened_again() {
    RunRecord record = Sample.run("3fa2c9d1").record();
    try (Ledger ledger = Ledger.write(file, NIGHTLY)) {
      ledger.runs().collect(record);
    }

    try (Ledger ledger = Ledger.read(file)) {
      assertThat(ledger.runs().record("3fa2")).isEqualTo(record);
    }
    try (Ledger ledger = Ledger.write(file, NIGHTLY)) {
      assertThat(ledger.runs().record("3fa2")).isEqualTo(record);
    }
  }

  @Test
  void makes_the_folders_on_its_way_and_bears_odd_names() {
    Path odd = folder.resolve("kiln house").resolve("what?#50%+é.db");
    try (Ledger ledger = Ledger.write(odd, NIGHTLY)) {
      ledger.runs().collect(Sample.run("3fa2c9d1").record());
    }

    assertThat(odd).isRegularFile();
    try (Ledger ledger = Ledger.read(odd)) {
      assertThat(ledger.runs().resolve("3fa2")).isEqualTo("3fa2c9d1");
    }
  }

  @Test
  void is_read_while_another_writes() {
    try (Ledger writer = Ledger.write(file, NIGHTLY);
        Ledger reader = Ledger.read(file)) {
      writer.runs().collect(Sample.run("3fa2c9d1").record());

      assertThat(reader.runs().resolve("3fa2")).isEqualTo("3fa2c9d1");
    }
  }

  @Test
  void cannot_be_written_to_given_it_was_opened_for_reading() {
    Ledger.write(file, NIGHTLY).close();

    try (Ledger reader = Ledger.read(file)) {
      RunRecord record = Sample.run("3fa2c9d1").record();
      assertThatThrownBy(() -> reader.runs().collect(record))
          .isInstanceOf(LedgerProblem.class)
          .hasMessageStartingWith(file + ": it can only be read; ");
    }
  }

  @Test
  void tells_a_second_writer_who_holds_it_and_lets_it_in_afterwards() {
    Holder second = new Holder(4712, "sweep weekly", Sample.MIDNIGHT);
    try (Ledger first = Ledger.write(file, NIGHTLY)) {
      for (int i = 0; i < 2; i++) {
        assertThatThrownBy(() -> Ledger.write(file, second))
            .isInstanceOf(LedgerProblem.class)
            .hasMessage(
                file
                    + ": in use by process 4711, sweep nightly, since 2026-03-02T00:00:00Z;"
                    + " wait until it ends, or name another ledger");
      }
      assertThat(first.plans().sweeps()).isEmpty();
    }

    Ledger.write(file, second).close();
  }

  @Test
  @Timeout(60)
  void tells_a_second_process_who_holds_it_and_lets_it_in_when_that_was_killed() throws Exception {
    Process other =
        new ProcessBuilder(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-cp",
                System.getProperty("java.class.path"),
                LedgerHolder.class.getName(),
                file.toString())
            .redirectError(ProcessBuilder.Redirect.DISCARD)
            .start();
    try (var said = other.inputReader()) {
      assertThat(said.readLine()).isEqualTo("held");
      assertThatThrownBy(() -> Ledger.write(file, NIGHTLY))
          .isInstanceOf(LedgerProblem.class)
          .hasMessageContaining(": in use by process " + other.pid() + ", sweep elsewhere, since ");
    } finally {
      other.destroyForcibly().waitFor(30, TimeUnit.SECONDS);
    }

    try (Ledger ledger = Ledger.write(file, NIGHTLY)) {
      assertThat(ledger.runs().resolve("5e11")).isEqualTo("5e11c9d1");
    }
  }

  @Test
  void says_so_given_no_ledger_to_read() {
    assertThatThrownBy(() -> Ledger.read(file))
        .isInstanceOf(LedgerProblem.class)
        .hasMessage(file + ": there is no ledger; run a sweep first, or name another file");
    assertThat(file).doesNotExist();
  }

  @Test
  void says_so_given_an_empty_file_to_read_and_fills_it_given_it_is_to_be_written()
      throws IOException {
    Files.createFile(file);

    assertThatThrownBy(() -> Ledger.read(file))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageContaining("the file is empty");
    Ledger.write(file, NIGHTLY).close();
    Ledger.read(file).close();
  }

  @Test
  void says_so_given_another_kind_of_file() throws IOException {
    Files.writeString(file, "Fire the kiln at 1060 degrees. ".repeat(100));

    assertRefused("not a ledger; name another file");
    assertThat(file).content().startsWith("Fire the kiln");
  }

  @Test
  void says_so_given_another_programs_database() throws SQLException {
    execute("CREATE TABLE glaze (name TEXT)");

    assertRefused("not a ledger but another program's database; name another file");
  }

  @Test
  void says_so_given_a_folder() throws IOException {
    Files.createDirectory(file);

    assertThatThrownBy(() -> Ledger.write(file, NIGHTLY))
        .isInstanceOf(LedgerProblem.class)
        .hasMessage(file + ": a folder, not a file; name a file for the ledger");
    assertThatThrownBy(() -> Ledger.read(file)).isInstanceOf(LedgerProblem.class);
  }

  @Test
  void says_so_given_a_file_in_place_of_a_folder() throws IOException {
    Files.createFile(file);
    Path below = file.resolve("ledger.db");

    assertThatThrownBy(() -> Ledger.write(below, NIGHTLY))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith(below + ": a file stands where a folder is needed; ");
    assertThatThrownBy(() -> Ledger.read(below))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith(below + ": there is no ledger; ");
  }

  @Test
  void says_so_given_a_newer_version_and_leaves_it_alone() throws SQLException {
    Ledger.write(file, NIGHTLY).close();
    execute("PRAGMA user_version = 99");

    assertRefused("written by a newer version (schema 99, this one knows 1)");
    assertThat(number("PRAGMA user_version")).isEqualTo(99);
  }

  @Test
  void says_so_given_a_damaged_file() throws IOException {
    try (Ledger ledger = Ledger.write(file, NIGHTLY)) {
      for (int i = 0; i < 50; i++) {
        ledger.runs().collect(Sample.run("run-" + i).record());
      }
    }
    byte[] bytes = Files.readAllBytes(file);
    for (int i = 4096; i < bytes.length; i++) {
      bytes[i] = (byte) 0xa5;
    }
    Files.write(file, bytes);

    assertThatThrownBy(
            () -> {
              try (Ledger ledger = Ledger.read(file)) {
                ledger.runs().record("run-7");
              }
            })
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith(file + ": it is damaged: ")
        .hasMessageContaining("put back a copy");
  }

  @Test
  @EnabledOnOs(OS.LINUX)
  void says_so_given_a_folder_where_nobody_may_write() {
    Path nowhere = Path.of("/proc/ledger.db");

    assertThatThrownBy(() -> Ledger.write(nowhere, NIGHTLY))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith("/proc/ledger.db: ")
        .hasMessageContaining("choose a folder that can be written to");
    assertThatThrownBy(() -> Ledger.write(Path.of("/proc/sub/ledger.db"), NIGHTLY))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageContaining("choose a folder that can be written to");
  }

  @Test
  @DisabledIf("mayWriteEverywhere")
  void is_read_but_not_written_given_a_read_only_folder() {
    Ledger.write(file, NIGHTLY).close();
    file.toFile().setWritable(false);
    folder.toFile().setWritable(false);
    try {
      try (Ledger reader = Ledger.read(file)) {
        assertThat(reader.plans().sweeps()).isEmpty();
      }
      assertThatThrownBy(() -> Ledger.write(file, NIGHTLY)).isInstanceOf(LedgerProblem.class);
    } finally {
      folder.toFile().setWritable(true);
    }
  }

  static boolean mayWriteEverywhere() {
    return Files.isWritable(Path.of("/"));
  }

  @Test
  void says_so_given_a_full_disk_and_keeps_what_it_had() throws SQLException {
    Ledger.write(file, NIGHTLY).close();
    SQLiteConfig small = Opening.config();
    small.setPragma(
        SQLiteConfig.Pragma.MAX_PAGE_COUNT, String.valueOf(number("PRAGMA page_count") + 8));
    int kept = 0;
    try (Ledger ledger = Ledger.write(file, NIGHTLY, small)) {
      assertThatThrownBy(
              () -> {
                for (int i = 0; i < 1_000; i++) {
                  ledger.runs().collect(Sample.run("run-" + i).record());
                }
              })
          .isInstanceOf(LedgerProblem.class)
          .hasMessageStartingWith(file + ": the disk is full; make room");
      while (exists(ledger, "run-" + kept)) {
        kept++;
      }
    }
    assertThat(kept).isPositive();
    try (Ledger ledger = Ledger.write(file, NIGHTLY)) {
      assertThat(exists(ledger, "run-" + (kept - 1))).isTrue();
      assertThat(ledger.runs().collect(Sample.run("run-" + kept).record())).isTrue();
    }
    assertThat(text("PRAGMA integrity_check")).isEqualTo("ok");
  }

  private static boolean exists(Ledger ledger, String run) {
    try {
      return ledger.runs().record(run).run().equals(run);
    } catch (LedgerProblem absent) {
      return false;
    }
  }

  @Test
  void is_readable_as_a_copy_given_it_was_copied_while_in_use() throws IOException {
    Path copy = folder.resolve("copy.db");
    Path whole = folder.resolve("whole.db");
    try (Ledger ledger = Ledger.write(file, NIGHTLY)) {
      ledger.runs().collect(Sample.run("3fa2c9d1").record());

      Files.copy(file, copy);
      Files.copy(file, whole);
      Files.copy(folder.resolve("ledger.db-wal"), folder.resolve("whole.db-wal"));
    }

    try (Ledger alone = Ledger.read(copy)) {
      assertThat(alone.plans().sweeps()).isEmpty();
    }
    try (Ledger withLog = Ledger.read(whole)) {
      assertThat(withLog.runs().resolve("3fa2")).isEqualTo("3fa2c9d1");
    }
  }

  @Test
  void is_whole_in_one_file_given_it_was_closed() throws IOException {
    try (Ledger ledger = Ledger.write(file, NIGHTLY)) {
      ledger.runs().collect(Sample.run("3fa2c9d1").record());
    }
    Path copy = folder.resolve("copy.db");

    Files.copy(file, copy, StandardCopyOption.COPY_ATTRIBUTES);

    assertThat(folder.resolve("ledger.db-wal")).doesNotExist();
    try (Ledger ledger = Ledger.read(copy)) {
      assertThat(ledger.runs().resolve("3fa2")).isEqualTo("3fa2c9d1");
    }
  }

  @Test
  void is_made_given_the_first_attempt_was_cut_off_before_its_tables() throws SQLException {
    Ledger.write(file, NIGHTLY).close();
    String history = text("SELECT sql FROM sqlite_schema WHERE name = 'flyway_schema_history'");
    file = folder.resolve("cut-off.db");
    execute(history);

    Ledger.write(file, NIGHTLY).close();

    Ledger.read(file).close();
    assertThat(number("SELECT count(*) FROM flyway_schema_history")).isOne();
  }

  @Test
  void is_kept_as_the_decisions_about_durability_say() throws SQLException {
    try (Ledger ledger = Ledger.write(file, NIGHTLY)) {
      assertThat(ledger.plans().sweeps()).isEmpty();
      assertThat(text("PRAGMA journal_mode")).isEqualTo("wal");
      assertThat(number("PRAGMA user_version")).isEqualTo(Schema.VERSION);
      assertThat(
              number(
                  "SELECT count(*) FROM pragma_table_list WHERE schema = 'main' AND NOT strict"
                      + " AND name NOT LIKE 'sqlite%' AND name NOT LIKE 'flyway%'"))
          .isZero();
    }
    try (Connection connection = Opening.config().createConnection("jdbc:sqlite:" + file);
        Statement statement = connection.createStatement()) {
      assertThat(first(statement, "PRAGMA foreign_keys")).isEqualTo("1");
      assertThat(first(statement, "PRAGMA synchronous")).isEqualTo("2"); // FULL
    }
  }

  private void assertRefused(String reason) {
    assertThatThrownBy(() -> Ledger.read(file))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith(file + ": " + reason);
    assertThatThrownBy(() -> Ledger.write(file, NIGHTLY))
        .isInstanceOf(LedgerProblem.class)
        .hasMessageStartingWith(file + ": " + reason);
  }

  private void execute(String sql) throws SQLException {
    try (Connection connection = DriverManager.getConnection("jdbc:sqlite:" + file);
        Statement statement = connection.createStatement()) {
      statement.execute(sql);
    }
  }

  private int number(String query) throws SQLException {
    return Integer.parseInt(text(query));
  }

  private String text(String query) throws SQLException {
    try (Connection connection = DriverManager.getConnection("jdbc:sqlite:" + file);
        Statement statement = connection.createStatement()) {
      return first(statement, query);
    }
  }

  private static String first(Statement statement, String query) throws SQLException {
    try (ResultSet rows = statement.executeQuery(query)) {
      assertThat(rows.next()).isTrue();
      return rows.getString(1);
    }
  }
}
