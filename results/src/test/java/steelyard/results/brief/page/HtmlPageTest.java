package steelyard.results.brief.page;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import steelyard.results.brief.Brief;
import steelyard.results.brief.BriefContext;
import steelyard.results.brief.BriefContext.Finding;
import steelyard.results.brief.BriefContext.Gravity;
import steelyard.results.brief.Facts;
import steelyard.results.brief.Facts.Point;
import steelyard.results.brief.RunMaker;
import steelyard.results.brief.Sample;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Observation;

class HtmlPageTest {

  private static final Facts SAMPLE = Brief.of(Sample.context(160, 160), Sample.runs(20, 4, 2));
  private static final String PAGE = HtmlPage.html(SAMPLE);

  private static List<String> all(String pattern, String page) {
    return Pattern.compile(pattern).matcher(page).results().map(m -> m.group(1)).toList();
  }

  private static String page(Observation... runs) {
    return HtmlPage.html(Brief.of(Sample.context(runs.length, runs.length), List.of(runs)));
  }

  @Test
  void isTheSame_whenMadeAgain() {
    Facts again = Brief.of(Sample.context(160, 160), Sample.runs(20, 4, 2));

    assertThat(HtmlPage.html(again)).isEqualTo(PAGE);
  }

  @Test
  void needsNothingBesideIt() {
    assertThat(all("(?:href|src|action|data|xlink:href)\\s*=\\s*\"([^\"]*)\"", PAGE))
        .isNotEmpty()
        .allMatch(reference -> reference.startsWith("#"));
    assertThat(PAGE)
        .doesNotContain("<script", "@import", "url(", "<link", "<iframe", "http:", "https:");
  }

  @Test
  void everyLink_leadsSomewhere_andNoIdIsTakenTwice() {
    List<String> ids = all("\\sid=\"([^\"]*)\"", PAGE);
    Set<String> unique = new HashSet<>(ids);

    assertThat(ids).doesNotHaveDuplicates();
    assertThat(all("href=\"#([^\"]*)\"", PAGE)).isNotEmpty().allMatch(unique::contains);
    assertThat(
            all("aria-labelledby=\"([^\"]*)\"", PAGE).stream()
                .flatMap(l -> Stream.of(l.split(" ", -1))))
        .isNotEmpty()
        .allMatch(unique::contains);
  }

  @Test
  void answersInTheOrder_inWhichTheEngineerAsks() {
    assertThat(all("<h2 id=\"([^\"]*)\"", PAGE))
        .containsExactly(
            "wrong-head",
            "verdict-head",
            "candidates-head",
            "pairs-head",
            "measured-head",
            "runs-head");
    assertThat(PAGE).contains("Local codes and the judgement of licensed practitioners come first");
  }

  @Test
  void showsNamesAsText_whateverTheyHold() {
    String hostile = "<img src=x onerror=alert(1)>\u202E\"'&{}";
    Finding finding = new Finding(Gravity.WRONG, hostile, Optional.empty(), List.of("nowhere"));
    BriefContext plain = Sample.context(2, 2);
    BriefContext context =
        new BriefContext(
            new BriefContext.Plan(
                hostile,
                hostile + " on cpsat",
                2,
                2,
                plain.plan().started(),
                plain.plan().lastRun(),
                "</pre><script>" + hostile),
            new BriefContext.Site(
                hostile, hostile, List.of(new BriefContext.Version(hostile, hostile))),
            plain.rules(),
            List.of(),
            List.of(finding),
            "repeat {run}");
    List<Observation> runs =
        List.of(
            RunMaker.proved(hostile, hostile, 1)
                .inClass(hostile)
                .family(hostile)
                .run(hostile)
                .make(),
            RunMaker.proved("B", hostile, 2).inClass(hostile).family(hostile).make());

    String page = HtmlPage.html(Brief.of(context, runs));

    assertThat(page).contains("&lt;img src=x onerror=alert(1)&gt;[U+202E]");
    assertThat(page).doesNotContain("<img", "\u202E", "<script");
    assertThat(all("\\sid=\"([^\"]*)\"", page)).allMatch(id -> id.matches("[A-Za-z0-9._-]+"));
  }

