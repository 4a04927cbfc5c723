package steelyard.harness.worker;

import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import java.io.IOException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.LongStream;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;

/** The fields of one JSON object; asks for each by name and type and says what is amiss. */
final class Fields {
  private final Map<String, Object> values;

  private Fields(Map<String, Object> values) {
    this.values = values;
  }

  /**
   * Reads the object at which the parser stands.
   *
   * @throws IOException if the text is not a JSON object
   */
  static Fields read(JsonParser parser) throws IOException {
    if (parser.nextToken() != JsonToken.START_OBJECT) {
      throw new IOException("expected a JSON object");
    }
    return new Fields(object(parser));
  }

  private static Map<String, Object> object(JsonParser parser) throws IOException {
    Map<String, Object> object = new LinkedHashMap<>();
    while (parser.nextToken() == JsonToken.FIELD_NAME) {
      String name = parser.currentName();
      parser.nextToken();
      object.put(name, value(parser));
    }
    if (parser.currentToken() != JsonToken.END_OBJECT) {
      throw new IOException("a JSON object breaks off");
    }
    return object;
  }

  private static Object value(JsonParser parser) throws IOException {
    return switch (parser.currentToken()) {
      case START_OBJECT -> object(parser);
      case START_ARRAY -> array(parser);
      case VALUE_STRING -> parser.getText();
      case VALUE_NUMBER_INT -> parser.getLongValue();
      case VALUE_NUMBER_FLOAT -> parser.getDoubleValue();
      case VALUE_TRUE -> true;
      case VALUE_FALSE -> false;
      default -> throw new IOException("unexpected " + parser.currentToken());
    };
  }

  /** An array of whole numbers is kept flat: solutions are long. */
  private static Object array(JsonParser parser) throws IOException {
    LongStream.Builder numbers = LongStream.builder();
    List<Object> others = new ArrayList<>();
    while (parser.nextToken() != JsonToken.END_ARRAY) {
      if (parser.currentToken() == JsonToken.VALUE_NUMBER_INT) {
        numbers.add(parser.getLongValue());
      } else {
        others.add(value(parser));
      }
    }
    return others.isEmpty() ? numbers.build().toArray() : others;
  }

  boolean has(String name) {
    return values.containsKey(name);
  }

  String text(String name) throws IOException {
    return get(name, String.class);
  }

  long number(String name) throws IOException {
    return get(name, Long.class);
  }

  int smallNumber(String name) throws IOException {
    return Math.toIntExact(number(name));
  }

  double real(String name) throws IOException {
    return get(name, Number.class).doubleValue();
  }

  boolean truth(String name) throws IOException {
    return get(name, Boolean.class);
  }

  Longs longs(String name) throws IOException {
    return Longs.of(get(name, long[].class));
  }

  Ints ints(String name) throws IOException {
    long[] numbers = get(name, long[].class);
    int[] ints = new int[numbers.length];
    for (int i = 0; i < ints.length; i++) {
      ints[i] = Math.toIntExact(numbers[i]);
    }
    return Ints.of(ints);
  }

  List<String> texts(String name) throws IOException {
    List<String> texts = new ArrayList<>();
    for (Object each : list(name)) {
      texts.add(cast(name, each, String.class));
    }
    return texts;
  }

  List<Fields> objects(String name) throws IOException {
    List<Fields> objects = new ArrayList<>();
    for (Object each : list(name)) {
      objects.add(of(name, each));
    }
    return objects;
  }

  Fields object(String name) throws IOException {
    return of(name, get(name, Object.class));
  }

  Optional<Fields> optionalObject(String name) throws IOException {
    return has(name) ? Optional.of(object(name)) : Optional.empty();
  }

  /** The object's fields by name, each made of the object and the field's name. */
  <T> SortedMap<String, T> map(String name, Reading<T> reading) throws IOException {
    Fields object = object(name);
    SortedMap<String, T> map = new TreeMap<>();
    for (String key : object.values.keySet()) {
      map.put(key, reading.read(object, key));
    }
    return map;
  }

  /** Reads one field of an object. */
  interface Reading<T> {
    T read(Fields object, String name) throws IOException;
  }

  private List<?> list(String name) throws IOException {
    Object value = get(name, Object.class);
    if (value instanceof long[] numbers && numbers.length == 0) {
      return List.of();
    }
    return cast(name, value, List.class);
  }

  private static Fields of(String name, Object value) throws IOException {
    Map<String, Object> fields = new LinkedHashMap<>();
    Map<?, ?> map = cast(name, value, Map.class);
    for (Map.Entry<?, ?> entry : map.entrySet()) {
      fields.put((String) entry.getKey(), entry.getValue());
    }
    return new Fields(fields);
  }

  private <T> T get(String name, Class<T> type) throws IOException {
    Object value = values.get(name);
    if (value == null) {
      throw new IOException("field '" + name + "' is missing");
    }
    return cast(name, value, type);
  }

  private static <T> T cast(String name, Object value, Class<T> type) throws IOException {
    if (!type.isInstance(value)) {
      throw new IOException(
          "field '" + name + "' is not of the expected type: " + value.getClass().getSimpleName());
    }
    return type.cast(value);
  }
}
