package steelyard.results.brief.page;

import static steelyard.results.brief.Words.cut;
import static steelyard.results.brief.Words.plural;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import steelyard.results.brief.BriefContext.Plan;
import steelyard.results.brief.Facts;
import steelyard.results.brief.Facts.Against;
import steelyard.results.brief.Facts.Row;
import steelyard.results.brief.Facts.Score;
import steelyard.results.brief.Facts.Tally;
import steelyard.results.brief.Facts.Trouble;
import steelyard.results.brief.Words;

/**
 * The brief for a terminal: what is wrong, the verdict and the table of candidates, at most 80 code
 * points a line, without colours. Equal facts give equal text.
 */
public final class TextPage {

  /** The longest line, in code points. */
  public static final int WIDTH = 80;

  private static final int NAME = 27;
  private static final List<Integer> COLUMNS = List.of(9, 7, 8, 4, 5, 4, 5, 5, 6);
  private static final int MOST_TROUBLES = 12;

  private final Facts facts;
  private final List<String> lines = new ArrayList<>();

  private TextPage(Facts facts) {
    this.facts = facts;
  }

  /** Writes the text, replacing what was there at once. */
  public static void write(Facts facts, Path file) throws IOException {
    Moved.into(file, text(facts));
  }

  /** The text, each line ended. */
  public static String text(Facts facts) {
    TextPage page = new TextPage(facts);
    page.head();
    page.troubles();
    page.verdict();
    page.candidates();
    page.measured();
    return String.join("\n", page.lines) + "\n";
  }

  private void head() {
    Plan plan = facts.plan();
    String runs =
        plan.partial()
            ? "so far " + plan.finishedRuns() + " of " + plural(plan.plannedRuns(), "run")
            : plural(plan.finishedRuns(), "run");
    String title = cut("Brief of " + Words.name(plan.sweep()), WIDTH - runs.length() - 2);
    lines.add(title + " ".repeat(WIDTH - width(title) - runs.length()) + runs);
    lines.add("=".repeat(WIDTH));
  }

  private void troubles() {
    if (facts.troubles().isEmpty()) {
      lines.add("Nothing was found wrong.");
    }
    facts.troubles().stream().limit(MOST_TROUBLES).forEach(this::trouble);
    int more = facts.troubles().size() - MOST_TROUBLES;
    if (more > 0) {
      lines.add("- and " + more + " more, in the page");
    }
    lines.add("");
  }

  private void trouble(Trouble trouble) {
    String mark =
        switch (trouble.gravity()) {
          case WRONG -> "! ";
          case CAUTION -> "- ";
        };
    wrap(mark, Words.visible(trouble.text()));
  }

  private void verdict() {
    wrap("", facts.verdict().sentence());
    lines.add("");
  }

  private void candidates() {
    List<String> head =
        List.of("Solved", "Proved", "PenMean", "Won", "Lost", "Tie", "Open", "Same", "Worst");
    lines.add(line("Candidate", head));
    lines.add("-".repeat(WIDTH));
    facts.candidates().forEach(row -> lines.add(line(row)));
    wrap(
        "",
        "* in service. PenMean: mean seconds, a run without an answer counted as "
            + Words.plain(facts.rules().penaltyFactor())
            + " times its limit. Won to Same: instances against the one in service. Tie: within "
            + Words.percent(facts.rules().margin().relative())
            + " or "
            + Words.plain(facts.rules().margin().absoluteSeconds())
            + " s. Open: neither answered. Same: the model is unchanged. Worst: its largest"
            + " slowdown.");
    lines.add("");
  }

  private static String line(Row row) {
    Score score = row.score();
    List<String> cells = new ArrayList<>();
    cells.add(Words.count(score.solved()) + "/" + score.instances());
    cells.add(Words.count(score.proved()));
    cells.add(Words.seconds(score.penalisedMean()));
    row.against().ifPresent(against -> cells.addAll(cells(against)));
    return line((row.inService() ? "* " : "  ") + Words.visible(row.candidate()), cells);
  }

  private static List<String> cells(Against against) {
    Tally tally = against.tally();
    return List.of(
        Integer.toString(tally.wins()),
        Integer.toString(tally.losses()),
        Integer.toString(tally.ties()),
        Integer.toString(tally.bothOpen()),
        Integer.toString(tally.unchanged()),
        against.worstSlowdown().map(worst -> Words.ratio(worst.ratio())).orElse("–"));
  }

  private static String line(String name, List<String> cells) {
    String shown = Words.cutMiddle(name, NAME);
    StringBuilder line = new StringBuilder(shown).append(" ".repeat(NAME - width(shown)));
    for (int i = 0; i < cells.size(); i++) {
      String cell = cells.get(i);
      line.append(" ".repeat(Math.max(0, COLUMNS.get(i) - width(cell)))).append(cell);
    }
    return line.toString();
  }

  private void measured() {
    wrap("", "Measured on " + Words.visible(facts.site().machineClass()) + ".");
    wrap("", Labels.CAUTION);
  }

  private static int width(String text) {
    return text.codePointCount(0, text.length());
  }

  /** Adds a text, broken at spaces, or within a word that is longer than a line. */
  private void wrap(String mark, String text) {
    String indent = " ".repeat(mark.length());
    StringBuilder line = new StringBuilder(mark);
    boolean empty = true;
    for (String word : text.split(" ", -1)) {
      String rest = word;
      if (!empty && width(line.toString()) + 1 + width(rest) > WIDTH) {
        lines.add(line.toString());
        line = new StringBuilder(indent);
        empty = true;
      }
      if (!empty) {
        line.append(' ');
      }
      while (width(line.toString()) + width(rest) > WIDTH) {
        int split = rest.offsetByCodePoints(0, WIDTH - width(line.toString()));
        lines.add(line + rest.substring(0, split));
        rest = rest.substring(split);
        line = new StringBuilder(indent);
      }
      line.append(rest);
      empty = false;
    }
    lines.add(line.toString());
  }
}
