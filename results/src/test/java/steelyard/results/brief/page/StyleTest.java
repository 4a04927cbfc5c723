package steelyard.results.brief.page;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Pattern;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Contrast of text (at least 4.5, success criterion 1.4.3, level AA) and of what a chart draws (at
 * least 3, criterion 1.4.11) by the formula of WCAG 2.2, definitions "relative luminance" and
 * "contrast ratio" (W3C Recommendation, 2023).
 */
class StyleTest {

  private static final Pattern COLOUR = Pattern.compile("--(\\w+): #([0-9a-f]{6});");
  private static final List<String> GROUNDS = List.of("paper", "card", "faint");

  private static Map<String, Integer> colours(String scheme) throws Exception {
    try (InputStream in = HtmlPage.class.getResourceAsStream("brief.css")) {
      String css = new String(in.readAllBytes(), StandardCharsets.UTF_8);
      int dark = css.indexOf("prefers-color-scheme: dark");
      String block = scheme.equals("light") ? css.substring(0, dark) : css.substring(dark);
      Map<String, Integer> colours = new HashMap<>();
      COLOUR
          .matcher(block.substring(0, block.indexOf("--k5") + 15))
          .results()
          .forEach(m -> colours.put(m.group(1), Integer.parseInt(m.group(2), 16)));
      return colours;
    }
  }

  private static double luminance(int rgb) {
    return 0.2126 * linear(rgb >> 16 & 255)
        + 0.7152 * linear(rgb >> 8 & 255)
        + 0.0722 * linear(rgb & 255);
  }

  private static double linear(int channel) {
    double share = channel / 255.0;
    return share <= 0.04045 ? share / 12.92 : Math.pow((share + 0.055) / 1.055, 2.4);
  }

  private static double contrast(int a, int b) {
    double lighter = Math.max(luminance(a), luminance(b));
    double darker = Math.min(luminance(a), luminance(b));
    return (lighter + 0.05) / (darker + 0.05);
  }

  @ParameterizedTest
  @ValueSource(strings = {"light", "dark"})
  void textStandsOut_onEveryGround(String scheme) throws Exception {
    Map<String, Integer> colours = colours(scheme);

    for (String text : List.of("ink", "soft", "brass", "better", "worse")) {
      for (String ground : GROUNDS) {
        assertThat(contrast(colours.get(text), colours.get(ground)))
            .as("%s on %s", text, ground)
            .isGreaterThanOrEqualTo(4.5);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"light", "dark"})
  void marksStandOut_onEveryGround(String scheme) throws Exception {
    Map<String, Integer> colours = colours(scheme);

    for (int mark = 0; mark < 6; mark++) {
      for (String ground : GROUNDS) {
        assertThat(contrast(colours.get("k" + mark), colours.get(ground)))
            .as("k%s on %s", mark, ground)
            .isGreaterThanOrEqualTo(3);
      }
    }
  }
}
