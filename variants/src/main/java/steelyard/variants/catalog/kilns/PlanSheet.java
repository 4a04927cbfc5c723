package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import steelyard.variants.family.Answer;

/** A plan as the kiln hall reads it: a chart, each kiln's firings, late lots, what it costs. */
final class PlanSheet {
  private static final int WIDTH = 80;

  private final Campaign campaign;
  private final Answer answer;
  private final List<Firing> lit;
  private final StringBuilder sheet = new StringBuilder();

  private PlanSheet(Campaign campaign, Answer answer) {
    this.campaign = campaign;
    this.answer = answer;
    this.lit = campaign.firings().stream().filter(firing -> heat(firing) > 0).toList();
  }

  static String of(Campaign campaign, Answer answer) {
    PlanSheet plan = new PlanSheet(campaign, answer);
    plan.costs();
    plan.chart();
    for (int kiln = 0; kiln < campaign.kilns().size(); kiln++) {
      plan.kiln(kiln);
    }
    plan.lateLots();
    plan.caution();
    return plan.sheet.toString();
  }

  private void costs() {
    long fuel = lit.stream().mapToLong(f -> campaign.kiln(f).fuelAt(heat(f))).sum();
    long changes = lit.stream().mapToLong(f -> answer.value(Names.change(f))).sum();
    long lateness = campaign.lots().stream().mapToLong(this::latenessOf).sum();
    line(
        counted(campaign.lots().size(), "lot")
            + " in "
            + counted(lit.size(), "firing")
            + " of "
            + counted(campaign.kilns().size(), "kiln")
            + ": cost "
            + (fuel + changes + lateness));
    line("fuel " + fuel + ", changes of temperature " + changes + ", lateness " + lateness);
    line("");
  }

  private void chart() {
    KilnChart chart = new KilnChart(campaign.works().days());
    line(
        "A column is "
            + counted(chart.daysPerColumn(), "day")
            + ": the heat while firing, - while cooling, # under repair.");
    if (campaign.heats().size() > 9) {
      line("Heats from 10 on are marked a, b, c and so on.");
    }
    line("");
    line(row("day", chart.axis(campaign.works().day())));
    for (int kiln = 0; kiln < campaign.kilns().size(); kiln++) {
      line(row(campaign.kilns().get(kiln).name(), chart.row(marks(kiln))));
    }
    line("");
  }

  private static String row(String head, String marks) {
    return String.format(Locale.ROOT, "%-12s  %s", head, marks).stripTrailing();
  }

  /** A mark for each day. */
  private char[] marks(int kiln) {
    char[] marks = ".".repeat(campaign.works().days()).toCharArray();
    for (Kiln.Repair repair : campaign.kilns().get(kiln).repairs()) {
      IntStream.range(repair.from(), repair.until()).forEach(day -> marks[day] = '#');
    }
    for (Firing firing : lit) {
      if (firing.kiln() == kiln) {
        int start = answer.value(Names.start(firing));
        Heat heat = campaign.heat(heat(firing));
        char mark = Character.forDigit(heat(firing), Character.MAX_RADIX);
        IntStream.range(start, start + heat.fire()).forEach(day -> marks[day] = mark);
        IntStream.range(start + heat.fire(), start + heat.days()).forEach(day -> marks[day] = '-');
      }
    }
    return marks;
  }

  private void kiln(int index) {
    Kiln kiln = campaign.kilns().get(index);
    List<Firing> own = lit.stream().filter(firing -> firing.kiln() == index).toList();
    line("kiln " + kiln.name() + ": " + counted(own.size(), "firing"));
    for (Firing firing : own) {
      List<Lot> lots = lotsIn(firing);
      line(
          "  "
              + firing.name()
              + "  heat "
              + heat(firing)
              + "  days "
              + works(answer.value(Names.start(firing)))
              + "-"
              + works(answer.value(Names.end(firing)))
              + "  "
              + lots.stream().mapToInt(Lot::shelves).sum()
              + " of "
              + counted(kiln.shelves(), "shelf"));
      words(lots.stream().map(Lot::name).toList());
    }
    line("");
  }

  private List<Lot> lotsIn(Firing firing) {
    return campaign.lots().stream()
        .filter(lot -> answer.values().getOrDefault(Names.in(lot, firing), 0) == 1)
        .toList();
  }

  /** The words in lines of the sheet's width. */
  private void words(List<String> words) {
    StringBuilder text = new StringBuilder("   ");
    for (String word : words) {
      if (text.length() + 1 + word.length() > WIDTH) {
        line(text.toString());
        text = new StringBuilder("   ");
      }
      text.append(' ').append(word);
    }
    line(text.toString());
  }

  private void lateLots() {
    List<String> late = new ArrayList<>();
    for (Lot lot : campaign.lots()) {
      int days = answer.value(Names.out(lot)) - lot.due();
      if (days > 0) {
        late.add(
            "  "
                + lot.name()
                + ": due on day "
                + works(lot.due())
                + ", "
                + counted(days, "day")
                + " late, cost "
                + latenessOf(lot));
      }
    }
    line(late.isEmpty() ? "No lot is late." : "Late:");
    late.forEach(this::line);
    line("");
  }

  private long latenessOf(Lot lot) {
    return (long) lot.rate() * Math.max(0, answer.value(Names.out(lot)) - lot.due());
  }

  private void caution() {
    line("This plan says only what is fired where and when. Kiln, gas and machine safety");
    line("rules, working-hours rules and local codes come first, and licensed practice");
    line("decides what may be lit.");
  }

  private int heat(Firing firing) {
    return answer.value(Names.heat(firing));
  }

  /** The works' own number of a day of the campaign. */
  private int works(int day) {
    return campaign.works().day() + day;
  }

  private static String counted(int count, String what) {
    String many = what.equals("shelf") ? "shelves" : what + "s";
    return count + " " + (count == 1 ? what : many);
  }

  private void line(String text) {
    sheet.append(text).append('\n');
  }
}
