package steelyard.harness.sweep;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.function.Function;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.apache.commons.csv.DuplicateHeaderMode;
import steelyard.harness.sweep.text.Mistakes;
import steelyard.harness.sweep.text.Phrases;
import steelyard.harness.sweep.text.Place;

/**
 * Reads the table of a folder's instances: comma-separated values after RFC 4180 with a header,
 * column {@code path} and any of {@code set, class, weight, date, known}. Several sets are parted
 * by semicolons. An empty cell is as good as no column.
 */
final class InstanceIndex {

  private static final List<String> COLUMNS =
      List.of("path", "set", "class", "weight", "date", "known");

  private static final CSVFormat FORMAT =
      CSVFormat.RFC4180
          .builder()
          .setHeader()
          .setSkipHeaderRecord(true)
          .setDuplicateHeaderMode(DuplicateHeaderMode.DISALLOW)
          .setIgnoreEmptyLines(true)
          .setTrim(true)
          .get();

  private final Path folder;
  private final Place file;
  private final Mistakes mistakes;

  InstanceIndex(Path folder, String shown, Mistakes mistakes) {
    this.folder = folder;
    this.file = Place.of(shown);
    this.mistakes = mistakes;
  }

  /** The rows that are right; every other one is a mistake. */
  List<ListedInstance> read(String text) {
    List<ListedInstance> instances = new ArrayList<>();
    try (CSVParser rows = CSVParser.parse(text, FORMAT)) {
      List<String> header = rows.getHeaderNames();
      if (isGood(header)) {
        for (CSVRecord row : rows) {
          Place place = file.line((int) rows.getCurrentLineNumber());
          if (row.size() == header.size()) {
            instance(new Row(row, place)).ifPresent(instances::add);
          } else {
            String sizes = Phrases.count(row.size(), "value") + ", the header " + header.size();
            mistakes.add(place, "", "has " + sizes);
          }
        }
      }
    } catch (IOException | UncheckedIOException | IllegalArgumentException e) {
      mistakes.add(file, "", "not a table: " + e.getMessage());
    }
    return instances;
  }

  private boolean isGood(List<String> header) {
    boolean good = true;
    for (String column : header) {
      if (!COLUMNS.contains(column)) {
        String unknown = Phrases.unknown("column", column, COLUMNS);
        mistakes.add(file.line(1), "", unknown, Phrases.known(COLUMNS));
        good = false;
      }
    }
    if (!header.contains("path")) {
      mistakes.add(file.line(1), "", "no column 'path'", Phrases.known(COLUMNS));
      good = false;
    }
    return good;
  }

  private Optional<ListedInstance> instance(Row row) {
    Optional<Path> path = row.read("path", this::file);
    Optional<Double> weight = row.read("weight", InstanceIndex::weight);
    Optional<LocalDate> date = row.read("date", InstanceIndex::date);
    Optional<Long> known = row.read("known", InstanceIndex::known);
    OptionalLong best = known.map(OptionalLong::of).orElse(OptionalLong.empty());
    return path.map(
        p ->
            ListedInstance.of(folder, p, row.place)
                .withLabels(row.sets(), row.text("class").orElse(Instance.NO_CLASS))
                .withFacts(weight.orElse(1.0), date, best));
  }

  private final class Row {
    private final CSVRecord cells;
    private final Place place;

    Row(CSVRecord cells, Place place) {
      this.cells = cells;
      this.place = place;
    }

    /** What a cell says; empty if it is, and also, with a mistake, if it is wrong. */
    <T> Optional<T> read(String column, Function<String, T> reading) {
      try {
        return text(column).map(reading);
      } catch (IllegalArgumentException e) {
        mistakes.add(place, column, e.getMessage());
        return Optional.empty();
      }
    }

    List<String> sets() {
      return text("set").stream()
          .flatMap(sets -> Arrays.stream(sets.split(";", -1)))
          .map(String::strip)
          .filter(set -> !set.isEmpty())
          .toList();
    }

    Optional<String> text(String column) {
      return Optional.of(column)
          .filter(cells::isMapped)
          .map(cells::get)
          .filter(text -> !text.isEmpty() || column.equals("path"));
    }
  }

  private Path file(String text) {
    Path path;
    try {
      path = folder.resolve(text).normalize();
    } catch (InvalidPathException e) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is no path", e);
    }
    if (text.isEmpty() || !path.startsWith(folder)) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is not inside this folder");
    }
    if (!Files.isRegularFile(path)) {
      throw new IllegalArgumentException("no such file: " + Phrases.quoted(text));
    }
    return path;
  }

  private static double weight(String text) {
    if (!text.matches("[0-9]{1,15}(\\.[0-9]{1,15})?") || !(Double.parseDouble(text) > 0)) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is not a positive number");
    }
    return Double.parseDouble(text);
  }

  private static LocalDate date(String text) {
    try {
      return LocalDate.parse(text);
    } catch (DateTimeException e) {
      String what = Phrases.quoted(text) + " is not a date such as 2026-03-31";
      throw new IllegalArgumentException(what, e);
    }
  }

  private static long known(String text) {
    if (!text.matches("-?[0-9]{1,18}")) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is not a whole number");
    }
    return Long.parseLong(text);
  }
}
