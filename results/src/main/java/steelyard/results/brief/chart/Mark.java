package steelyard.results.brief.chart;

import java.awt.Color;
import java.util.List;
import org.knowm.xchart.style.markers.Marker;
import org.knowm.xchart.style.markers.SeriesMarkers;

/** The colour and shape that tell one class of instances from another; 42 before they repeat. */
final class Mark {

  private static final List<Marker> SHAPES =
      List.of(
          SeriesMarkers.CIRCLE,
          SeriesMarkers.DIAMOND,
          SeriesMarkers.TRIANGLE_UP,
          SeriesMarkers.SQUARE,
          SeriesMarkers.CROSS,
          SeriesMarkers.TRIANGLE_DOWN,
          SeriesMarkers.PLUS);

  /** How many colours the style sheet gives, as {@code .k0} and so on. */
  static final int COLOURS = 6;

  private Mark() {}

  static Marker shape(int index) {
    return SHAPES.get(index % SHAPES.size());
  }

  static Ink ink(int index) {
    return new Ink(new Color(40, 0, index % COLOURS), "k" + index % COLOURS);
  }
}
