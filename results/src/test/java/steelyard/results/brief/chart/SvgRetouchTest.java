package steelyard.results.brief.chart;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.awt.Color;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;

class SvgRetouchTest {

  private static final SvgRetouch RETOUCH =
      new SvgRetouch(List.of(Ink.NONE, new Ink(new Color(2, 0, 1), "rail")));

  private static String shapes(String content) {
    String svg =
        "<?xml version=\"1.0\"?>\n<!DOCTYPE svg PUBLIC \"-//W3C//DTD SVG 1.1//EN\""
            + " \"http://invalid.invalid/svg11.dtd\">\n<svg xmlns=\"http://www.w3.org/2000/svg\">"
            + content
            + "</svg>";
    return RETOUCH.shapes(svg.getBytes(StandardCharsets.UTF_8));
  }

  @Test
  void keepsGeometry_andGivesTheClassOfTheColour() {
    assertThat(
            shapes(
                "<defs><clipPath id=\"c\"><rect x=\"0\" y=\"0\"/></clipPath></defs>"
                    + "<g clip-path=\"url(#c)\"><line style=\"fill:none;stroke:rgb(2,0,1);\""
                    + " x1=\"0\" y1=\"1.005\" x2=\"3.14159\" y2=\"340.0\"/></g>"))
        .isEqualTo("<line class=\"rail\" x1=\"0\" y1=\"1.01\" x2=\"3.14\" y2=\"340\"/>\n");
  }

  @Test
  void dropsWhatNobodyWants() {
    assertThat(shapes("<rect style=\"fill:rgb(1,0,0);stroke:none;\" x=\"0\" y=\"0\"/>")).isEmpty();
  }

  @Test
  void roundsEveryNumber_andNothingElse() {
    assertThat(SvgRetouch.rounded("M125.22649,-0.001 L1e-7,2.5E2 Z"))
        .isEqualTo("M125.23,0 L0,250 Z");
    assertThat(SvgRetouch.rounded("100")).isEqualTo("100");
  }

  @Test
  void refuses_whatItDoesNotKnow() {
    assertThatThrownBy(() -> shapes("<text style=\"fill:rgb(2,0,1);\">5</text>"))
        .hasMessageContaining("unknown shape: text");
    assertThatThrownBy(() -> shapes("<rect style=\"fill:rgb(9,9,9);\" x=\"1\"/>"))
        .hasMessageContaining("colour that stands for nothing");
    assertThatThrownBy(() -> shapes("<rect x=\"1\"/>")).hasMessageContaining("without colour");
    assertThatThrownBy(() -> shapes("<g transform=\"translate(1,1)\"/>"))
        .hasMessageContaining("moved group");
    assertThatThrownBy(() -> RETOUCH.shapes(new byte[] {1})).hasMessageContaining("not XML");
  }
}
