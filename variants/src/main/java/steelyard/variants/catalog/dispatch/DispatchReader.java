package steelyard.variants.catalog.dispatch;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.catalog.text.Row;
import steelyard.variants.catalog.text.Rows;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.Ints;

/**
 * Reads a text: how many trucks and orders there are, then a line for each, then the times and the
 * costs from each stop, the works first. Lines that start with {@code #} and empty lines are
 * skipped.
 *
 * <pre>
 * dispatch 2 3
 * truck 14 1 40 60        pallets, size, shift, cost
 * truck 26 3 40 90
 * order 6 3 8 16 2 70     pallets, gate, opens, closes, unloading, the carrier's fee
 * order 4 1 0 30 1 0      a fee of 0: no carrier takes it
 * order 9 2 0 30 3 95
 * time 0 3 5 4            four of these: from the works and from each order
 * ...
 * cost 0 21 40 33         and four of these
 * ...
 * </pre>
 */
final class DispatchReader {
  private static final String TITLE = "dispatch";
  private static final String TRUCK = "truck";
  private static final String ORDER = "order";
  private static final String TIME = "time";
  private static final String COST = "cost";

  private final Rows rows;

  private DispatchReader(Rows rows) {
    this.rows = rows;
  }

  /**
   * The instance in {@code source}.
   *
   * @throws InstanceException if there is none; names the line and says what to do
   */
  static Dispatch read(InstanceSource source) throws IOException {
    return new DispatchReader(Rows.of(source)).day();
  }

  private Dispatch day() {
    Row title = next(TITLE, "how many trucks and orders there are, such as 'dispatch 2 3'");
    Ints counts = numbers(title, 2, "trucks and orders");
    if (counts.stream().anyMatch(count -> count < 1 || count > Dispatch.MOST)) {
      throw title.mistake("from 1 to " + Dispatch.MOST + " trucks and as many orders");
    }
    List<Truck> trucks = IntStream.range(0, counts.get(0)).mapToObj(this::truck).toList();
    List<Order> orders = IntStream.rangeClosed(1, counts.get(1)).mapToObj(this::order).toList();
    Legs times = legs(TIME, orders.size() + 1);
    Legs costs = legs(COST, orders.size() + 1);
    if (rows.hasNext()) {
      throw rows.next("").mistake("a line after the last costs; remove it or correct the counts");
    }
    return new Dispatch(trucks, orders, times, costs);
  }

  private Truck truck(int number) {
    String meant = "pallets, size, shift and cost";
    Row row = next(TRUCK, "truck " + number + ": " + meant);
    Ints numbers = numbers(row, 4, meant);
    return new Truck(numbers.get(0), numbers.get(1), numbers.get(2), numbers.get(3));
  }

  private Order order(int stop) {
    String meant = "pallets, gate, opens, closes, unloading and the carrier's fee";
    Row row = next(ORDER, "order " + stop + ": " + meant);
    Ints numbers = numbers(row, 6, meant);
    if (numbers.get(0) < 1) {
      throw row.mistake("an order of no pallets; at least 1");
    }
    if (numbers.get(3) < numbers.get(2)) {
      throw row.mistake("closes at " + numbers.get(3) + " before it opens at " + numbers.get(2));
    }
    return new Order(
        numbers.get(0),
        numbers.get(1),
        numbers.get(2),
        numbers.get(3),
        numbers.get(4),
        numbers.get(5));
  }

  private Legs legs(String keyword, int stops) {
    List<Ints> table = new ArrayList<>();
    for (int from = 0; from < stops; from++) {
      Row row = next(keyword, keyword + "s from stop " + from + " to each of " + stops);
      Ints numbers = numbers(row, stops, "one for each stop");
      if (numbers.get(from) != 0) {
        throw row.mistake("from stop " + from + " to itself is 0, not " + numbers.get(from));
      }
      table.add(numbers);
    }
    return new Legs(table);
  }

  private Row next(String keyword, String meant) {
    Row row = rows.next("'" + keyword + "' with " + meant);
    if (!row.first().equals(keyword)) {
      throw row.mistake(
          "'" + Row.shown(row.first()) + "' where '" + keyword + "' should stand: " + meant);
    }
    return row;
  }

  private Ints numbers(Row row, int count, String meant) {
    Ints numbers = row.numbersFrom(1, count, meant);
    numbers.stream()
        .filter(number -> number > Dispatch.LARGEST)
        .findFirst()
        .ifPresent(
            number -> {
              throw row.mistake(number + " is more than " + Dispatch.LARGEST);
            });
    return numbers;
  }
}
