package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/** Writes a day as {@link DispatchReader} reads it. */
final class DispatchText {
  private DispatchText() {}

  /** The text of the file, a comment first. */
  static String of(Dispatch day, String comment) {
    List<String> text = new ArrayList<>();
    text.add("# " + comment);
    text.add(row("dispatch", IntStream.of(day.trucks().size(), day.orders().size())));
    for (Truck t : day.trucks()) {
      text.add(row("truck", IntStream.of(t.pallets(), t.size(), t.shift(), t.cost())));
    }
    for (Order o : day.orders()) {
      text.add(
          row(
              "order",
              IntStream.of(
                  o.pallets(), o.gate(), o.opens(), o.closes(), o.unloading(), o.carrier())));
    }
    day.times().rows().forEach(times -> text.add(row("time", times.stream())));
    day.costs().rows().forEach(costs -> text.add(row("cost", costs.stream())));
    return String.join("\n", text) + "\n";
  }

  private static String row(String keyword, IntStream numbers) {
    return keyword + numbers.mapToObj(number -> " " + number).collect(Collectors.joining());
  }
}
