package steelyard.results.ledger;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.OptionalLong;
import java.util.Set;

/** What all runs in the ledger, of whatever night, answered to a set of problems. */
final class Evidence {

  /** The check of run {@code r} as a column: its newest verdict. */
  static final String CHECK =
      "coalesce((SELECT v.verdict FROM verdict v WHERE v.run = r.id ORDER BY v.id DESC LIMIT 1), 0)";

  private static final String ANSWERS =
      """
      SELECT DISTINCT r.problem, a.adapter, r.status, r.minimize, r.objective, r.bound, %s
      FROM run r JOIN backend_build a ON a.id = r.backend_build
      WHERE r.problem IN (%s)""";

  private static final String PROBLEMS_OF_SWEEP =
      """
      SELECT p.problem FROM sweep s JOIN block b ON b.sweep = s.id JOIN cell c ON c.block = b.id
        JOIN recipe_model p ON p.recipe = c.recipe WHERE s.name = ?""";

  private static final String PROBLEM_OF_RUN = "SELECT r.problem FROM run r WHERE r.name = ?";

  private static final String ANSWER_OF_RUN =
      """
      SELECT r.problem, a.adapter, r.status, r.minimize, r.objective, r.bound, %s
      FROM run r JOIN backend_build a ON a.id = r.backend_build
      WHERE r.problem IS NOT NULL AND r.name = ?"""
          .formatted(CHECK);

  private final Map<Long, Set<Claims.Answer>> answers = new HashMap<>();
  private final Map<Long, Claims> claims = new HashMap<>();

  private Evidence() {}

  /** The answers to every problem that a sweep poses. */
  static Evidence aboutSweep(Store store, String sweep) {
    return about(store, PROBLEMS_OF_SWEEP, sweep);
  }

  /** How the claim of one run stands. */
  static Standing standingOf(Store store, String run) {
    Evidence evidence = about(store, PROBLEM_OF_RUN, run);
    return store
        .list(ANSWER_OF_RUN, row -> evidence.standing(row.getLong(1), answer(row, 2)), run)
        .stream()
        .findFirst()
        .orElse(new Standing(Claim.NONE, 0));
  }

  private static Evidence about(Store store, String problems, String name) {
    Evidence evidence = new Evidence();
    store.scan(
        ANSWERS.formatted(CHECK, problems),
        row -> evidence.add(row.getLong(1), answer(row, 2)),
        name);
    return evidence;
  }

  /** Adds an answer to a problem; must come before {@link #standing} is asked of that problem. */
  void add(long problem, Claims.Answer answer) {
    answers.computeIfAbsent(problem, p -> new HashSet<>()).add(answer);
  }

  /** How the claim of one of the answers to a problem stands. */
  Standing standing(long problem, Claims.Answer answer) {
    return claims
        .computeIfAbsent(problem, p -> new Claims(answers.getOrDefault(p, Set.of())))
        .of(answer);
  }

  /** Reads adapter, status, minimize, objective, bound and check from six columns in a row. */
  static Claims.Answer answer(ResultSet row, int first) throws SQLException {
    return new Claims.Answer(
        row.getString(first),
        Codes.STATUS.word(row.getInt(first + 1)),
        row.getBoolean(first + 2),
        optional(row, first + 3),
        optional(row, first + 4),
        Codes.VERDICT.word(row.getInt(first + 5)));
  }

  private static OptionalLong optional(ResultSet row, int column) throws SQLException {
    long value = row.getLong(column);
    return row.wasNull() ? OptionalLong.empty() : OptionalLong.of(value);
  }
}
