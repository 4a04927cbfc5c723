package steelyard.harness.worker;

import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.JsonParser;
import java.io.IOException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import java.util.Set;
import steelyard.adapters.spi.Description;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.Digest;

/** An event as a line of JSON: its number, its time, its kind, its fields. */
final class EventCodec {
  private static final Map<String, Class<? extends Goal>> GOALS =
      Map.of(
          "satisfy", Goal.Satisfy.class,
          "optimise", Goal.Optimise.class,
          "enumerate", Goal.Enumerate.class);

  private EventCodec() {}

  static String write(StampedEvent stamped) throws IOException {
    return Wire.line(
        json -> {
          json.writeStartObject();
          json.writeNumberField("n", stamped.number());
          json.writeNumberField("t", stamped.nanos());
          body(stamped.event(), json);
          json.writeEndObject();
        });
  }

  private static void body(Event event, JsonGenerator json) throws IOException {
    if (event instanceof Event.Phase phase) {
      kind(json, "phase").writeStringField("name", phase.name());
      optional(json, "cpu", phase.cpuNanos());
    } else if (event instanceof Event.Step step) {
      kind(json, "step").writeStringField("name", step.name());
    } else if (event instanceof Event.Solution solution) {
      optional(kind(json, "solution"), "objective", solution.objective());
      json.writeFieldName("decisions");
      json.writeArray(solution.decisions().toArray(), 0, solution.decisions().size());
    } else if (event instanceof Event.Thinned thinned) {
      kind(json, "thinned").writeNumberField("solutions", thinned.solutions());
    } else if (event instanceof Event.Bound bound) {
      kind(json, "bound").writeNumberField("value", bound.value());
    } else if (event instanceof Event.Count count) {
      kind(json, "count").writeStringField("name", count.name());
      json.writeNumberField("value", count.value());
    } else if (event instanceof Event.Blame blame) {
      kind(json, "blame").writeStringField("measure", blame.measure());
      json.writeFieldName("byPosting");
      json.writeArray(blame.byPosting().toArray(), 0, blame.byPosting().size());
    } else if (event instanceof Event.Result result) {
      result(result.outcome(), json);
    } else if (event instanceof Event.Failure failure) {
      kind(json, "failure").writeStringField("whose", failure.kind().name());
      json.writeStringField("message", failure.message());
    } else if (event instanceof Event.Built built) {
      built(built.facts(), json);
    } else if (event instanceof Event.Lowered lowered) {
      lowered(lowered, json);
    } else {
      description(event, json);
    }
  }

  private static void description(Event event, JsonGenerator json) throws IOException {
    if (event instanceof Event.Family family) {
      family(family, json);
    } else if (event instanceof Event.Backend backend) {
      backend(backend.description(), json);
    } else if (event instanceof Event.Program program) {
      kind(json, "program").writeStringField("file", program.file());
      json.writeStringField("version", program.version());
    } else if (event instanceof Event.Missing missing) {
      kind(json, "missing").writeStringField("name", missing.name());
      json.writeStringField("reason", missing.reason());
    } else if (event instanceof Event.Stated stated) {
      kind(json, "stated").writeStringField("group", stated.group());
      json.writeStringField("text", stated.text());
    } else {
      kind(json, "calibrated").writeNumberField("nanos", ((Event.Calibrated) event).nanos());
    }
  }

  private static JsonGenerator kind(JsonGenerator json, String kind) throws IOException {
    json.writeStringField("e", kind);
    return json;
  }

  private static void optional(JsonGenerator json, String name, OptionalLong value)
      throws IOException {
    if (value.isPresent()) {
      json.writeNumberField(name, value.getAsLong());
    }
  }

  private static void result(SolveOutcome outcome, JsonGenerator json) throws IOException {
    kind(json, "result").writeStringField("status", outcome.status().name());
    optional(json, "bound", outcome.bound());
    json.writeStringField("why", outcome.ended().name());
    json.writeStringField("reason", outcome.reason());
  }

