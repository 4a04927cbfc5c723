package steelyard.results.brief.chart;

import static steelyard.results.brief.chart.SvgText.label;

import java.math.BigDecimal;
import java.math.MathContext;

/** The words and numbers around and within a scatter, placed by its scale. */
final class ScatterLabels {

  private final LogScale scale;
  private final double side;
  private final double limitAt;

  ScatterLabels(LogScale scale) {
    this.scale = scale;
    this.side = scale.length();
    this.limitAt = scale.at(scale.limit());
  }

  /**
   * All labels, relative to the plot's upper left corner.
   *
   * @param bothOpen how many pairs lie on top of each other in the corner
   */
  String all(long bothOpen) {
    StringBuilder labels = new StringBuilder();
    axes(labels);
    guide(labels, 2);
    guide(labels, 10);
    labels.append(label("side", 7, side - limitAt + 17, "start", "after slower"));
    labels.append(label("side", limitAt - 7, side - 9, "end", "after faster"));
    if (bothOpen > 1) {
      labels.append(label("pile", side - 3, 13, "end", Long.toString(bothOpen)));
    }
    return labels.toString();
  }

  private void axes(StringBuilder labels) {
    for (double tick : scale.ticks()) {
      labels.append(label("tick", scale.at(tick), side + 17, "middle", number(tick)));
      labels.append(label("tick", -6, side - scale.at(tick) + 5, "end", number(tick)));
    }
    String limit = number(scale.limit());
    double rail = (limitAt + side) / 2;
    labels.append(label("tick", limitAt + 3, side + 17, "end", limit));
    labels.append(label("tick", -6, side - limitAt + 5, "end", limit));
    labels.append(label("tick", side, side + 17, "end", "open"));
    labels.append(label("tick", -6, side - rail + 5, "end", "open"));
    labels.append(label("axis", limitAt / 2, side + 38, "middle", "before, seconds"));
    labels.append("<g transform=\"rotate(-90)\">");
    labels.append(label("axis", limitAt / 2 - side, -44, "middle", "after, seconds"));
    labels.append("</g>\n");
  }

  /** Names a guide where it meets the rails. */
  private void guide(StringBuilder labels, int factor) {
    if (scale.lowest() * factor < scale.limit()) {
      double at = scale.at(scale.limit() / factor);
      labels.append(label("factor", at, side - limitAt - 4, "middle", factor + "×"));
      labels.append(label("factor", limitAt + 3, side - at + 5, "start", factor + "×"));
    }
  }

  private static String number(double seconds) {
    return new BigDecimal(seconds).round(new MathContext(3)).stripTrailingZeros().toPlainString();
  }
}
