package steelyard.results.ledger;

import java.io.IOException;
import java.nio.file.Path;
import java.sql.SQLException;
import org.sqlite.SQLiteException;

/** Turns what the file system and the database say into a line that a person can act on. */
final class Problems {

  private Problems() {}

  static LedgerProblem of(Path where, IOException e) {
    return new LedgerProblem(
        "%s: %s".formatted(where, Reasons.of(e)), "choose a folder that can be written to", e);
  }

  /** The problem behind a failed operation of the database, however deep its cause lies. */
  static LedgerProblem of(Path where, Throwable failure) {
    for (Throwable cause = failure; cause != null; cause = cause.getCause()) {
      if (cause instanceof LedgerProblem problem) {
        return problem;
      }
      if (cause instanceof SQLiteException e) {
        return ofCode(where, e.getResultCode().code & 0xff, e);
      }
    }
    return new LedgerProblem(
        "%s: the database failed: %s".formatted(where, failure.getMessage()),
        "check the disk; the records in the run folders are safe",
        failure);
  }

  /** By primary result code (SQLite documentation, "Result and Error Codes", section 3). */
  private static LedgerProblem ofCode(Path where, int code, SQLException e) {
    String what;
    String remedy;
    switch (code) {
      case 5, 6 -> {
        what = "another process keeps it locked";
        remedy = "wait until that ends and start again";
      }
      case 8 -> {
        what = "it can only be read";
        remedy = "allow writing to the file and its folder, or name another ledger";
      }
      case 10 -> {
        what = "reading or writing failed: " + e.getMessage();
        remedy = "check the disk; finished runs are safe in their folders";
      }
      case 11 -> {
        what = "it is damaged: " + e.getMessage();
        remedy = "put back a copy, or name a new ledger and collect the run folders again";
      }
      case 13 -> {
        what = "the disk is full";
        remedy = "make room and start again; finished runs are safe in their folders";
      }
      case 14 -> {
        what = "it cannot be opened";
        remedy = "check that the folder exists and that you may read and write there";
      }
      case 26 -> {
        what = "not a ledger";
        remedy = "name another file";
      }
      default -> {
        what = "the database failed: " + e.getMessage();
        remedy = "check the disk; finished runs are safe in their folders";
      }
    }
    return new LedgerProblem("%s: %s".formatted(where, what), remedy, e);
  }
}
