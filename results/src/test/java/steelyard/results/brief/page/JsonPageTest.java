package steelyard.results.brief.page;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import steelyard.results.brief.Brief;
import steelyard.results.brief.Facts;
import steelyard.results.brief.RunMaker;
import steelyard.results.brief.Sample;
import steelyard.results.ledger.Observation;

class JsonPageTest {

  private static final ObjectMapper READER = new ObjectMapper();

  private static JsonNode read(Observation... runs) throws Exception {
    return READER.readTree(
        JsonPage.json(Brief.of(Sample.context(runs.length, runs.length), List.of(runs))));
  }

  @Test
  void saysTheSameAsTheFacts() throws Exception {
    Facts facts = Brief.of(Sample.context(24, 24), Sample.runs(8, 3, 1));

    JsonNode root = READER.readTree(JsonPage.json(facts));

    List<String> fields = new ArrayList<>();
    root.fieldNames().forEachRemaining(fields::add);
    assertThat(fields)
        .containsExactly(
            "form",
            "plan",
            "site",
            "rules",
            "scope",
            "trust",
            "troubles",
            "verdict",
            "candidates",
            "classes",
            "pairs",
            "runs");
    assertThat(root.get("form").asInt()).isEqualTo(JsonPage.FORM);
    assertThat(root.get("runs")).hasSize(24);
    JsonNode wins = root.at("/pairs/0/total/tally/wins");
    assertThat(wins.asInt()).isEqualTo(facts.pairs().get(0).total().tally().wins());
    assertThat(root.at("/candidates/0/score/penalisedMean").asDouble())
        .isEqualTo(facts.candidates().get(0).score().penalisedMean().getAsDouble());
    assertThat(root.at("/plan/started").asText()).isEqualTo("2026-03-02T19:00:12Z");
  }

  @Test
  void writesIntegersBeyondDoubles_asStrings() throws Exception {
    long safe = 1L << 53;

    assertThat(objective(safe).isNumber()).isTrue();
    assertThat(objective(safe + 1).isTextual()).isTrue();
    assertThat(objective(safe + 1).asText()).isEqualTo("9007199254740993");
    assertThat(objective(-safe - 1).asText()).isEqualTo("-9007199254740993");
    assertThat(objective(1L << 62).asText()).isEqualTo("4611686018427387904");
    JsonNode seed =
        read(RunMaker.proved("A", "i", 1).seed(Long.MIN_VALUE).make()).at("/runs/0/seed");
    assertThat(seed.asText()).isEqualTo("-9223372036854775808");
    assertThat(seed.isTextual()).isTrue();
  }

  private static JsonNode objective(long value) throws Exception {
    return read(RunMaker.proved("A", "i", 1).objective(value).make()).at("/runs/0/objective");
  }

  @Test
  void keepsNamesExactly_inPlainAscii() throws Exception {
    String name = "瓦\u202E\u0000 \uD83D";
    Facts facts = Brief.of(Sample.context(1, 1), List.of(RunMaker.proved(name, "i", 1).make()));

    String json = JsonPage.json(facts);

    assertThat(StandardCharsets.US_ASCII.newEncoder().canEncode(json)).isTrue();
    assertThat(READER.readTree(json).at("/runs/0/variant").asText()).isEqualTo(name);
  }

  @Test
  void saysNull_forWhatIsNotKnown() throws Exception {
    JsonNode root = read(RunMaker.open("A", "i").make());

    assertThat(root.at("/runs/0/objective").isNull()).isTrue();
    assertThat(root.at("/verdict/best").isNull()).isTrue();
  }

  @Test
  void isTheSame_whenMadeAgain() {
    assertThat(JsonPage.json(Brief.of(Sample.context(24, 24), Sample.runs(8, 3, 1))))
        .isEqualTo(JsonPage.json(Brief.of(Sample.context(24, 24), Sample.runs(8, 3, 1))));
  }
}
