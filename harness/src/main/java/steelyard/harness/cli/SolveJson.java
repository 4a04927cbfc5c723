package steelyard.harness.cli;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.SortedMap;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Claim;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.RunRecord;
import steelyard.results.ledger.Status;

/**
 * A foreground run as one JSON object. Integers beyond 2^53 are strings, so that readers that know
 * only doubles do not round them in silence.
 */
final class SolveJson {
  private static final long EXACT = 1L << 53;

  private SolveJson() {}

  /**
   * Fields: status, ending, check, claim, objective, bound, wallSeconds, solution (values by name),
   * counters, family, instance, variant, backend, version, seed, model (digest as built), reason.
   * What there is not is null.
   */
  static String of(RunRecord record, Check check, Optional<SortedMap<String, Integer>> solution) {
    StringWriter text = new StringWriter();
    try (JsonGenerator json = new JsonFactory().createGenerator(text)) {
      json.writeStartObject();
      json.writeStringField("status", record.outcome().status().name());
      json.writeStringField("ending", record.outcome().ending().name());
      json.writeStringField("check", check.name());
      json.writeStringField("claim", claim(record).name());
      number(json, "objective", record.outcome().objective());
      number(json, "bound", record.outcome().bound());
      json.writeNumberField("wallSeconds", Summaries.seconds(record));
      solution(json, solution);
      json.writeObjectFieldStart("counters");
      for (Map.Entry<String, Long> counter : record.counters().entrySet()) {
        number(json, counter.getKey(), OptionalLong.of(counter.getValue()));
      }
      json.writeEndObject();
      json.writeStringField("family", record.recipe().family());
      json.writeStringField("instance", record.recipe().instance().name());
      json.writeStringField("variant", record.recipe().variant());
      json.writeStringField("backend", record.backend().name());
      json.writeStringField("version", record.backend().version());
      number(json, "seed", OptionalLong.of(record.conditions().seed()));
      text(json, "model", record.model().map(model -> model.asBuilt().hex()));
      text(json, "reason", record.outcome().reason());
      json.writeEndObject();
    } catch (IOException e) {
      throw new UncheckedIOException("text in memory cannot fail", e);
    }
    return text.toString();
  }

  private static void solution(JsonGenerator json, Optional<SortedMap<String, Integer>> solution)
      throws IOException {
    if (solution.isEmpty()) {
      json.writeNullField("solution");
      return;
    }
    json.writeObjectFieldStart("solution");
    for (Map.Entry<String, Integer> value : solution.get().entrySet()) {
      json.writeNumberField(value.getKey(), value.getValue());
    }
    json.writeEndObject();
  }

  /** A run on its own has nobody to agree with. */
  private static Claim claim(RunRecord record) {
    boolean claims =
        record.outcome().status() == Status.OPTIMAL
            || record.outcome().status() == Status.INFEASIBLE;
    return claims && record.outcome().ending() == Ending.COMPLETED ? Claim.ALONE : Claim.NONE;
  }

  private static void number(JsonGenerator json, String name, OptionalLong value)
      throws IOException {
    if (value.isEmpty()) {
      json.writeNullField(name);
    } else if (Math.abs(value.getAsLong()) <= EXACT && value.getAsLong() != Long.MIN_VALUE) {
      json.writeNumberField(name, value.getAsLong());
    } else {
      json.writeStringField(name, Long.toString(value.getAsLong()));
    }
  }

  private static void text(JsonGenerator json, String name, Optional<String> text)
      throws IOException {
    if (text.isPresent()) {
      json.writeStringField(name, text.get());
    } else {
      json.writeNullField(name);
    }
  }
}
