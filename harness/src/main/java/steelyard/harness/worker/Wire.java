package steelyard.harness.worker;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.JsonParser;
import java.io.IOException;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import steelyard.adapters.spi.Work;

/** What lies in files between the harness and its workers, written and read by both ends. */
public final class Wire {
  static final JsonFactory JSON = new JsonFactory();

  /** The order of a run, in the run's folder. */
  public static final String ORDER = "order.json";

  /** What the worker says, a line each, in the run's folder. */
  public static final String EVENTS = "events.jsonl";

  /** What the judge found, in the run's folder. */
  public static final String VERDICT = "verdict.json";

  private Wire() {}

  /** Writes the order beside its place and moves it there. */
  public static void write(RunOrder order, Path file) throws IOException {
    move(file, json -> writeOrder(order, json));
  }

  /** Reads an order. */
  public static RunOrder readOrder(Path file) throws IOException {
    try (JsonParser parser = JSON.createParser(Files.readAllBytes(file))) {
      Fields fields = Fields.read(parser);
      return new RunOrder(
          readSubject(fields.object("subject")),
          fields.text("backend"),
          fields.map("settings", Fields::text),
          fields.number("seed"),
          fields.smallNumber("threads"),
          fields.has("goal")
              ? Optional.of(RunOrder.GoalKind.valueOf(fields.text("goal").toUpperCase(Locale.ROOT)))
              : Optional.empty(),
          fields.number("enumerateAtMost"),
          fields.real("wallSeconds"),
          readWork(fields));
    } catch (IOException | IllegalArgumentException e) {
      throw new IOException(file + ": is not a run's order: " + e.getMessage(), e);
    }
  }

  private static Optional<Work> readWork(Fields fields) throws IOException {
    Optional<Fields> work = fields.optionalObject("work");
    return work.isEmpty()
        ? Optional.empty()
        : Optional.of(new Work(work.get().text("unit"), work.get().real("amount")));
  }

  private static void writeOrder(RunOrder order, JsonGenerator json) throws IOException {
    json.writeStartObject();
    json.writeFieldName("subject");
    writeSubject(order.subject(), json);
    json.writeStringField("backend", order.backend());
    json.writeObjectFieldStart("settings");
    for (Map.Entry<String, String> option : order.settings().entrySet()) {
      json.writeStringField(option.getKey(), option.getValue());
    }
    json.writeEndObject();
    json.writeNumberField("seed", order.seed());
    json.writeNumberField("threads", order.threads());
    if (order.goal().isPresent()) {
      json.writeStringField("goal", order.goal().get().name().toLowerCase(Locale.ROOT));
    }
    json.writeNumberField("enumerateAtMost", order.enumerateAtMost());
    json.writeNumberField("wallSeconds", order.wallSeconds());
    if (order.work().isPresent()) {
      json.writeObjectFieldStart("work");
      json.writeStringField("unit", order.work().get().unit());
      json.writeNumberField("amount", order.work().get().amount());
      json.writeEndObject();
    }
    json.writeEndObject();
  }

  /** Writes subjects to be digested. */
  public static void writeSubjects(List<Subject> subjects, Path file) throws IOException {
    move(
        file,
        json -> {
          json.writeStartObject();
          json.writeArrayFieldStart("subjects");
          for (Subject subject : subjects) {
            writeSubject(subject, json);
          }
          json.writeEndArray();
          json.writeEndObject();
        });
  }

  /** Reads subjects to be digested. */
  public static List<Subject> readSubjects(Path file) throws IOException {
    try (JsonParser parser = JSON.createParser(Files.readAllBytes(file))) {
      List<Subject> subjects = new ArrayList<>();
      for (Fields each : Fields.read(parser).objects("subjects")) {
        subjects.add(readSubject(each));
      }
      return subjects;
    } catch (IOException | IllegalArgumentException e) {
      throw new IOException(file + ": is not a list of subjects: " + e.getMessage(), e);
    }
  }

  private static void writeSubject(Subject subject, JsonGenerator json) throws IOException {
    Subject.OfVariant variant = (Subject.OfVariant) subject;
    json.writeStartObject();
    json.writeStringField("kind", "variant");
    json.writeStringField("family", variant.family());
    json.writeStringField("instance", variant.instance());
    json.writeStringField("path", variant.path().toString());
    writeTexts("amendments", variant.amendments(), json);
    json.writeEndObject();
  }

  private static Subject readSubject(Fields fields) throws IOException {
    String kind = fields.text("kind");
    if (!kind.equals("variant")) {
      throw new IOException("unknown kind of subject '" + kind + "'; known: variant");
    }
    return new Subject.OfVariant(
        fields.text("family"),
        fields.text("instance"),
        Path.of(fields.text("path")),
        fields.texts("amendments"));
  }

  /** Writes a verdict beside its place and moves it there. */
  public static void write(Verdict verdict, Path file) throws IOException {
    move(
        file,
        json -> {
          json.writeStartObject();
          json.writeNumberField("judged", verdict.judged());
          writeTexts("problems", verdict.problems(), json);
          json.writeStringField("shown", verdict.shown());
          json.writeObjectFieldStart("answer");
          for (Map.Entry<String, Integer> value : verdict.answer().entrySet()) {
            json.writeNumberField(value.getKey(), value.getValue());
          }
          json.writeEndObject();
          json.writeEndObject();
        });
  }

  /** Reads a verdict. */
  public static Verdict readVerdict(Path file) throws IOException {
    try (JsonParser parser = JSON.createParser(Files.readAllBytes(file))) {
      Fields fields = Fields.read(parser);
      return new Verdict(
          fields.number("judged"),
          fields.texts("problems"),
          fields.text("shown"),
          fields.map("answer", Fields::smallNumber));
    } catch (IOException | IllegalArgumentException e) {
      throw new IOException(file + ": is not a verdict: " + e.getMessage(), e);
    }
  }

  static void writeTexts(String name, List<String> texts, JsonGenerator json) throws IOException {
    json.writeArrayFieldStart(name);
    for (String text : texts) {
      json.writeString(text);
    }
    json.writeEndArray();
  }

  static void writeNumbers(String name, SortedMap<String, Long> numbers, JsonGenerator json)
      throws IOException {
    json.writeObjectFieldStart(name);
    for (Map.Entry<String, Long> number : numbers.entrySet()) {
      json.writeNumberField(number.getKey(), number.getValue());
    }
    json.writeEndObject();
  }

  /** Writes JSON. */
  interface Writing {
    void to(JsonGenerator json) throws IOException;
  }

  static String line(Writing writing) throws IOException {
    StringWriter text = new StringWriter();
    try (JsonGenerator json = JSON.createGenerator(text)) {
      writing.to(json);
    }
    return text.append('\n').toString();
  }

  private static void move(Path file, Writing writing) throws IOException {
    Path beside = file.resolveSibling(file.getFileName() + ".part");
    Files.write(beside, line(writing).getBytes(StandardCharsets.UTF_8));
    Files.move(beside, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
  }
}
