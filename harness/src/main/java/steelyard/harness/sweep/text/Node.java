package steelyard.harness.sweep.text;

import java.util.List;

/** A value of a file with its place: the file's tree before anybody has asked what it means. */
sealed interface Node {

  Place place();

  /**
   * A single value.
   *
   * @param quoted whether quotes or a block mark it as text
   */
  record Scalar(Place place, String text, boolean quoted) implements Node {

    /** Whether there is no value: nothing at all, {@code ~} or {@code null}. */
    boolean missing() {
      return !quoted && (text.isEmpty() || text.equals("~") || text.equals("null"));
    }
  }

  /** A list. */
  record Items(Place place, List<Node> items) implements Node {
    public Items {
      items = List.copyOf(items);
    }
  }

  /** Keys with values, as written: a key may come twice. */
  record Entries(Place place, List<Entry> entries) implements Node {
    public Entries {
      entries = List.copyOf(entries);
    }
  }

  /** A key and its value. */
  record Entry(Scalar key, Node value) {}
}
