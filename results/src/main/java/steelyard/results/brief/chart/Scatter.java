package steelyard.results.brief.chart;

import java.awt.BasicStroke;
import java.awt.Color;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.function.Function;
import java.util.function.ToDoubleFunction;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.knowm.xchart.VectorGraphicsEncoder;
import org.knowm.xchart.VectorGraphicsEncoder.VectorGraphicsFormat;
import org.knowm.xchart.XYChart;
import org.knowm.xchart.XYChartBuilder;
import org.knowm.xchart.XYSeries;
import org.knowm.xchart.XYSeries.XYSeriesRenderStyle;
import org.knowm.xchart.style.XYStyler;
import org.knowm.xchart.style.lines.SeriesLines;
import org.knowm.xchart.style.markers.SeriesMarkers;
import steelyard.results.statistics.SolveTime;

/**
 * Did after take longer than before, pair by pair? A scatter of solve times on equal logarithmic
 * axes, before to the right, after upwards: below the diagonal after is faster.
 *
 * <p>Guides show factors of 2 and 10. A run that had not answered by its limit is not a time: it
 * lies on a rail beyond the axis (common practice), and pairs of two such runs in the corner where
 * the rails meet.
 */
public final class Scatter {

  static {
    // Before the first colour: the toolkit looks for a display once, and fails if it is a dead one.
    if (System.getProperty("java.awt.headless") == null) {
      System.setProperty("java.awt.headless", "true");
    }
  }

  /**
   * One pair of runs.
   *
   * @param mark which class it belongs to, from 0; gives its colour and shape
   */
  public record Dot(SolveTime before, SolveTime after, int mark) {
    public Dot {
      Objects.requireNonNull(before, "before");
      Objects.requireNonNull(after, "after");
    }
  }

  private static final int SIDE = 332;
  private static final int RAIL = 44;
  private static final int LEFT = 56;
  private static final int TOP = 12;
  private static final int WIDTH = 400;
  private static final int HEIGHT = 400;
  private static final int MARK_SIZE = 9;

  private static final Ink PLOT = new Ink(new Color(2, 0, 0), "plot");
  private static final Ink RAILS = new Ink(new Color(2, 0, 1), "rail");
  private static final Ink GRID = new Ink(new Color(2, 0, 2), "grid");
  private static final Ink EQUAL = new Ink(new Color(2, 0, 3), "equal");
  private static final Ink TWICE = new Ink(new Color(2, 0, 4), "twice");
  private static final Ink TENFOLD = new Ink(new Color(2, 0, 5), "tenfold");

  private final LogScale scale;

  private Scatter(LogScale scale) {
    this.scale = scale;
  }

  /**
   * The chart as one {@code svg} element.
   *
   * @param id unique in the page, letters, digits and dashes
   * @param title what it shows, in a few words; plain text
   * @param description what can be read from it; plain text
   * @param dots at least one
   * @param limitSeconds the longest limit of the runs
   * @param floorSeconds times below count as this
   */
  public static String svg(
      String id,
      String title,
      String description,
      List<Dot> dots,
      double limitSeconds,
      double floorSeconds) {
    double shortest =
        dots.stream()
            .flatMap(dot -> Stream.of(dot.before(), dot.after()))
            .filter(time -> !time.censored())
            .mapToDouble(SolveTime::seconds)
            .map(seconds -> Math.max(seconds, floorSeconds))
            .min()
            .orElse(0);
    LogScale scale = LogScale.covering(shortest, floorSeconds, limitSeconds, SIDE, RAIL);
    return new Scatter(scale).draw(id, title, description, dots);
  }

  /** The mark of a class by itself, as an {@code svg} element for the head of a table's row. */
  public static String legend(int mark) {
    XYChart chart = emptyChart(40);
    chart.getStyler().setXAxisMin(0.0).setXAxisMax(2.0).setYAxisMin(0.0).setYAxisMax(2.0);
    marks(chart, "mark", new double[] {1}, new double[] {1}, mark);
    return "<svg class=\"mark\" viewBox=\"13 13 14 14\" aria-hidden=\"true\">"
        + shapes(chart).strip()
        + "</svg>";
  }

  private String draw(String id, String title, String description, List<Dot> dots) {
    XYChart chart = emptyChart(SIDE);
    chart.getStyler().setXAxisLogarithmic(true).setYAxisLogarithmic(true);
    chart.getStyler().setXAxisMin(scale.lowest()).setXAxisMax(scale.end());
    chart.getStyler().setYAxisMin(scale.lowest()).setYAxisMax(scale.end());
    rails(chart);
    grid(chart);
    guides(chart);
    dots(chart, dots);
    return "<svg class=\"chart\" viewBox=\"0 0 "
        + WIDTH
        + " "
        + HEIGHT
        + "\" role=\"img\" aria-labelledby=\""
        + id
        + "-title "
        + id
        + "-desc\">\n"
        + SvgText.element("title", id + "-title", title)
        + SvgText.element("desc", id + "-desc", description)
        + "<g transform=\"translate("
        + LEFT
        + " "
        + TOP
        + ")\">\n"
        + shapes(chart)
        + new ScatterLabels(scale).all(bothOpen(dots))
        + "</g>\n</svg>";
  }

