package steelyard.variants.catalog.workshop;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;

/**
 * Reads the text format of the OR-Library's job-shop instances: a line {@code jobs machines}, then
 * a line for each job with a machine and a duration per operation; machines count from 0. Lines
 * that start with {@code #} and empty lines are skipped.
 *
 * @see <a href="https://doi.org/10.1057/jors.1990.166">Beasley (1990), "OR-Library: distributing
 *     test problems by electronic mail", JORS 41(11):1069-1072</a>
 */
final class WorkshopReader {
  private static final Pattern BLANKS = Pattern.compile("\\s+");
  private static final Pattern NUMBER = Pattern.compile("[0-9]{1,10}");
  private static final int SHOWN = 20;

  private final InstanceSource source;

  private WorkshopReader(InstanceSource source) {
    this.source = source;
  }

  /** The numbers of one line of the file, which is counted from 1. */
  private record Row(int line, Ints numbers) {}

  /**
   * The instance in {@code source}.
   *
   * @throws InstanceException if there is none; names the line and says what to do
   */
  static Workshop read(InstanceSource source) throws IOException {
    return new WorkshopReader(source).workshop(source.lines());
  }

  private Workshop workshop(List<String> lines) {
    List<Row> rows = rows(lines);
    if (rows.isEmpty()) {
      throw InstanceException.at(
          source, 1, "no instance here; a line such as '6 5' gives moulds and stations");
    }
    Ints counts = checkedCounts(rows.get(0));
    List<Mould> moulds = moulds(rows.subList(1, rows.size()), counts.get(0), counts.get(1));
    if (moulds.size() < counts.get(0)) {
      throw InstanceException.at(
          source,
          lines.size(),
          "the file ends after "
              + moulds.size()
              + " of "
              + counts.get(0)
              + " moulds; add the missing lines or correct the number of moulds");
    }
    try {
      return new Workshop(counts.get(1), moulds);
    } catch (IllegalArgumentException e) {
      throw new InstanceException(source.name() + ": " + e.getMessage(), e);
    }
  }

  private List<Row> rows(List<String> lines) {
    List<Row> rows = new ArrayList<>();
    for (int i = 0; i < lines.size(); i++) {
      String text = lines.get(i).strip();
      if (!text.isEmpty() && !text.startsWith("#")) {
        int line = i + 1;
        int[] numbers = BLANKS.splitAsStream(text).mapToInt(word -> number(word, line)).toArray();
        rows.add(new Row(line, Ints.of(numbers)));
      }
    }
    return rows;
  }

  private int number(String word, int line) {
    if (!NUMBER.matcher(word).matches() || Long.parseLong(word) > Domain.LIMIT) {
      String shown = word.length() <= SHOWN ? word : word.substring(0, SHOWN) + "...";
      throw InstanceException.at(
          source, line, "'" + shown + "' is not a whole number from 0 to 10^9");
    }
    return Integer.parseInt(word);
  }

  private Ints checkedCounts(Row row) {
    Ints counts = row.numbers();
    if (counts.size() != 2 || counts.get(0) < 1 || counts.get(1) < 1) {
      throw InstanceException.at(
          source,
          row.line(),
          "the first line gives how many moulds and how many stations there are, such as '6 5',"
              + " each at least 1");
    }
    return counts;
  }

  private List<Mould> moulds(List<Row> rows, int count, int stations) {
    List<Mould> moulds = new ArrayList<>();
    for (Row row : rows) {
      if (moulds.size() == count) {
        throw InstanceException.at(
            source,
            row.line(),
            "a line after the last of "
                + count
                + " moulds; remove it or correct the number of moulds");
      }
      moulds.add(mould(row, moulds.size(), stations));
    }
    return moulds;
  }

  private Mould mould(Row row, int index, int stations) {
    Ints numbers = row.numbers();
    if (numbers.size() != 2L * stations) {
      throw InstanceException.at(
          source,
          row.line(),
          numbers.size()
              + " numbers for mould "
              + index
              + "; a station and minutes for each of "
              + stations
              + " operations make "
              + 2L * stations);
    }
    List<Operation> route = new ArrayList<>();
    for (int i = 0; i < numbers.size(); i += 2) {
      int station = numbers.get(i);
      if (station >= stations) {
        throw InstanceException.at(
            source,
            row.line(),
            "no station " + station + "; the stations count from 0 to " + (stations - 1));
      }
      route.add(new Operation(station, numbers.get(i + 1)));
    }
    return new Mould(route);
  }
}
