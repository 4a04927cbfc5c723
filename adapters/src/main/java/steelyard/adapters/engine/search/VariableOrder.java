package steelyard.adapters.engine.search;

/** Which open row of a phase is decided next; ties go to the earlier row. */
public enum VariableOrder {
  /** The first open row. */
  INPUT,
  /** Fewest values. */
  SMALLEST_DOMAIN,
  /** Most values. */
  LARGEST_DOMAIN,
  /** Least minimum. */
  SMALLEST_MIN,
  /** Greatest maximum. */
  LARGEST_MAX,
  /**
   * Fewest values per weighted degree: Boussemart, Hemery, Lecoutre and Sais (2004), Boosting
   * systematic search by weighting constraints, ECAI 146-150.
   */
  WEIGHTED_DEGREE
}
