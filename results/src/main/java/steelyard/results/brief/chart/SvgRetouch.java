package steelyard.results.brief.chart;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.xml.sax.SAXException;

/**
 * Takes the shapes out of a stand-alone SVG picture so that a page can hold and style them.
 *
 * <p>Keeps each shape's geometry, rounded to hundredths; replaces its style by the class that its
 * colour stands for; drops the document type, clipping paths, groups and shapes in {@link
 * Ink#NONE}. What it does not know it refuses, so that a new version of the chart library cannot
 * change the page unseen.
 */
final class SvgRetouch {

  private static final Map<String, List<String>> GEOMETRY =
      Map.of(
          "rect", List.of("x", "y", "width", "height"),
          "line", List.of("x1", "y1", "x2", "y2"),
          "ellipse", List.of("cx", "cy", "rx", "ry"),
          "path", List.of("d"));

  private static final Pattern NUMBER = Pattern.compile("-?\\d+(?:\\.\\d+)?(?:[eE]-?\\d+)?");
  private static final Pattern COLOUR =
      Pattern.compile("(?:fill|stroke):rgb\\((\\d+),(\\d+),(\\d+)\\);");

  private final Map<Integer, Ink> inks;

  /** A retoucher for pictures that are drawn with these inks alone. */
  SvgRetouch(Collection<Ink> inks) {
    this.inks =
        inks.stream().distinct().collect(Collectors.toMap(ink -> ink.stand().getRGB(), ink -> ink));
  }

  /**
   * The shapes, one a line.
   *
   * @throws IllegalStateException if the picture holds anything else
   */
  String shapes(byte[] svg) {
    StringBuilder kept = new StringBuilder();
    collect(parse(svg).getDocumentElement(), kept);
    return kept.toString();
  }

  private void collect(Element parent, StringBuilder kept) {
    for (Node node = parent.getFirstChild(); node != null; node = node.getNextSibling()) {
      if (!(node instanceof Element element) || element.getTagName().equals("defs")) {
        continue;
      }
      if (element.getTagName().equals("g")) {
        refuse(element.hasAttribute("transform"), "a moved group", element);
        collect(element, kept);
      } else {
        shape(element, kept);
      }
    }
  }

  private void shape(Element element, StringBuilder kept) {
    List<String> attributes = GEOMETRY.get(element.getTagName());
    refuse(attributes == null, "an unknown shape", element);
    Ink ink = ink(element);
    if (ink.cssClass().isEmpty()) {
      return;
    }
    kept.append('<').append(element.getTagName());
    kept.append(" class=\"").append(ink.cssClass()).append('"');
    for (String name : attributes) {
      kept.append(' ').append(name).append("=\"");
      kept.append(rounded(element.getAttribute(name))).append('"');
    }
    kept.append("/>\n");
  }

  private Ink ink(Element element) {
    Matcher colour = COLOUR.matcher(element.getAttribute("style"));
    refuse(!colour.find(), "a shape without colour", element);
    int rgb =
        0xff000000
            | Integer.parseInt(colour.group(1)) << 16
            | Integer.parseInt(colour.group(2)) << 8
            | Integer.parseInt(colour.group(3));
    refuse(!inks.containsKey(rgb), "a colour that stands for nothing", element);
    return inks.get(rgb);
  }

  private static void refuse(boolean unknown, String what, Element element) {
    if (unknown) {
      Map<String, String> shown = new TreeMap<>();
      for (int i = 0; i < element.getAttributes().getLength(); i++) {
        Node attribute = element.getAttributes().item(i);
        shown.put(attribute.getNodeName(), attribute.getNodeValue());
      }
      throw new IllegalStateException(
          "the chart library drew " + what + ": " + element.getTagName() + " " + shown);
    }
  }

  /** The numbers of an attribute to hundredths, without needless zeros. */
  static String rounded(String numbers) {
    return NUMBER
        .matcher(numbers)
        .replaceAll(
            match ->
                new BigDecimal(match.group())
                    .setScale(2, RoundingMode.HALF_UP)
                    .stripTrailingZeros()
                    .toPlainString());
  }

  private static Document parse(byte[] svg) {
    try {
      DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
      factory.setFeature("http://apache.org/xml/features/nonvalidating/load-external-dtd", false);
      return factory.newDocumentBuilder().parse(new ByteArrayInputStream(svg));
    } catch (ParserConfigurationException | SAXException | IOException e) {
      throw new IllegalStateException("the chart library drew what is not XML", e);
    }
  }
}
