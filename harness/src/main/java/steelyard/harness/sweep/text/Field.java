package steelyard.harness.sweep.text;

import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.function.Function;
import java.util.regex.Pattern;

/**
 * A value of a file while it is being read: knows its path and place, and notes what is wrong with
 * it. A question that the value cannot answer gives an empty answer and a mistake, so that a reader
 * goes on and finds the next one.
 */
public final class Field {

  private static final Pattern WHOLE = Pattern.compile("-?[0-9]{1,18}");
  private static final Pattern NUMBER = Pattern.compile("-?[0-9]{1,18}(\\.[0-9]{1,18})?");
  private static final Pattern NAME = Pattern.compile("[A-Za-z0-9][A-Za-z0-9._-]{0,63}");
  private static final String NAMES =
      "a name has letters, digits, '.', '-' and '_', at most 64, a letter or digit first";

  private final String path;
  private final Node node;
  private final Place keyPlace;
  private final Mistakes mistakes;

  private Field(String path, Node node, Place keyPlace, Mistakes mistakes) {
    this.path = path;
    this.node = node;
    this.keyPlace = keyPlace;
    this.mistakes = mistakes;
  }

  /**
   * The root of a YAML text.
   *
   * @param file the file's name in messages
   * @throws SweepProblem if the text is empty or not YAML
   */
  public static Field ofYaml(String file, String text, Mistakes mistakes) {
    Node root = Yaml.read(file, text);
    return new Field("", root, root.place(), mistakes);
  }

  /** Notes that something is wrong with this value. */
  public void mistake(String what, String... advice) {
    mistakes.add(node.place(), path, what, advice);
  }

  /** Notes that something is wrong with this value's key. */
  public void mistakeInKey(String what, String... advice) {
    mistakes.add(keyPlace, path, what, advice);
  }

  /** Notes that the value names something that is not there. */
  public void unknown(String kind, String found, Collection<String> known) {
    mistake(Phrases.unknown(kind, found, known), Phrases.known(known));
  }

  /** Whether it is a single value, be it a good one or not. */
  public boolean isSingle() {
    return node instanceof Node.Scalar;
  }

  /** Whether it has keys. */
  public boolean hasKeys() {
    return node instanceof Node.Entries;
  }

  /** The text of a single value, without outer space; empty if it is none. */
  public Optional<String> text() {
    Optional<Node.Scalar> scalar = single("a text");
    if (scalar.isPresent() && scalar.get().text().isBlank()) {
      mistake("an empty text");
      return Optional.empty();
    }
    return scalar.map(s -> s.text().strip());
  }

  /** A name of the person's own: letters, digits, dot, dash and underscore, up to 64. */
  public Optional<String> name() {
    Optional<String> text = text();
    if (text.isPresent() && !NAME.matcher(text.get()).matches()) {
      mistake(Phrases.quoted(text.get()) + " cannot be a name", NAMES);
      return Optional.empty();
    }
    return text;
  }

  /** Whether {@code key}, this value's key, is a name as {@link #name()} takes it. */
  public boolean isNamed(String key) {
    boolean named = NAME.matcher(key).matches();
    if (!named) {
      mistakeInKey(Phrases.quoted(key) + " cannot be a name", NAMES);
    }
    return named;
  }

  /** A whole number in {@code low..high}. */
  public OptionalLong whole(long low, long high) {
    Optional<String> text = number("a whole number", WHOLE);
    if (text.isEmpty()) {
      return OptionalLong.empty();
    }
    long value = Long.parseLong(text.get());
    if (value < low || value > high) {
      mistake(value + " is not in " + low + ".." + high);
      return OptionalLong.empty();
    }
    return OptionalLong.of(value);
  }

  /** A whole number in {@code low..high} that is an int. */
  public OptionalInt count(int low, int high) {
    OptionalLong value = whole(low, high);
    return value.isPresent() ? OptionalInt.of((int) value.getAsLong()) : OptionalInt.empty();
  }

  /** A number, whole or not, that is at least {@code low}. */
  public OptionalDouble atLeast(long low) {
    Optional<String> text = number("a number", NUMBER);
    if (text.isEmpty()) {
      return OptionalDouble.empty();
    }
    double value = Double.parseDouble(text.get());
    if (value < low) {
      mistake(text.get() + " is less than " + low);
      return OptionalDouble.empty();
    }
    return OptionalDouble.of(value);
  }

  /** What {@code reading} makes of the text; its {@link IllegalArgumentException} is a mistake. */
  public <T> Optional<T> parsed(Function<String, T> reading) {
    return text()
        .flatMap(
            text -> {
              try {
                return Optional.of(reading.apply(text));
              } catch (IllegalArgumentException e) {
                mistake(e.getMessage());
                return Optional.empty();
              }
            });
  }

  /** The items of a list; an empty list is a mistake. */
  public List<Field> items() {
    if (!(node instanceof Node.Items list)) {
      mistake("expected a list, found " + found());
      return List.of();
    }
    if (list.items().isEmpty()) {
      mistake("an empty list");
    }
    List<Field> fields = new ArrayList<>();
    for (Node item : list.items()) {
      fields.add(new Field(path + "[" + fields.size() + "]", item, item.place(), mistakes));
    }
    return fields;
  }

  /** The items of a list, or this value alone where it is not a list. */
  public List<Field> itemsOrAlone() {
    return node instanceof Node.Items ? items() : List.of(this);
  }

  /** The values by key, in the order of the file; a key that is written twice is a mistake. */
  public Map<String, Field> entries() {
    if (!(node instanceof Node.Entries mapping)) {
      mistake("expected keys with values, found " + found());
      return Map.of();
    }
    Map<String, Field> fields = new LinkedHashMap<>();
    for (Node.Entry entry : mapping.entries()) {
      String key = entry.key().text();
      String below = path.isEmpty() ? key : path + "." + key;
      Field field = new Field(below, entry.value(), entry.key().place(), mistakes);
      Field first = fields.putIfAbsent(key, field);
      if (first != null) {
        field.mistakeInKey("written twice; first in line " + first.keyPlace.line());
      }
    }
    return fields;
  }

  /** As {@link #entries()}; a key that is not known is a mistake. */
  public Map<String, Field> entries(Collection<String> known) {
    Map<String, Field> fields = entries();
    fields.forEach(
        (key, field) -> {
          if (!known.contains(key)) {
            mistakes.add(
                field.keyPlace, path, Phrases.unknown("key", key, known), Phrases.known(known));
          }
        });
    return fields;
  }

  private Optional<String> number(String wanted, Pattern shape) {
    Optional<Node.Scalar> scalar = single(wanted);
    if (scalar.isEmpty()) {
      return Optional.empty();
    }
    String text = scalar.get().text();
    if (scalar.get().quoted()) {
      mistake(Phrases.quoted(text) + " is a text here; write " + wanted + " without quotes");
      return Optional.empty();
    }
    if (!shape.matcher(text).matches()) {
      mistake(Phrases.quoted(text) + " is not " + wanted);
      return Optional.empty();
    }
    return Optional.of(text);
  }

  private Optional<Node.Scalar> single(String wanted) {
    if (node instanceof Node.Scalar scalar && !scalar.missing()) {
      return Optional.of(scalar);
    }
    mistake("expected " + wanted + ", found " + found());
    return Optional.empty();
  }

  private String found() {
    if (node instanceof Node.Scalar scalar) {
      return scalar.missing() ? "nothing" : Phrases.quoted(scalar.text());
    }
    return node instanceof Node.Items ? "a list" : "keys with values";
  }
}
