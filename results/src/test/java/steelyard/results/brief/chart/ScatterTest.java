package steelyard.results.brief.chart;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.concurrent.TimeUnit;
import java.util.regex.MatchResult;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import steelyard.results.brief.chart.Scatter.Dot;
import steelyard.results.statistics.SolveTime;

class ScatterTest {

  private static final Pattern CIRCLE =
      Pattern.compile("<ellipse class=\"k0\" cx=\"([\\d.]+)\" cy=\"([\\d.]+)\"");

  private static SolveTime s(double seconds) {
    return SolveTime.exactly(seconds);
  }

  private static final SolveTime OPEN = SolveTime.beyond(60);

  private static String draw(Dot... dots) {
    return Scatter.svg("p", "a title", "what it shows", List.of(dots), 60, 0.001);
  }

  private static List<double[]> circles(String svg) {
    List<double[]> centres = new ArrayList<>();
    for (MatchResult match : CIRCLE.matcher(svg).results().toList()) {
      centres.add(
          new double[] {Double.parseDouble(match.group(1)), Double.parseDouble(match.group(2))});
    }
    return centres;
  }

  @Test
  void placesDots_onEqualLogarithmicAxes() {
    LogScale scale = LogScale.covering(0.02, 0.001, 60, 332, 44);

    List<double[]> centres =
        circles(draw(new Dot(s(0.02), s(30), 0), new Dot(s(7), s(7), 0), new Dot(s(0), s(1), 0)));

    assertThat(centres).hasSize(3);
    LogScale floored = LogScale.covering(0.001, 0.001, 60, 332, 44);
    assertThat(scale.lowest()).isGreaterThan(floored.lowest());
    assertThat(centres.get(0)[0]).isCloseTo(floored.at(0.02), within(0.01));
    assertThat(centres.get(0)[1]).isCloseTo(332 - floored.at(30), within(0.01));
    assertThat(centres.get(1)[0]).isCloseTo(332 - centres.get(1)[1], within(0.011));
    assertThat(centres.get(2)[0]).isZero();
  }

  @Test
  void putsWhatHitTheLimit_onTheRails() {
    List<double[]> centres =
        circles(draw(new Dot(OPEN, s(1), 0), new Dot(s(1), OPEN, 0), new Dot(OPEN, OPEN, 0)));

    double rail = 332 - 22;
    assertThat(centres.get(0)[0]).isCloseTo(rail, within(0.01));
    assertThat(centres.get(0)[1]).isGreaterThan(44);
    assertThat(centres.get(1)[1]).isCloseTo(22, within(0.01));
    assertThat(centres.get(1)[0]).isLessThan(332 - 44);
    assertThat(centres.get(2)).containsExactly(new double[] {rail, 22}, within(0.01));
  }

  @Test
  void tellsHowMany_lieInTheCorner() {
    Dot both = new Dot(OPEN, OPEN, 0);

    assertThat(draw(both, both, both)).containsPattern("class=\"pile\"[^>]*>3<");
    assertThat(draw(both)).doesNotContain("class=\"pile\"");
  }

  @Test
  void drawsTheDiagonalAndTheGuides() {
    String svg = draw(new Dot(s(0.1), s(5), 0));

    assertThat(svg).containsOnlyOnce("class=\"equal\"").contains(">2×<", ">10×<");
    assertThat(svg.split("class=\"twice\"", -1)).hasSize(3);
    assertThat(svg.split("class=\"tenfold\"", -1)).hasSize(3);
  }

  @Test
  void tellsClassesApart_byColourAndShape() {
    Set<String> looks = new HashSet<>();
    for (int mark = 0; mark < 42; mark++) {
      looks.add(Scatter.legend(mark));
    }

    assertThat(looks).hasSize(42);
    assertThat(Scatter.legend(42)).isEqualTo(Scatter.legend(0));
  }

  @Test
  void hasATextAlternative_escaped() {
    String svg =
        Scatter.svg("p", "a <b> & \"c\"", "d > e", List.of(new Dot(s(1), s(2), 0)), 60, 0.001);

    assertThat(svg)
        .contains("role=\"img\" aria-labelledby=\"p-title p-desc\"")
        .contains("<title id=\"p-title\">a &lt;b&gt; &amp; &quot;c&quot;</title>")
        .contains("<desc id=\"p-desc\">d &gt; e</desc>");
  }

  @Test
  void isTheSame_whenDrawnAgain_andBringsNothingOfItsOwn() {
    Dot[] dots = {new Dot(s(0.3), s(5), 0), new Dot(s(0.3), OPEN, 1), new Dot(s(3), s(4), 2)};

    assertThat(draw(dots)).isEqualTo(draw(dots));
    assertThat(draw(dots)).doesNotContain("http", "style=", "font", "rgb(", "clip");
  }

  @Test
  void needsNoDisplay(@TempDir Path folder) throws Exception {
    Path said = folder.resolve("said");
    ProcessBuilder child =
        new ProcessBuilder(
            Path.of(System.getProperty("java.home"), "bin", "java").toString(),
            "-cp",
            System.getProperty("java.class.path"),
            DrawsOne.class.getName());
    child.environment().put("DISPLAY", ":4711");
    child.redirectErrorStream(true).redirectOutput(said.toFile());

    Process running = child.start();
    boolean ended = running.waitFor(2, TimeUnit.MINUTES);
    running.destroyForcibly();

    assertThat(ended).isTrue();
    assertThat(said).content(StandardCharsets.UTF_8).isEqualTo(draw(new Dot(s(1), s(2), 0)));
  }

  /** Draws a chart in a process of its own. */
  static final class DrawsOne {
    public static void main(String[] args) {
      System.out.writeBytes(draw(new Dot(s(1), s(2), 0)).getBytes(StandardCharsets.UTF_8));
      System.out.flush();
    }
  }
}
