package steelyard.results.ledger;

import com.fasterxml.jackson.annotation.JsonInclude;
import com.fasterxml.jackson.annotation.JsonSetter;
import com.fasterxml.jackson.annotation.Nulls;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadFeature;
import com.fasterxml.jackson.core.json.JsonWriteFeature;
import com.fasterxml.jackson.core.type.TypeReference;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.databind.DeserializationContext;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.JsonMappingException;
import com.fasterxml.jackson.databind.MapperFeature;
import com.fasterxml.jackson.databind.ObjectWriter;
import com.fasterxml.jackson.databind.deser.std.StdScalarDeserializer;
import com.fasterxml.jackson.databind.exc.UnrecognizedPropertyException;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.module.SimpleModule;
import com.fasterxml.jackson.databind.ser.std.ToStringSerializer;
import com.fasterxml.jackson.datatype.jdk8.Jdk8Module;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.time.DateTimeException;
import java.time.Instant;
import java.util.List;
import java.util.SortedMap;
import java.util.stream.Collectors;

/**
 * The JSON form of a record: strict to read, so that nothing is dropped, guessed or rounded.
 *
 * <p>An absent optional is left out. Every other property must be there: primitives by {@code
 * FAIL_ON_NULL_FOR_PRIMITIVES}, the rest by the records' own constructors. So a later form may add
 * optionals and still read today's records.
 */
final class RecordJson {

  /** The form of the records that this class writes and the newest that it reads. */
  static final int FORM = 1;

  /** What the file holds: the form stands first and outside, so that a newer one is recognised. */
  private record Envelope(int form, RunRecord record) {
    private Envelope {
      Text.require("record", record);
    }
  }

  private static final JsonMapper MAPPER =
      JsonMapper.builder()
          .addModule(new Jdk8Module())
          .addModule(instants())
          .defaultPropertyInclusion(
              JsonInclude.Value.construct(
                  JsonInclude.Include.NON_ABSENT, JsonInclude.Include.ALWAYS))
          .defaultSetterInfo(JsonSetter.Value.forContentNulls(Nulls.FAIL))
          .disable(MapperFeature.ALLOW_COERCION_OF_SCALARS)
          .disable(DeserializationFeature.ACCEPT_FLOAT_AS_INT)
          .enable(DeserializationFeature.FAIL_ON_UNKNOWN_PROPERTIES)
          .enable(DeserializationFeature.FAIL_ON_NULL_FOR_PRIMITIVES)
          .enable(DeserializationFeature.FAIL_ON_NUMBERS_FOR_ENUMS)
          .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
          .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
          .enable(JsonWriteFeature.ESCAPE_NON_ASCII)
          .build();

  private static final String REMEDY = "if the file was edited, undo that, else run it again";

  private static final ObjectWriter INDENTED = MAPPER.writer(indented());

  private RecordJson() {}

  static String compact(RunRecord record) {
    return write(MAPPER.writer(), new Envelope(FORM, record));
  }

  static String pretty(RunRecord record) {
    return write(INDENTED, new Envelope(FORM, record)) + "\n";
  }

  static String export(RunRecord record) {
    StringWriter text = new StringWriter();
    try (JsonGenerator plain = MAPPER.createGenerator(text);
        JsonGenerator exact = new ExactIntegers(plain)) {
      INDENTED.writeValue(exact, record);
    } catch (IOException e) {
      throw new UncheckedIOException("a record is always writable as JSON", e);
    }
    return text.toString();
  }

  static RunRecord parse(String json, String where) {
    try {
      Envelope envelope = MAPPER.readValue(json, Envelope.class);
      if (envelope == null) {
        throw new LedgerProblem(where + ": not a run's record: null", REMEDY);
      }
      requireForm(envelope.form(), where);
      return envelope.record();
    } catch (JsonProcessingException e) {
      requireForm(formOf(json), where);
      throw new LedgerProblem("%s: not a run's record: %s".formatted(where, explain(e)), REMEDY, e);
    }
  }

  /** Any part of a record as one line of JSON: equal parts give equal text. */
  static String text(Object part) {
    return write(MAPPER.writer(), part);
  }

  /** What {@link #text} made of a list of strings. */
  static List<String> strings(String text) {
    return read(text, new TypeReference<>() {});
  }

  /** What {@link #text} made of a map of strings. */
  static SortedMap<String, String> pairs(String text) {
    return read(text, new TypeReference<>() {});
  }

  private static <T> T read(String text, TypeReference<T> type) {
    try {
      return MAPPER.readValue(text, type);
    } catch (JsonProcessingException e) {
      throw new IllegalArgumentException("not what this class wrote: " + text, e);
    }
  }

  private static void requireForm(int form, String where) {
    if (form > FORM) {
      throw new LedgerProblem(
          "%s: record of form %d, this version reads up to form %d".formatted(where, form, FORM),
          "use the newer version that wrote it");
    }
  }

  private static int formOf(String json) {
    try {
      return MAPPER.readTree(json).path("form").asInt(FORM);
    } catch (JsonProcessingException e) {
      return FORM;
    }
  }

  private static String write(ObjectWriter writer, Object value) {
    try {
      return writer.writeValueAsString(value);
    } catch (JsonProcessingException e) {
      throw new IllegalStateException("a record is always writable as JSON", e);
    }
  }

  private static String explain(JsonProcessingException e) {
    String place = e instanceof JsonMappingException m ? place(m) : "";
    String what = e.getOriginalMessage();
    if (e instanceof UnrecognizedPropertyException unknown) {
      what = "unknown property '%s'".formatted(unknown.getPropertyName());
    } else if (e.getCause() instanceof IllegalArgumentException refused) {
      what = refused.getMessage();
    } else if (what.startsWith("Cannot map `null`")) {
      what = "missing, or null";
    }
    String line = e.getLocation() == null ? "" : "line " + e.getLocation().getLineNr() + ": ";
    return line + place + what;
  }

  private static String place(JsonMappingException e) {
    String path =
        e.getPath().stream()
            .map(r -> r.getFieldName() == null ? "[" + r.getIndex() + "]" : "." + r.getFieldName())
            .collect(Collectors.joining());
    return path.isEmpty() ? "" : path.substring(1) + ": ";
  }

  private static DefaultPrettyPrinter indented() {
    DefaultPrettyPrinter printer = new DefaultPrettyPrinter();
    printer.indentObjectsWith(new DefaultIndenter("  ", "\n"));
    return printer;
  }

  private static SimpleModule instants() {
    SimpleModule module = new SimpleModule("instants");
    module.addSerializer(Instant.class, new ToStringSerializer(Instant.class));
    module.addDeserializer(Instant.class, new InstantReader());
    return module;
  }

  /** Reads what {@link Instant#toString} writes. */
  private static final class InstantReader extends StdScalarDeserializer<Instant> {
    private static final long serialVersionUID = 1L;

    private InstantReader() {
      super(Instant.class);
    }

    @Override
    public Instant deserialize(JsonParser parser, DeserializationContext context)
        throws IOException {
      String text = parser.getText();
      try {
        return Instant.parse(text);
      } catch (DateTimeException e) {
        return (Instant) context.handleWeirdStringValue(Instant.class, text, "not a UTC time");
      }
    }
  }
}
