package steelyard.results.brief.chart;

import java.awt.Color;

/**
 * A colour that only stands for a class of the page's style sheet.
 *
 * @param stand what the chart library is told to draw with; no two inks share one
 * @param cssClass what the drawn shape gets instead; empty for a shape that is to go
 */
record Ink(Color stand, String cssClass) {

  /** For what the library draws and nobody wants. */
  static final Ink NONE = new Ink(new Color(1, 0, 0), "");
}