  private static void built(Event.Built.Facts facts, JsonGenerator json) throws IOException {
    kind(json, "built").writeNumberField("subject", facts.subject());
    json.writeStringField("asBuilt", facts.asBuilt().hex());
    json.writeStringField("search", facts.search().hex());
    json.writeStringField("canonical", facts.canonical().hex());
    json.writeNumberField("variables", facts.variables());
    json.writeNumberField("postings", facts.postings());
    json.writeBooleanField("minimize", facts.minimize());
    json.writeObjectFieldStart("groups");
    for (Map.Entry<String, Event.Built.Group> group : facts.groups().entrySet()) {
      json.writeObjectFieldStart(group.getKey());
      json.writeStringField("digest", group.getValue().digest().hex());
      json.writeNumberField("postings", group.getValue().postings());
      json.writeEndObject();
    }
    json.writeEndObject();
  }

  private static void lowered(Event.Lowered lowered, JsonGenerator json) throws IOException {
    Wire.writeNumbers("totals", lowered.totals(), kind(json, "lowered"));
    json.writeStringField("unit", lowered.unit());
    Wire.writeNumbers("byGroup", lowered.byGroup(), json);
    json.writeObjectFieldStart("how");
    for (Map.Entry<String, String> how : lowered.how().entrySet()) {
      json.writeStringField(how.getKey(), how.getValue());
    }
    json.writeEndObject();
  }

  private static void family(Event.Family family, JsonGenerator json) throws IOException {
    kind(json, "family").writeStringField("name", family.name());
    json.writeStringField("summary", family.summary());
    json.writeStringField("place", family.place());
    json.writeStringField("inside", family.inside());
    json.writeArrayFieldStart("amendments");
    for (Event.Amendment amendment : family.amendments()) {
      json.writeStartObject();
      json.writeStringField("name", amendment.name());
      json.writeStringField("role", amendment.role());
      json.writeStringField("summary", amendment.summary());
      Wire.writeTexts("requires", amendment.requires(), json);
      Wire.writeTexts("excludes", amendment.excludes(), json);
      json.writeEndObject();
    }
    json.writeEndArray();
  }

  private static void backend(Description it, JsonGenerator json) throws IOException {
    kind(json, "backend").writeStringField("name", it.name());
    json.writeStringField("version", it.version());
    json.writeBooleanField("followsBranching", it.followsBranching());
    json.writeBooleanField("portable", it.portable());
    List<String> goals = new ArrayList<>();
    GOALS.forEach(
        (name, goal) -> {
          if (it.goals().contains(goal)) {
            goals.add(name);
          }
        });
    Wire.writeTexts("goals", goals.stream().sorted().toList(), json);
    Wire.writeTexts("workUnits", it.workUnits(), json);
    json.writeNumberField("heapShare", it.heapShare());
    json.writeArrayFieldStart("settings");
    for (Setting setting : it.settings()) {
      json.writeStartObject();
      json.writeStringField("name", setting.name());
      json.writeStringField("kind", setting.kind().name());
      json.writeStringField("default", setting.defaultText());
      json.writeNumberField("low", setting.low());
      json.writeNumberField("high", setting.high());
      Wire.writeTexts("choices", setting.choices(), json);
      json.writeStringField("help", setting.help());
      json.writeEndObject();
    }
    json.writeEndArray();
  }

  /**
   * Reads one line.
   *
   * @throws IOException if it is not an event; a worker that was killed leaves half a line
   */
  static StampedEvent read(String line) throws IOException {
    try (JsonParser parser = Wire.JSON.createParser(line)) {
      Fields fields = Fields.read(parser);
      return new StampedEvent(fields.number("n"), fields.number("t"), event(fields));
    } catch (IllegalArgumentException | ArithmeticException e) {
      throw new IOException(e.getMessage(), e);
    }
  }

