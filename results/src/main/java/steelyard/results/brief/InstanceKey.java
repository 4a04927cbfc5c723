package steelyard.results.brief;

import steelyard.results.ledger.Observation;

/** What makes two runs runs of the same instance. */
record InstanceKey(String family, String instance) {

  static InstanceKey of(Observation run) {
    return new InstanceKey(run.family(), run.instance());
  }
}
