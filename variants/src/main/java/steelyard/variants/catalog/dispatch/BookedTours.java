package steelyard.variants.catalog.dispatch;

import java.io.IOException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.stream.Collectors;
import steelyard.variants.catalog.text.Row;
import steelyard.variants.catalog.text.Rows;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.KnownSolution;
import steelyard.variants.model.Ints;

/**
 * Tours as the dispatch yard books them: for each truck that went out its stops in order, and what
 * the day cost. Drivers unload as soon as they are there and the yard is open. Lines that start
 * with {@code #} are skipped.
 *
 * <pre>
 * tour 1 4 2 7
 * cost 412
 * </pre>
 */
final class BookedTours {
  private static final String TOUR = "tour";
  private static final String COST = "cost";

  private final Dispatch day;
  private final Set<Integer> seen = new HashSet<>();
  private Plan plan;

  private BookedTours(Dispatch day) {
    this.day = day;
    this.plan = Plan.idle(day);
  }

  /**
   * The tours in {@code file}.
   *
   * @throws InstanceException if there are none of that day; names the line and says what to do
   */
  static KnownSolution read(Dispatch day, InstanceSource file) throws IOException {
    Rows rows = Rows.of(file);
    BookedTours booked = new BookedTours(day);
    OptionalLong cost = OptionalLong.empty();
    while (cost.isEmpty()) {
      Row row = rows.next("'" + TOUR + "' with a truck and its stops, or '" + COST + "'");
      switch (row.first()) {
        case TOUR -> booked.add(row);
        case COST -> cost = OptionalLong.of(row.numbersFrom(1, 1, "what the day cost").get(0));
        default -> throw row.mistake("a line begins with '" + TOUR + "' or '" + COST + "'");
      }
    }
    if (rows.hasNext()) {
      throw rows.next("").mistake("a line after what the day cost; put it before");
    }
    return new KnownSolution(booked.plan.decisions(day), cost);
  }

  /** The text that a plan is read from. */
  static String text(Dispatch day, Plan plan) {
    List<String> lines = new ArrayList<>();
    for (int truck = 0; truck < day.trucks().size(); truck++) {
      if (!plan.tour(truck).isEmpty()) {
        String stops = plan.tour(truck).stream().map(s -> " " + s).collect(Collectors.joining());
        lines.add(TOUR + " " + truck + stops);
      }
    }
    lines.add(COST + " " + plan.cost(day));
    return String.join("\n", lines) + "\n";
  }

  private void add(Row row) {
    Ints numbers = row.numbersFrom(1);
    if (numbers.size() < 2 || numbers.get(0) >= day.trucks().size()) {
      throw row.mistake(
          "a truck from 0 to " + (day.trucks().size() - 1) + " and at least one stop are needed");
    }
    int truck = numbers.get(0);
    List<Integer> tour = numbers.stream().skip(1).boxed().toList();
    Optional<Integer> wrong =
        tour.stream().filter(s -> s < 1 || s > day.orders().size() || !seen.add(s)).findFirst();
    if (wrong.isPresent()) {
      throw row.mistake("stop " + wrong.get() + " is none, or is called at twice");
    }
    if (!plan.tour(truck).isEmpty()) {
      throw row.mistake("a second tour of truck " + truck + "; one is all it can make");
    }
    if (Plan.begins(day, truck, tour).isEmpty()) {
      throw row.mistake("truck " + truck + " cannot drive this tour in time with that load");
    }
    plan = plan.with(truck, tour);
  }
}
