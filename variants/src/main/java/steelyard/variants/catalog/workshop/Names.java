package steelyard.variants.catalog.workshop;

/** What the plain model calls its variables and groups. */
final class Names {
  static final String MAKESPAN = "makespan";
  static final String IN_ORDER = "operations in order";
  static final String ONE_AT_A_TIME = "one mould at a station at a time";

  private Names() {}

  /** The minute in which {@code mould} starts its operation number {@code step}. */
  static String start(int mould, int step) {
    return "start[" + mould + "." + step + "]";
  }
}
