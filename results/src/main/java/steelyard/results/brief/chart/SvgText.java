package steelyard.results.brief.chart;

/** Text within an SVG fragment, escaped for XML and HTML alike. */
final class SvgText {

  private SvgText() {}

  /** An element that holds nothing but text. */
  static String element(String name, String id, String text) {
    return "<" + name + " id=\"" + id + "\">" + escaped(text) + "</" + name + ">\n";
  }

  /**
   * A label.
   *
   * @param anchor which point of the text lies at x, y: {@code start}, {@code middle} or {@code
   *     end} of its baseline
   */
  static String label(String cssClass, double x, double y, String anchor, String text) {
    return "<text class=\""
        + cssClass
        + "\" x=\""
        + SvgRetouch.rounded(Double.toString(x))
        + "\" y=\""
        + SvgRetouch.rounded(Double.toString(y))
        + "\" text-anchor=\""
        + anchor
        + "\">"
        + escaped(text)
        + "</text>\n";
  }

  static String escaped(String text) {
    return text.replace("&", "&amp;")
        .replace("<", "&lt;")
        .replace(">", "&gt;")
        .replace("\"", "&quot;")
        .replace("'", "&#39;");
  }
}