  private static long bothOpen(List<Dot> dots) {
    return dots.stream().filter(dot -> dot.before().censored() && dot.after().censored()).count();
  }

  private static XYChart emptyChart(int side) {
    XYChart chart = new XYChartBuilder().width(side).height(side).build();
    XYStyler styler = chart.getStyler();
    styler.setChartTitleVisible(false).setLegendVisible(false).setChartPadding(0);
    styler.setAxisTitlesVisible(false).setAxisTicksVisible(false).setAxisTicksMarksVisible(false);
    styler.setPlotMargin(0).setPlotContentSize(1);
    styler.setPlotGridLinesVisible(false).setPlotBorderVisible(false);
    styler.setChartBackgroundColor(Ink.NONE.stand());
    styler.setPlotBackgroundColor(side == SIDE ? PLOT.stand() : Ink.NONE.stand());
    styler.setMarkerSize(MARK_SIZE);
    return chart;
  }

  private void rails(XYChart chart) {
    double low = scale.lowest();
    double limit = scale.limit();
    double end = scale.end();
    area(
        chart,
        "before rail",
        new double[] {limit, end, end, limit},
        new double[] {low, low, end, end});
    area(
        chart,
        "after rail",
        new double[] {low, limit, limit, low},
        new double[] {limit, limit, end, end});
  }

  private static void area(XYChart chart, String name, double[] x, double[] y) {
    XYSeries series = chart.addSeries(name, x, y);
    series.setXYSeriesRenderStyle(XYSeriesRenderStyle.PolygonArea);
    series.setMarker(SeriesMarkers.NONE);
    series.setLineStyle(SeriesLines.NONE);
    series.setFillColor(RAILS.stand());
  }

  private void grid(XYChart chart) {
    List<Double> ticks = new ArrayList<>(scale.ticks());
    ticks.add(scale.limit());
    for (double tick : ticks) {
      line(chart, "x " + tick, tick, scale.lowest(), tick, scale.limit(), GRID);
      line(chart, "y " + tick, scale.lowest(), tick, scale.limit(), tick, GRID);
    }
  }

  /** The lines after = factor · before, within the square below both rails. */
  private void guides(XYChart chart) {
    double low = scale.lowest();
    double limit = scale.limit();
    line(chart, "equal", low, low, limit, limit, EQUAL);
    for (int factor : new int[] {2, 10}) {
      if (low * factor < limit) {
        Ink ink = factor == 2 ? TWICE : TENFOLD;
        line(chart, factor + " times", low, low * factor, limit / factor, limit, ink);
        line(chart, "1/" + factor, low * factor, low, limit, limit / factor, ink);
      }
    }
  }

  private static void line(
      XYChart chart, String name, double x1, double y1, double x2, double y2, Ink ink) {
    XYSeries series = chart.addSeries(name, new double[] {x1, x2}, new double[] {y1, y2});
    series.setXYSeriesRenderStyle(XYSeriesRenderStyle.Line);
    series.setMarker(SeriesMarkers.NONE);
    series.setLineStyle(new BasicStroke(1));
    series.setLineColor(ink.stand());
  }

  private void dots(XYChart chart, List<Dot> dots) {
    int marks = dots.stream().mapToInt(Dot::mark).max().orElse(0);
    for (int mark = 0; mark <= marks; mark++) {
      int wanted = mark;
      List<Dot> some = dots.stream().filter(dot -> dot.mark() == wanted).toList();
      if (!some.isEmpty()) {
        marks(chart, "mark " + mark, along(some, Dot::before), along(some, Dot::after), mark);
      }
    }
  }

  private double[] along(List<Dot> dots, Function<Dot, SolveTime> side) {
    ToDoubleFunction<SolveTime> place =
        time -> time.censored() ? scale.railMiddle() : Math.max(time.seconds(), scale.lowest());
    return dots.stream().map(side).mapToDouble(place).toArray();
  }

  private static void marks(XYChart chart, String name, double[] x, double[] y, int mark) {
    XYSeries series = chart.addSeries(name, x, y);
    series.setXYSeriesRenderStyle(XYSeriesRenderStyle.Scatter);
    series.setMarker(Mark.shape(mark));
    series.setMarkerColor(Mark.ink(mark).stand());
  }

  private static String shapes(XYChart chart) {
    ByteArrayOutputStream svg = new ByteArrayOutputStream();
    try {
      VectorGraphicsEncoder.saveVectorGraphic(chart, svg, VectorGraphicsFormat.SVG);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    List<Ink> inks = new ArrayList<>(List.of(Ink.NONE, PLOT, RAILS, GRID, EQUAL, TWICE, TENFOLD));
    IntStream.range(0, Mark.COLOURS).mapToObj(Mark::ink).forEach(inks::add);
    return new SvgRetouch(inks).shapes(svg.toByteArray());
  }
}
