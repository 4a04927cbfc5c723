package steelyard.variants.catalog.kilns;

/** Days in characters: a row of marks for each kiln. */
final class KilnChart {
  private static final int COLUMNS = 64;

  private final int days;
  private final int daysPerColumn;

  /** A chart of so many days, at least 1, in at most 64 columns. */
  KilnChart(int days) {
    this.days = days;
    this.daysPerColumn = (days + COLUMNS - 1) / COLUMNS;
  }

  int daysPerColumn() {
    return daysPerColumn;
  }

  /** Days above the columns in which they begin, counted from {@code first}. */
  String axis(int first) {
    StringBuilder axis = new StringBuilder();
    for (int day = 0; day < days; day += 10 * daysPerColumn) {
      axis.append(" ".repeat(day / daysPerColumn - axis.length())).append(first + day);
    }
    return axis.toString();
  }

  /** The mark of each column's first day. */
  String row(char[] marks) {
    StringBuilder row = new StringBuilder();
    for (int day = 0; day < days; day += daysPerColumn) {
      row.append(marks[day]);
    }
    return row.toString();
  }
}
