package steelyard.results.brief.page;

import gg.jte.ContentType;
import gg.jte.TemplateEngine;
import gg.jte.output.StringOutput;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Map;
import steelyard.results.brief.Facts;

/**
 * The brief as one HTML page that needs nothing beside it: no script, no network, no font, no other
 * file. Equal facts give equal bytes.
 */
public final class HtmlPage {

  private static final String TEMPLATES = "steelyard.results.brief.templates";
  private static final TemplateEngine ENGINE =
      TemplateEngine.createPrecompiled(
          null, ContentType.Html, HtmlPage.class.getClassLoader(), TEMPLATES);

  private HtmlPage() {}

  /** Writes the page, replacing what was there at once. */
  public static void write(Facts facts, Path file) throws IOException {
    Moved.into(file, html(facts));
  }

  /** The page. */
  public static String html(Facts facts) {
    StringOutput output = new StringOutput();
    ENGINE.render(
        "brief.jte",
        Map.of(
            "facts",
            facts,
            "anchors",
            new Anchors(facts),
            "charts",
            new PairChart(facts),
            "style",
            style()),
        output);
    return output.toString();
  }

  private static String style() {
    try (InputStream css = HtmlPage.class.getResourceAsStream("brief.css")) {
      return new String(css.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new IllegalStateException("the page's style sheet cannot be read", e);
    }
  }
}