  private static Event event(Fields fields) throws IOException {
    String kind = fields.text("e");
    return switch (kind) {
      case "phase" -> new Event.Phase(fields.text("name"), optional(fields, "cpu"));
      case "step" -> new Event.Step(fields.text("name"));
      case "solution" ->
          new Event.Solution(optional(fields, "objective"), fields.ints("decisions"));
      case "thinned" -> new Event.Thinned(fields.number("solutions"));
      case "bound" -> new Event.Bound(fields.number("value"));
      case "count" -> new Event.Count(fields.text("name"), fields.number("value"));
      case "blame" -> new Event.Blame(fields.text("measure"), fields.longs("byPosting"));
      case "result" -> readResult(fields);
      case "failure" ->
          new Event.Failure(
              Event.Failure.Kind.valueOf(fields.text("whose")), fields.text("message"));
      case "built" -> readBuilt(fields);
      case "lowered" ->
          new Event.Lowered(
              fields.map("totals", Fields::number),
              fields.text("unit"),
              fields.map("byGroup", Fields::number),
              fields.map("how", Fields::text));
      case "family" -> readFamily(fields);
      case "backend" -> readBackend(fields);
      case "program" -> new Event.Program(fields.text("file"), fields.text("version"));
      case "missing" -> new Event.Missing(fields.text("name"), fields.text("reason"));
      case "stated" -> new Event.Stated(fields.text("group"), fields.text("text"));
      case "calibrated" -> new Event.Calibrated(fields.number("nanos"));
      default -> throw new IOException("unknown kind of event '" + kind + "'");
    };
  }

  private static OptionalLong optional(Fields fields, String name) throws IOException {
    return fields.has(name) ? OptionalLong.of(fields.number(name)) : OptionalLong.empty();
  }

  private static Event readResult(Fields fields) throws IOException {
    return new Event.Result(
        new SolveOutcome(
            Status.valueOf(fields.text("status")),
            optional(fields, "bound"),
            SolveOutcome.Why.valueOf(fields.text("why")),
            fields.text("reason")));
  }

  private static Event readBuilt(Fields fields) throws IOException {
    return new Event.Built(
        new Event.Built.Facts(
            fields.smallNumber("subject"),
            new Digest(fields.text("asBuilt")),
            new Digest(fields.text("search")),
            new Digest(fields.text("canonical")),
            fields.smallNumber("variables"),
            fields.smallNumber("postings"),
            fields.truth("minimize"),
            fields.map(
                "groups",
                (groups, name) -> {
                  Fields group = groups.object(name);
                  return new Event.Built.Group(
                      new Digest(group.text("digest")), group.smallNumber("postings"));
                })));
  }

  private static Event readFamily(Fields fields) throws IOException {
    List<Event.Amendment> amendments = new ArrayList<>();
    for (Fields each : fields.objects("amendments")) {
      amendments.add(
          new Event.Amendment(
              each.text("name"),
              each.text("role"),
              each.text("summary"),
              each.texts("requires"),
              each.texts("excludes")));
    }
    return new Event.Family(
        fields.text("name"),
        fields.text("summary"),
        fields.text("place"),
        fields.text("inside"),
        amendments);
  }

  private static Event readBackend(Fields fields) throws IOException {
    Set<Class<? extends Goal>> goals = new HashSet<>();
    for (String name : fields.texts("goals")) {
      if (!GOALS.containsKey(name)) {
        throw new IOException("unknown goal '" + name + "'");
      }
      goals.add(GOALS.get(name));
    }
    List<Setting> settings = new ArrayList<>();
    for (Fields each : fields.objects("settings")) {
      settings.add(
          new Setting(
              each.text("name"),
              Setting.Kind.valueOf(each.text("kind")),
              each.text("default"),
              each.real("low"),
              each.real("high"),
              each.texts("choices"),
              each.text("help")));
    }
    return new Event.Backend(
        new Description(
            fields.text("name"),
            fields.text("version"),
            fields.truth("followsBranching"),
            fields.truth("portable"),
            goals,
            fields.texts("workUnits"),
            settings,
            fields.real("heapShare")));
  }
}
