package steelyard.harness.cli;

import java.util.Locale;
import java.util.OptionalLong;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.RunRecord;
import steelyard.results.ledger.Times.Phase;

/** A run in a few words. */
final class Summaries {
  private Summaries() {}

  /** Wall seconds of lower, solve and answer, at most the limit. */
  static double seconds(RunRecord record) {
    double seconds = 0;
    for (Phase phase : Phase.values()) {
      seconds += phase.limited() ? record.times().wallNanos(phase) / 1e9 : 0;
    }
    return Math.min(seconds, record.conditions().limits().wallSeconds());
  }

  /** Status, objective, bound, time, ending and check, in a line. */
  static String outcome(RunRecord record, Check check) {
    StringBuilder text = new StringBuilder(record.outcome().status().name());
    number(text, "objective", record.outcome().objective());
    number(text, "bound", record.outcome().bound());
    text.append(String.format(Locale.ROOT, ", %.3f s", seconds(record)));
    if (record.outcome().ending() != Ending.COMPLETED) {
      text.append(", ").append(record.outcome().ending());
    }
    if (record.outcome().hasSolution()) {
      text.append(", ").append(check);
    }
    record.outcome().reason().ifPresent(reason -> text.append(": ").append(reason));
    return Columns.visible(text.toString());
  }

  private static void number(StringBuilder text, String name, OptionalLong value) {
    if (value.isPresent()) {
      text.append(", ").append(name).append(' ').append(value.getAsLong());
    }
  }
}
