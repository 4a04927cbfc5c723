package steelyard.harness.sweep.text;

import java.util.ArrayList;
import java.util.List;
import org.yaml.snakeyaml.LoaderOptions;
import org.yaml.snakeyaml.error.Mark;
import org.yaml.snakeyaml.error.MarkedYAMLException;
import org.yaml.snakeyaml.error.YAMLException;
import org.yaml.snakeyaml.events.AliasEvent;
import org.yaml.snakeyaml.events.Event;
import org.yaml.snakeyaml.events.MappingStartEvent;
import org.yaml.snakeyaml.events.NodeEvent;
import org.yaml.snakeyaml.events.ScalarEvent;
import org.yaml.snakeyaml.events.SequenceStartEvent;
import org.yaml.snakeyaml.parser.Parser;
import org.yaml.snakeyaml.parser.ParserImpl;
import org.yaml.snakeyaml.reader.ReaderException;
import org.yaml.snakeyaml.reader.StreamReader;

/**
 * Reads YAML into located nodes, from parser events, so that no scalar is guessed into a number, a
 * date or a Boolean before its reader asks for one.
 *
 * <p>Anchors, aliases and tags are refused: they save little in files this small, and they hide
 * what a value is and where it stands.
 */
final class Yaml {

  private static final int DEEPEST = 20;

  private final String file;
  private final Parser parser;

  private Yaml(String file, String text) {
    this.file = file;
    this.parser = new ParserImpl(new StreamReader(text), new LoaderOptions());
  }

  /**
   * The text's one document.
   *
   * @throws SweepProblem if the text is empty, not YAML or more than one document
   */
  static Node read(String file, String text) {
    try {
      return new Yaml(file, text).document();
    } catch (MarkedYAMLException e) {
      throw malformed(file, text, e);
    } catch (ReaderException e) {
      int before = (int) text.codePoints().limit(e.getPosition()).filter(c -> c == '\n').count();
      throw Mistakes.only(
          Place.of(file).line(before + 1),
          String.format("a control character (U+%04X) does not belong here", e.getCodePoint()));
    } catch (YAMLException e) {
      throw Mistakes.only(Place.of(file), "not YAML: " + oneLine(e.getMessage()));
    }
  }

  private Node document() {
    parser.getEvent();
    if (parser.checkEvent(Event.ID.StreamEnd)) {
      throw Mistakes.only(Place.of(file), "is empty");
    }
    parser.getEvent();
    Node root = node(0);
    parser.getEvent();
    if (!parser.checkEvent(Event.ID.StreamEnd)) {
      throw at(parser.peekEvent(), "a second document starts here; one file holds one document");
    }
    return root;
  }

  private Node node(int depth) {
    Event event = parser.getEvent();
    if (depth > DEEPEST) {
      throw at(event, "nested more than " + DEEPEST + " deep");
    }
    refuseReferences(event);
    Place place = place(event);
    if (event instanceof ScalarEvent scalar) {
      return new Node.Scalar(place, scalar.getValue(), !scalar.isPlain());
    }
    return event instanceof SequenceStartEvent ? items(place, depth) : entries(place, depth);
  }

  private Node items(Place place, int depth) {
    List<Node> items = new ArrayList<>();
    while (!parser.checkEvent(Event.ID.SequenceEnd)) {
      items.add(node(depth + 1));
    }
    parser.getEvent();
    return new Node.Items(place, items);
  }

  private Node entries(Place place, int depth) {
    List<Node.Entry> entries = new ArrayList<>();
    while (!parser.checkEvent(Event.ID.MappingEnd)) {
      Event start = parser.peekEvent();
      if (node(depth + 1) instanceof Node.Scalar key && !key.missing()) {
        entries.add(new Node.Entry(key, node(depth + 1)));
      } else {
        throw at(start, "a key must be a word");
      }
    }
    parser.getEvent();
    return new Node.Entries(place, entries);
  }

  private void refuseReferences(Event event) {
    if (event instanceof AliasEvent alias) {
      throw at(event, "aliases are not taken here; write the value out for *" + alias.getAnchor());
    }
    if (event instanceof NodeEvent named && named.getAnchor() != null) {
      throw at(event, "anchors are not taken here; drop &" + named.getAnchor());
    }
    String tag = tag(event);
    if (tag != null) {
      throw at(event, "tags are not taken here; drop " + Phrases.quoted(tag));
    }
  }

  private static String tag(Event event) {
    if (event instanceof ScalarEvent scalar) {
      return scalar.getTag();
    }
    if (event instanceof SequenceStartEvent sequence) {
      return sequence.getTag();
    }
    return event instanceof MappingStartEvent mapping ? mapping.getTag() : null;
  }

  private Place place(Event event) {
    Mark mark = event.getStartMark();
    return new Place(file, mark.getLine() + 1, mark.getColumn() + 1);
  }

  private SweepProblem at(Event event, String what) {
    return Mistakes.only(place(event), what);
  }

  private static SweepProblem malformed(String file, String text, MarkedYAMLException e) {
    Mark mark = e.getProblemMark();
    if (mark == null) {
      return Mistakes.only(Place.of(file), "not YAML: " + oneLine(e.getProblem()));
    }
    Place place = new Place(file, mark.getLine() + 1, mark.getColumn() + 1);
    if (isIndentedByTab(text, mark.getLine())) {
      return Mistakes.only(place, "a tab indents this line; YAML takes spaces only");
    }
    Mark start = e.getContextMark();
    String context =
        start == null || start.getLine() == mark.getLine()
            ? ""
            : " ("
                + oneLine(e.getContext())
                + " that starts in line "
                + (start.getLine() + 1)
                + ")";
    return Mistakes.only(place, "not YAML: " + oneLine(e.getProblem()) + context);
  }

  private static boolean isIndentedByTab(String text, int line) {
    String whole = text.lines().skip(line).findFirst().orElse("");
    return whole.substring(0, whole.length() - whole.stripLeading().length()).contains("\t");
  }

  private static String oneLine(String text) {
    return text.strip().replaceAll("\\s*\\R\\s*", " ");
  }
}
