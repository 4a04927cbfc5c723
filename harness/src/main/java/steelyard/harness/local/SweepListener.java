package steelyard.harness.local;

import steelyard.results.ledger.Check;
import steelyard.results.ledger.RunRecord;

/** Hears how a sweep goes on. Calls may come from several threads at a time. */
public interface SweepListener {
  /** How many runs there are, and how many were finished before. */
  void planned(long runs, long finished);

  void started(String run, String candidate, String instance);

  /** A run ended and was judged; its record is durable. */
  void finished(RunRecord record, Check check);

  /** A cell needs no run: it was finished before, or an equal model has run in its block. */
  void skipped();
}
