package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ModelsTest {

  private static final ModelFacts BUILT = Sample.model("week-07", "load-bound");

  @TempDir private Path folder;
  private Ledger ledger;
  private Models models;

  @BeforeEach
  void open() {
    ledger = Ledger.write(folder.resolve("ledger.db"), LedgerTest.NIGHTLY);
    models = ledger.models();
  }

  @AfterEach
  void close() {
    ledger.close();
  }

  @Test
  void remembers_what_a_recipe_builds_or_why_it_fails() {
    RecipeKey good = key("load-bound");
    RecipeKey bad = key("load-bound", "kiln-order");

    models.remember(good, Models.Memo.built(BUILT));
    models.remember(bad, Models.Memo.failed("kiln-order: the sum overflows"));

    assertThat(models.find(good)).contains(Models.Memo.built(BUILT));
    assertThat(models.find(bad)).contains(Models.Memo.failed("kiln-order: the sum overflows"));
  }

  @Test
  void tells_recipes_apart_by_order_of_amendments_code_content_and_family() {
    models.remember(key("a", "b"), Models.Memo.built(BUILT));

    assertThat(models.find(key("b", "a"))).isEmpty();
    assertThat(models.find(key("a"))).isEmpty();
    assertThat(models.find(key("a, b"))).isEmpty();
    assertThat(models.find(key())).isEmpty();
    assertThat(models.find(recipe("firing", "new code", "week-07"))).isEmpty();
    assertThat(models.find(recipe("firing", "code", "week-08"))).isEmpty();
    assertThat(models.find(recipe("glazing", "code", "week-07"))).isEmpty();
    assertThat(models.find(recipe("firing", "code", "week-07"))).isPresent();
  }

  @Test
  void keeps_what_was_remembered_first() {
    models.remember(key(), Models.Memo.built(BUILT));
    models.remember(key(), Models.Memo.failed("out of memory"));

    assertThat(models.find(key())).contains(Models.Memo.built(BUILT));
  }

  @Test
  void remembers_what_collected_runs_built() {
    RunRecord record = Sample.run("3fa2c9d1").record();
    ledger.runs().collect(record);

    assertThat(models.find(record.recipe().key()))
        .contains(Models.Memo.built(record.model().orElseThrow()));
  }

  private static RecipeKey key(String... amendments) {
    return new RecipeKey(
        "firing", Sample.digest("code"), Sample.digest("week-07"), List.of(amendments));
  }

  private static RecipeKey recipe(String family, String code, String content) {
    return new RecipeKey(family, Sample.digest(code), Sample.digest(content), List.of("a", "b"));
  }
}
