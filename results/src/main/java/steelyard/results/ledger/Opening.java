package steelyard.results.ledger;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.SQLException;
import java.sql.Statement;
import org.flywaydb.core.api.FlywayException;
import org.sqlite.SQLiteConfig;
import org.sqlite.SQLiteDataSource;

/** Opens a ledger's file, or says in one line why not. */
final class Opening {

  private static final int BUSY_MILLIS = 10_000;

  private Opening() {}

  /** Opens an existing ledger, which another process may be writing to. */
  static Store toRead(Path named) {
    Path file = located(named);
    if (!Files.isRegularFile(file)) {
      throw new LedgerProblem(
          file + ": there is no ledger", "run a sweep first, or name another file");
    }
    SQLiteConfig config = config();
    config.setReadOnly(true);
    return connect(file, url(file) + (unchangeable(file) ? "?immutable=1" : ""), config, false);
  }

  /**
   * Opens or makes a ledger. The caller holds its lock.
   *
   * @param file as {@link #forWriting} gives it
   */
  static Store toWrite(Path file, SQLiteConfig config) {
    return connect(file, url(file), config, true);
  }

  /** Where a ledger to be written really lies; its folder is made. */
  static Path forWriting(Path named) {
    Path absolute = named.toAbsolutePath().normalize();
    if (Files.isDirectory(absolute)) {
      throw new LedgerProblem(absolute + ": a folder, not a file", "name a file for the ledger");
    }
    try {
      Files.createDirectories(absolute.getParent());
    } catch (IOException e) {
      throw Problems.of(absolute, e);
    }
    return located(absolute);
  }

  static SQLiteConfig config() {
    SQLiteConfig config = new SQLiteConfig();
    config.enforceForeignKeys(true);
    config.setSynchronous(SQLiteConfig.SynchronousMode.FULL);
    config.setBusyTimeout(BUSY_MILLIS);
    return config;
  }

  /** The real path, refused on a file system that several machines share. */
  private static Path located(Path named) {
    Path file = real(named.toAbsolutePath().normalize());
    Mounts.ofThisMachine()
        .shared(file)
        .ifPresent(
            type -> {
              throw new LedgerProblem(
                  "%s: lies on a network file system (%s), whose locks do not hold"
                      .formatted(file, type),
                  "put the ledger on a local disk");
            });
    return file;
  }

  private static Path real(Path file) {
    try {
      return Files.exists(file)
          ? file.toRealPath()
          : file.getParent().toRealPath().resolve(file.getFileName());
    } catch (IOException e) {
      return file;
    }
  }

  private static Store connect(Path file, String url, SQLiteConfig config, boolean write) {
    Connection connection = null;
    try {
      connection = config.createConnection(url);
      int version = Schema.version(connection, file.toString());
      if (write) {
        prepare(connection, version, url, config);
      } else if (version < Schema.VERSION) {
        throw older(file, version);
      }
      return new Store(file, connection);
    } catch (SQLException | FlywayException | LedgerProblem e) {
      close(connection, e);
      throw Problems.of(file, e);
    }
  }

  private static void prepare(Connection connection, int version, String url, SQLiteConfig config)
      throws SQLException {
    run(connection, "PRAGMA journal_mode = WAL");
    if (version < Schema.VERSION) {
      SQLiteDataSource database = new SQLiteDataSource(config);
      database.setUrl(url);
      Schema.migrate(database);
      run(connection, "PRAGMA wal_checkpoint(TRUNCATE)"); // a copy of the file alone has the tables
    }
  }

  private static void run(Connection connection, String sql) throws SQLException {
    try (Statement statement = connection.createStatement()) {
      statement.execute(sql);
    }
  }

  private static LedgerProblem older(Path file, int version) {
    return version == 0
        ? new LedgerProblem(file + ": the file is empty", "run a sweep first, or name another file")
        : new LedgerProblem(
            "%s: written by an older version (schema %d, this one reads %d)"
                .formatted(file, version, Schema.VERSION),
            "run a sweep with this ledger, which brings it up to date");
  }

  private static void close(Connection connection, Exception reason) {
    if (connection != null) {
      try {
        connection.close();
      } catch (SQLException e) {
        reason.addSuppressed(e);
      }
    }
  }

  /** As a URI, since the driver takes a question mark in a plain path for its own. */
  private static String url(Path file) {
    return "jdbc:sqlite:" + file.toUri();
  }

  /**
   * Whether a cleanly closed ledger lies where nothing can be written: then no log can be made
   * beside it, and none is needed.
   */
  private static boolean unchangeable(Path file) {
    return !Files.isWritable(file.getParent())
        && !Files.exists(file.resolveSibling(file.getFileName() + "-wal"));
  }
}
