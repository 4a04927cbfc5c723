package steelyard.results.brief.page;

import com.fasterxml.jackson.annotation.JsonUnwrapped;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.json.JsonWriteFeature;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.databind.JsonSerializer;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.ObjectWriter;
import com.fasterxml.jackson.databind.SerializerProvider;
import com.fasterxml.jackson.databind.json.JsonMapper;
import com.fasterxml.jackson.databind.module.SimpleModule;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.time.Instant;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import steelyard.results.brief.Facts;

/**
 * The brief as one JSON object (RFC 8259): {@code form}, then the components of {@link Facts} under
 * their own names and in their order, and so on down.
 *
 * <p>Names are exact, as they were given; everything beyond ASCII is escaped. What is not known is
 * {@code null}. Times of day are ISO 8601 in UTC. An integer whose magnitude exceeds 2⁵³ is a
 * string of its digits, because readers that keep numbers as doubles (RFC 8259, section 6) would
 * change it. Equal facts give equal bytes.
 */
public final class JsonPage {

  /** The version of this form, raised when a field changes its meaning or goes. */
  public static final int FORM = 1;

  private static final long SAFE = 1L << 53;
  private static final ObjectWriter WRITER = writer();

  /** What is written: the facts after the form's version. */
  private record Form(int form, @JsonUnwrapped Facts facts) {}

  private JsonPage() {}

  /** Writes the object, replacing what was there at once. */
  public static void write(Facts facts, Path file) throws IOException {
    Moved.into(file, json(facts));
  }

  /** The object, indented, with a line end. */
  public static String json(Facts facts) {
    try {
      return WRITER.writeValueAsString(new Form(FORM, facts)) + "\n";
    } catch (JsonProcessingException e) {
      throw new UncheckedIOException("the facts cannot be written as JSON", e);
    }
  }

  private static ObjectWriter writer() {
    SimpleModule module = new SimpleModule();
    module.addSerializer(Long.class, writing((value, out) -> integer(value, out)));
    module.addSerializer(long.class, writing((value, out) -> integer(value, out)));
    module.addSerializer(Instant.class, writing((value, out) -> out.writeString(value.toString())));
    module.addSerializer(
        OptionalLong.class,
        writing(
            (value, out) -> {
              if (value.isPresent()) {
                integer(value.getAsLong(), out);
              } else {
                out.writeNull();
              }
            }));
    module.addSerializer(
        OptionalDouble.class,
        writing(
            (value, out) -> {
              if (value.isPresent()) {
                out.writeNumber(value.getAsDouble());
              } else {
                out.writeNull();
              }
            }));
    module.addSerializer(Optional.class, writing((value, out) -> optional(value, out)));
    ObjectMapper mapper =
        JsonMapper.builder().enable(JsonWriteFeature.ESCAPE_NON_ASCII).addModule(module).build();
    DefaultIndenter lines = new DefaultIndenter("  ", "\n");
    return mapper.writer(
        new DefaultPrettyPrinter().withObjectIndenter(lines).withArrayIndenter(lines));
  }

  private static void optional(Optional<?> value, JsonGenerator out) throws IOException {
    if (value.isPresent()) {
      out.writePOJO(value.get());
    } else {
      out.writeNull();
    }
  }

  private static void integer(long value, JsonGenerator out) throws IOException {
    if (value > SAFE || value < -SAFE) {
      out.writeString(Long.toString(value));
    } else {
      out.writeNumber(value);
    }
  }

  @FunctionalInterface
  private interface Writing<T> {
    void write(T value, JsonGenerator out) throws IOException;
  }

  private static <T> JsonSerializer<T> writing(Writing<T> writing) {
    return new JsonSerializer<>() {
      @Override
      public void serialize(T value, JsonGenerator out, SerializerProvider provider)
          throws IOException {
        writing.write(value, out);
      }
    };
  }
}
