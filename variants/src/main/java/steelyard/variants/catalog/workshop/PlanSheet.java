package steelyard.variants.catalog.workshop;

import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import steelyard.variants.family.Answer;

/** A plan as the mould shop reads it: a chart of the stations, then who is where from when on. */
final class PlanSheet {
  private static final int WIDTH = 80;

  private final Workshop workshop;
  private final List<List<Stay>> stations;
  private final int makespan;
  private final StringBuilder sheet = new StringBuilder();

  private PlanSheet(Workshop workshop, Answer answer) {
    this.workshop = workshop;
    this.stations =
        IntStream.range(0, workshop.stations())
            .mapToObj(station -> Stay.at(station, workshop, answer))
            .toList();
    this.makespan =
        Math.toIntExact(WorkshopChecker.check(workshop, answer).objective().orElseThrow());
  }

  static String of(Workshop workshop, Answer answer) {
    PlanSheet plan = new PlanSheet(workshop, answer);
    plan.title();
    if (plan.makespan > 0) {
      plan.chart();
      plan.timetable();
    }
    plan.caution();
    return plan.sheet.toString();
  }

  private void title() {
    line(
        counted(workshop.moulds().size(), "mould")
            + " at "
            + counted(workshop.stations(), "station")
            + ": done after "
            + counted(makespan, "minute")
            + String.format(Locale.ROOT, " (%d:%02d h)", makespan / 60, makespan % 60));
    line("");
  }

  private void chart() {
    StationChart chart = new StationChart(makespan);
    line(
        "A column is "
            + counted(chart.minutesPerColumn(), "minute")
            + ": the mould that fills most of it, . for none.");
    String legend = StationChart.legend(workshop.moulds().size());
    if (!legend.isEmpty()) {
      line(legend);
    }
    line("");
    line("station  " + chart.axis());
    for (int station = 0; station < stations.size(); station++) {
      line(String.format(Locale.ROOT, "%7d  %s", station, chart.row(stations.get(station))));
    }
    line("");
  }

  private void timetable() {
    line("Minutes from-to of each mould at each station, in order of time:");
    int cell =
        stations.stream().flatMap(List::stream).mapToInt(s -> cell(s).length()).max().orElse(0);
    int perLine = Math.max(1, (WIDTH - 2) / (cell + 2));
    for (int station = 0; station < stations.size(); station++) {
      List<Stay> stays = stations.get(station);
      int busy = stays.stream().mapToInt(Stay::minutes).sum();
      line("");
      line("station " + station + ", busy for " + busy + " of " + counted(makespan, "minute"));
      for (int i = 0; i < stays.size(); i += perLine) {
        line(cells(stays.subList(i, Math.min(i + perLine, stays.size())), cell));
      }
    }
    line("");
  }

  private static String cells(List<Stay> stays, int width) {
    return stays.stream()
        .map(stay -> "  " + cell(stay) + " ".repeat(width - cell(stay).length()))
        .collect(Collectors.joining())
        .stripTrailing();
  }

  private static String cell(Stay stay) {
    return "mould " + stay.mould() + ": " + stay.from() + "-" + stay.to();
  }

  private void caution() {
    line("This plan says only when. Machine-safety rules, rest-time rules and local codes");
    line("come first, and licensed practice decides what may run.");
  }

  private static String counted(int count, String what) {
    return count + " " + what + (count == 1 ? "" : "s");
  }

  private void line(String text) {
    sheet.append(text).append('\n');
  }
}
