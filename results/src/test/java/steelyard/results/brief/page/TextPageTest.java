package steelyard.results.brief.page;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import steelyard.results.brief.Brief;
import steelyard.results.brief.BriefContext;
import steelyard.results.brief.BriefContext.Finding;
import steelyard.results.brief.BriefContext.Gravity;
import steelyard.results.brief.Facts;
import steelyard.results.brief.RunMaker;
import steelyard.results.brief.Sample;
import steelyard.results.ledger.Ending;

class TextPageTest {

  private static Facts withFindings(Facts plain, List<Finding> findings, RunMaker... runs) {
    BriefContext context = Sample.context(runs.length, runs.length);
    return Brief.of(
        new BriefContext(
            context.plan(), context.site(), plain.rules(), List.of(), findings, context.rerun()),
        List.of(runs).stream().map(RunMaker::make).toList());
  }

  private static void fits(String text) {
    assertThat(text.lines())
        .allMatch(line -> line.codePointCount(0, line.length()) <= TextPage.WIDTH);
    assertThat(text).doesNotContain("\u001B").endsWith("\n");
  }

  @Test
  void holdsTheTable_inEightyColumns() {
    String text = TextPage.text(Brief.of(Sample.context(480, 240), Sample.runs(20, 12, 1)));

    fits(text);
    assertThat(text)
        .contains("so far 240 of 480 runs")
        .contains("* plain on cpsat  ")
        .contains("plain+heads on engine")
        .contains("Local codes");
  }

  @Test
  void staysWithinEightyColumns_whateverTheNames() {
    String longName = "瓦🧱".repeat(2000);
    Finding finding = new Finding(Gravity.WRONG, longName, Optional.empty(), List.of());
    Facts facts =
        withFindings(
            Brief.of(Sample.context(0, 0), List.of()),
            List.of(finding),
            RunMaker.proved("plain", longName, 1).inClass(longName),
            RunMaker.proved(longName, longName, 90_000));

    fits(TextPage.text(facts));
    assertThat(TextPage.text(facts)).contains("! 瓦").contains("…");
  }

  @Test
  void tellsCandidatesApart_whenTheirNamesAreCut() {
    String head = "plain+no-overlap+heads+due-order";
    String text =
        TextPage.text(
            withFindings(
                Brief.of(Sample.context(0, 0), List.of()),
                List.of(),
                RunMaker.proved(head, "i", 1).backend("sat"),
                RunMaker.proved(head, "i", 1).backend("engine")));

    assertThat(text).contains("…-order on sat ").contains("…der on engine ");
  }

  @Test
  void says_howManyTroublesItLeavesOut() {
    RunMaker[] crashed = new RunMaker[15];
    for (int i = 0; i < crashed.length; i++) {
      crashed[i] = RunMaker.open("v" + i, "i").ending(Ending.CRASHED);
    }

    String text =
        TextPage.text(withFindings(Brief.of(Sample.context(0, 0), List.of()), List.of(), crashed));

    assertThat(text)
        .contains("! v0 on cpsat crashed (1 run).")
        .contains("- and 3 more, in the page");
  }

  @Test
  void isTheSame_whenMadeAgain() {
    assertThat(TextPage.text(Brief.of(Sample.context(24, 24), Sample.runs(8, 3, 1))))
        .isEqualTo(TextPage.text(Brief.of(Sample.context(24, 24), Sample.runs(8, 3, 1))));
  }
}
