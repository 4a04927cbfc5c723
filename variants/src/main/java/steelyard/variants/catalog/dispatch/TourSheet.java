package steelyard.variants.catalog.dispatch;

import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import steelyard.variants.family.Answer;

/** A plan as the dispatch yard reads it: for each truck its stops and times, then the carriers. */
final class TourSheet {
  private static final int WIDTH = 78;

  private final Dispatch day;
  private final Answer answer;
  private final StringBuilder sheet = new StringBuilder();

  private TourSheet(Dispatch day, Answer answer) {
    this.day = day;
    this.answer = answer;
  }

  static String of(Dispatch day, Answer answer) {
    TourSheet sheet = new TourSheet(day, answer);
    sheet.title();
    day.truckNumbers().forEach(sheet::truck);
    sheet.carriers();
    sheet.caution();
    return sheet.sheet.toString();
  }

  private void title() {
    long cost = DispatchChecker.check(day, answer).objective().orElseThrow();
    line(
        counted(day.orders().size(), "order")
            + " for "
            + counted(day.trucks().size(), "truck")
            + ", cost "
            + cost);
    line("Times are hours and minutes since the shift began.");
    line("");
  }

  private void truck(int number) {
    List<Integer> tour = Plan.tour(day, number, answer);
    Truck truck = day.truck(number);
    if (tour.isEmpty()) {
      line("truck " + number + " stays at the works");
      line("");
      return;
    }
    int load = tour.stream().mapToInt(stop -> day.order(stop).pallets()).sum();
    line(
        "truck "
            + number
            + " with "
            + load
            + " of "
            + counted(truck.pallets(), "pallet")
            + ", cost "
            + Plan.cost(day, number, tour));
    line(row("stop", "arrives", "unloads from", "to", "pallets", "yard open"));
    int at = 0;
    int left = 0;
    for (int stop : tour) {
      Order order = day.order(stop);
      int begin = answer.value(Names.begin(stop));
      line(
          row(
              Integer.toString(stop),
              clock(left + day.times().get(at, stop)),
              clock(begin),
              clock(begin + order.unloading()),
              Integer.toString(order.pallets()),
              clock(order.opens()) + " to " + clock(order.closes())));
      left = begin + order.unloading();
      at = stop;
    }
    line(
        "  back at "
            + clock(left + day.times().get(at, 0))
            + ", shift until "
            + clock(truck.shift()));
    line("");
  }

  private static String row(
      String stop, String arrives, String from, String to, String pallets, String open) {
    return String.format(
            Locale.ROOT, "  %4s %10s %13s %10s %9s  %s", stop, arrives, from, to, pallets, open)
        .stripTrailing();
  }

  private void carriers() {
    List<Integer> left =
        day.stops()
            .filter(
                stop -> day.truckNumbers().allMatch(t -> answer.value(Names.next(t, stop)) == stop))
            .boxed()
            .toList();
    if (!left.isEmpty()) {
      int fees = left.stream().mapToInt(stop -> day.order(stop).carrier()).sum();
      line("By hired carrier, for " + fees + ":");
      stops(left);
      line("");
    }
  }

  private void stops(List<Integer> stops) {
    String text = stops.stream().map(Object::toString).collect(Collectors.joining(", "));
    int from = 0;
    while (text.length() - from > WIDTH) {
      int end = text.lastIndexOf(' ', from + WIDTH);
      line("  " + text.substring(from, end));
      from = end + 1;
    }
    line("  " + text.substring(from));
  }

  private void caution() {
    line("This plan says only who goes where and when. Drivers' hours and breaks, load and");
    line("axle limits, load securing and local traffic rules come first, and licensed");
    line("practice decides who may drive what.");
  }

  private static String clock(int quarters) {
    return String.format(Locale.ROOT, "%d:%02d", quarters / 4, quarters % 4 * 15);
  }

  private static String counted(int count, String what) {
    return count + " " + what + (count == 1 ? "" : "s");
  }

  private void line(String text) {
    sheet.append(text).append('\n');
  }
}
