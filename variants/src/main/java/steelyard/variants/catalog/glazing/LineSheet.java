package steelyard.variants.catalog.glazing;

import java.util.List;
import java.util.Locale;
import java.util.OptionalLong;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import steelyard.variants.family.Answer;

/** An order of tiles as the glazing line reads it: what passes when, and who is needed when. */
final class LineSheet {
  private static final int PER_ROW = 50;
  private static final int GROUP = 10;
  private static final int KINDS_WIDTH = 66;

  private final GlazeLine line;
  private final List<Integer> kinds;
  private final OptionalLong cost;
  private final StringBuilder sheet = new StringBuilder();

  private LineSheet(GlazeLine line, Answer answer) {
    this.line = line;
    this.kinds =
        IntStream.range(0, line.slots()).mapToObj(slot -> answer.value(Names.kind(slot))).toList();
    this.cost = GlazeLineChecker.check(line, answer).objective();
  }

  static String of(GlazeLine line, Answer answer) {
    LineSheet sheet = new LineSheet(line, answer);
    sheet.title();
    sheet.order();
    sheet.treatments();
    sheet.caution();
    return sheet.sheet.toString();
  }

  private void title() {
    line(
        counted(line.slots(), "tile")
            + " of "
            + counted(line.kinds().size(), "kind")
            + " with "
            + counted(line.treatments().size(), "treatment")
            + (cost.isPresent() ? ", cost " + cost.getAsLong() : ""));
    if (line.hasGlazes()) {
      line(counted(changes(), "change") + " of glaze");
    }
    line("");
  }

  private int changes() {
    return (int)
        IntStream.range(1, kinds.size()).filter(slot -> glaze(slot) != glaze(slot - 1)).count();
  }

  private int glaze(int slot) {
    return line.kinds().get(kinds.get(slot)).glaze();
  }

  private void order() {
    line("Kinds of tiles in the order in which they pass; the first slot is 0.");
    int cell = Integer.toString(line.kinds().size() - 1).length();
    int perRow = Math.max(1, Math.min(20, KINDS_WIDTH / (cell + 1)));
    for (int from = 0; from < kinds.size(); from += perRow) {
      String row =
          kinds.subList(from, Math.min(from + perRow, kinds.size())).stream()
              .map(kind -> String.format(Locale.ROOT, " %" + cell + "d", kind))
              .collect(Collectors.joining());
      line(String.format(Locale.ROOT, "%10d ", from) + row);
    }
    line("");
  }

  private void treatments() {
    line("Who is needed when: # for a tile with the treatment, . for one without,");
    line("at most so many of so many in a row.");
    for (int from = 0; from < kinds.size(); from += PER_ROW) {
      int to = Math.min(from + PER_ROW, kinds.size());
      line("");
      line(String.format(Locale.ROOT, "from slot %d", from));
      for (int t = 0; t < line.treatments().size(); t++) {
        line(row(t, from, to));
      }
    }
    line("");
  }

  private String row(int number, int from, int to) {
    Treatment treatment = line.treatment(number);
    StringBuilder row = new StringBuilder();
    row.append(
        String.format(
            Locale.ROOT, "%5d  %-8s", number, treatment.most() + "/" + treatment.window()));
    for (int slot = from; slot < to; slot++) {
      row.append((slot - from) % GROUP == 0 ? " " : "");
      row.append(line.kinds().get(kinds.get(slot)).needs(number) ? '#' : '.');
    }
    return row.toString();
  }

  private void caution() {
    line("This plan says only in which order. Machine-safety rules, rules for glazes and");
    line("dust, rest-time rules and local codes come first, and licensed practice decides");
    line("what may run.");
  }

  private static String counted(int count, String what) {
    return count + " " + what + (count == 1 ? "" : "s");
  }

  private void line(String text) {
    sheet.append(text).append('\n');
  }
}
