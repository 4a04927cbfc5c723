package steelyard.variants.catalog.workshop;

import java.util.List;

/** The stations over time in characters: a row for each, a mark for the mould that is there. */
final class StationChart {
  private static final int COLUMNS = 60;
  private static final String MARKS =
      "0123456789abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ";
  private static final char OTHER = '#';
  private static final char IDLE = '.';

  private final int minutesPerColumn;
  private final int columns;

  /** A chart of {@code makespan} minutes, at least 1, in at most 60 columns. */
  StationChart(int makespan) {
    minutesPerColumn = (int) ((makespan + COLUMNS - 1L) / COLUMNS);
    columns = (int) ((makespan + minutesPerColumn - 1L) / minutesPerColumn);
  }

  int minutesPerColumn() {
    return minutesPerColumn;
  }

  /** Minutes above the columns in which they begin. */
  String axis() {
    StringBuilder axis = new StringBuilder();
    int every = minutesPerColumn < 1_000_000 ? 10 : 20;
    for (int column = 0; column < columns; column += every) {
      axis.append(" ".repeat(column - axis.length())).append((long) column * minutesPerColumn);
    }
    return axis.toString();
  }

  /** A mark for each column: the mould that takes most of it. */
  String row(List<Stay> stays) {
    StringBuilder row = new StringBuilder();
    for (int column = 0; column < columns; column++) {
      row.append(mark(stays, (long) column * minutesPerColumn));
    }
    return row.toString();
  }

  private char mark(List<Stay> stays, long start) {
    int most = 0;
    char mark = IDLE;
    for (Stay stay : stays) {
      int minutes = stay.minutesWithin(start, start + minutesPerColumn);
      if (minutes > most) {
        most = minutes;
        mark = mark(stay.mould());
      }
    }
    return mark;
  }

  private static char mark(int mould) {
    return mould < MARKS.length() ? MARKS.charAt(mould) : OTHER;
  }

  /** How moulds beyond 9 are marked; empty if there are none. */
  static String legend(int moulds) {
    if (moulds <= 10) {
      return "";
    }
    String legend = "Moulds from 10 on are marked a to z";
    legend += moulds > 36 ? ", from 36 on A to Z" : "";
    legend += moulds > MARKS.length() ? ", from " + MARKS.length() + " on " + OTHER : "";
    return legend + ".";
  }
}
