package steelyard.harness.sweep;

import com.fasterxml.jackson.annotation.JsonSubTypes;
import com.fasterxml.jackson.annotation.JsonTypeInfo;
import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadFeature;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.databind.DeserializationContext;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.JsonMappingException;
import com.fasterxml.jackson.databind.MapperFeature;
import com.fasterxml.jackson.databind.deser.std.StdScalarDeserializer;
import com.fasterxml.jackson.databind.exc.UnrecognizedPropertyException;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.module.SimpleModule;
import com.fasterxml.jackson.databind.ser.std.ToStringSerializer;
import com.fasterxml.jackson.datatype.jdk8.Jdk8Module;
import java.io.IOException;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.function.Function;
import java.util.stream.Collectors;
import steelyard.harness.sweep.text.Mistakes;
import steelyard.harness.sweep.text.Place;

/** Records as JSON, strict to read: nothing is dropped, guessed, rounded or left out. */
final class Json {

  /** How a recipe says of which kind it is. */
  @JsonTypeInfo(use = JsonTypeInfo.Id.NAME, property = "kind")
  @JsonSubTypes(@JsonSubTypes.Type(value = Recipe.OfVariant.class, name = "variant"))
  private interface RecipeKinds {}

  private static final JsonMapper MAPPER =
      JsonMapper.builder()
          .addModule(new Jdk8Module())
          .addModule(
              new SimpleModule("texts")
                  .addSerializer(Path.class, new ToStringSerializer(Path.class))
                  .addDeserializer(Path.class, new FromText<>(Path.class, Path::of))
                  .addSerializer(LocalDate.class, new ToStringSerializer(LocalDate.class))
                  .addDeserializer(
                      LocalDate.class, new FromText<>(LocalDate.class, LocalDate::parse)))
          .addMixIn(Recipe.class, RecipeKinds.class)
          .disable(MapperFeature.ALLOW_COERCION_OF_SCALARS)
          .disable(DeserializationFeature.ACCEPT_FLOAT_AS_INT)
          .enable(DeserializationFeature.FAIL_ON_UNKNOWN_PROPERTIES)
          .enable(DeserializationFeature.FAIL_ON_MISSING_CREATOR_PROPERTIES)
          .enable(DeserializationFeature.FAIL_ON_NULL_CREATOR_PROPERTIES)
          .enable(DeserializationFeature.FAIL_ON_NULL_FOR_PRIMITIVES)
          .enable(DeserializationFeature.FAIL_ON_NUMBERS_FOR_ENUMS)
          .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
          .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
          .build();

  private Json() {}

  static String write(Object value) {
    DefaultPrettyPrinter printer = new DefaultPrettyPrinter();
    printer.indentObjectsWith(new DefaultIndenter("  ", "\n"));
    try {
      return MAPPER.writer(printer).writeValueAsString(value) + "\n";
    } catch (JsonProcessingException e) {
      throw new IllegalStateException("these records are always writable as JSON", e);
    }
  }

  static <T> T read(String json, Class<T> type, String shown) {
    try {
      T value = MAPPER.readValue(json, type);
      if (value == null) {
        throw Mistakes.only(Place.of(shown), "holds nothing");
      }
      return value;
    } catch (UnrecognizedPropertyException e) {
      throw Mistakes.only(Place.of(shown), path(e) + "not known here");
    } catch (JsonProcessingException e) {
      if (e.getOriginalMessage().startsWith("Missing creator property")) {
        throw Mistakes.only(Place.of(shown), path(e) + "missing");
      }
      throw Mistakes.only(place(e, shown), path(e) + reason(e));
    }
  }

  private static Place place(JsonProcessingException e, String shown) {
    JsonLocation at = e.getLocation();
    return at == null || at.getLineNr() < 1
        ? Place.of(shown)
        : new Place(shown, at.getLineNr(), Math.max(0, at.getColumnNr()));
  }

  private static String path(JsonProcessingException e) {
    if (!(e instanceof JsonMappingException mapping) || mapping.getPath().isEmpty()) {
      return "";
    }
    return mapping.getPath().stream()
            .map(r -> r.getFieldName() == null ? "[" + r.getIndex() + "]" : "." + r.getFieldName())
            .collect(Collectors.joining())
            .replaceFirst("^\\.", "")
        + ": ";
  }

  private static String reason(JsonProcessingException e) {
    String what =
        e.getCause() instanceof RuntimeException refused && refused.getMessage() != null
            ? refused.getMessage()
            : e.getOriginalMessage();
    return what.strip().replaceAll("\\s*\\R\\s*", " ");
  }

  /** Reads what {@code toString} wrote. */
  private static final class FromText<T> extends StdScalarDeserializer<T> {
    private static final long serialVersionUID = 1L;

    private final transient Function<String, T> reading;

    FromText(Class<T> type, Function<String, T> reading) {
      super(type);
      this.reading = reading;
    }

    @Override
    public T deserialize(JsonParser parser, DeserializationContext context) throws IOException {
      String text = parser.getValueAsString("");
      try {
        return reading.apply(text);
      } catch (RuntimeException e) {
        throw JsonMappingException.from(parser, "'" + text + "' is refused", e);
      }
    }
  }
}