  @Test
  void cutsNames_thatWouldFillThePage() {
    String page = page(RunMaker.proved("v".repeat(4096), "i".repeat(4096), 1).run("r1").make());

    assertThat(page).doesNotContain("v".repeat(100), "i".repeat(100));
    assertThat(page).contains("v".repeat(79) + "…");
  }

  @Test
  void everyDotOfAChart_isInTheTableBesideIt() {
    Facts.Pair pair = SAMPLE.pairs().get(0);
    String article = PAGE.substring(PAGE.indexOf("id=\"pair-0\""), PAGE.indexOf("id=\"pair-1\""));
    String chart =
        article.substring(article.indexOf("<svg class=\"chart\""), article.indexOf("</svg>"));

    long dots = Pattern.compile("class=\"k\\d\"").matcher(chart).results().count();
    List<String> rows = new ArrayList<>();
    for (MatchResult row :
        Pattern.compile(
                "<a href=\"#run-([^\"]+)\">([^<]*)</a></td><td class=\"n\"><a href=\"#run-([^\"]+)\">([^<]*)<")
            .matcher(article)
            .results()
            .toList()) {
      rows.add(row.group(1) + " " + row.group(2) + " " + row.group(3) + " " + row.group(4));
    }

    assertThat(dots).isEqualTo(40).isEqualTo(pair.points().size());
    assertThat(rows)
        .containsExactlyElementsOf(pair.points().stream().map(HtmlPageTest::row).toList());
  }

  private static String row(Point point) {
    return point.beforeRun()
        + " "
        + Labels.seconds(point.before()).replace(">", "&gt;")
        + " "
        + point.afterRun()
        + " "
        + Labels.seconds(point.after()).replace(">", "&gt;");
  }

  @Test
  void everyRun_hasItsAnchorAndItsCommand() {
    for (Facts.Run run : SAMPLE.runs()) {
      assertThat(PAGE)
          .contains("id=\"run-" + run.run() + "\"")
          .contains("<code>steelyard rerun " + run.run() + "</code>");
    }
  }

  @Test
  void aRunThatStandsForSeveralCandidates_hasOneAnchor() {
    String page =
        page(
            RunMaker.proved("plain", "i1", 1).run("r1").make(),
            RunMaker.proved("other", "i1", 1).run("r1").make());

    assertThat(all("id=\"(run-r1)\"", page)).hasSize(1);
    assertThat(all("<code>(steelyard rerun r1)</code>", page)).hasSize(2);
  }

  @Test
  void saysHowFarItIs_whileTheSweepRuns() {
    String partial = HtmlPage.html(Brief.of(Sample.context(400, 160), Sample.runs(20, 4, 2)));

    assertThat(partial).contains("So far: 160 of 400 runs.");
    assertThat(PAGE).contains("160 runs, all that were planned.").doesNotContain("So far");
  }

  @Test
  void drawsNoTimes_whenWorkWasLimited() {
    Limits work = new Limits(60, Optional.of(new Limits.Work("conflicts", 5000)), 1L << 30);

    String page =
        page(
            RunMaker.proved("plain", "i1", 1).limits(work).make(),
            RunMaker.proved("other", "i1", 2).limits(work).make());

    assertThat(page).doesNotContain("<figure>", "Penalised mean").contains("5000 conflicts");
  }

  @Test
  void stands_withoutAnyRun() {
    String page = page();

    assertThat(page).contains("No run has ended yet.", "no finished run yet");
  }

  @Test
  void replacesTheFile_andLeavesNothingBeside(@TempDir Path folder) throws Exception {
    Path file = folder.resolve("deeper").resolve("brief.html");

    HtmlPage.write(Brief.of(Sample.context(1, 1), Sample.runs(1, 1, 1)), file);
    HtmlPage.write(SAMPLE, file);

    assertThat(file).hasContent(PAGE);
    try (Stream<Path> files = Files.list(file.getParent())) {
      assertThat(files).containsExactly(file);
    }
  }
}
