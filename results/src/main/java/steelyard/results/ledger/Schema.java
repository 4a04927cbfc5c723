package steelyard.results.ledger;

import java.sql.Connection;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import javax.sql.DataSource;
import org.flywaydb.core.Flyway;
import org.flywaydb.core.api.logging.Log;
import org.flywaydb.core.api.logging.LogCreator;

/**
 * Tells whose a database is and brings its tables up to date.
 *
 * <p>The header's {@code user_version} carries the schema's version, set by each migration, so that
 * a ledger that is up to date opens without the migration library, whose start costs most of a
 * second.
 */
final class Schema {

  /** The version that the newest migration sets. */
  static final int VERSION = 1;

  private static final int APPLICATION_ID = 1_400_138_873;
  private static final String MIGRATIONS = "classpath:steelyard/results/ledger/schema";

  /** The migration library's own table is there before ours if the first start was cut off. */
  private static final String FOREIGN_TABLES =
      "SELECT count(*) FROM sqlite_schema WHERE tbl_name <> 'flyway_schema_history'";

  private Schema() {}

  /**
   * The version of the ledger behind a connection; 0 if the database is empty.
   *
   * @throws LedgerProblem if it is another program's database or of a newer version
   */
  static int version(Connection connection, String where) throws SQLException {
    int version = number(connection, "PRAGMA user_version");
    if (number(connection, "PRAGMA application_id") != APPLICATION_ID) {
      if (version == 0 && number(connection, FOREIGN_TABLES) == 0) {
        return 0;
      }
      throw new LedgerProblem(
          where + ": not a ledger but another program's database", "name another file");
    }
    if (version > VERSION) {
      throw new LedgerProblem(
          "%s: written by a newer version (schema %d, this one knows %d)"
              .formatted(where, version, VERSION),
          "use that version, or another ledger");
    }
    return version;
  }

  /** Brings the tables to {@link #VERSION}; each migration happens whole or not at all. */
  static void migrate(DataSource database) {
    Flyway.configure()
        .loggers(Quiet.class.getName())
        .dataSource(database)
        .locations(MIGRATIONS)
        .load()
        .migrate();
  }

  private static int number(Connection connection, String query) throws SQLException {
    try (Statement statement = connection.createStatement();
        ResultSet rows = statement.executeQuery(query)) {
      return rows.next() ? rows.getInt(1) : 0;
    }
  }

  /** Drops the migration library's log: what fails comes as an exception. */
  public static final class Quiet implements LogCreator, Log {
    @Override
    public Log createLogger(Class<?> type) {
      return this;
    }

    @Override
    public boolean isDebugEnabled() {
      return false;
    }

    @Override
    public void debug(String message) {}

    @Override
    public void info(String message) {}

    @Override
    public void warn(String message) {}

    @Override
    public void error(String message) {}

    @Override
    public void error(String message, Exception cause) {}

    @Override
    public void notice(String message) {}
  }
}
