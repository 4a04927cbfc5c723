package steelyard.results.ledger;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import org.jdbi.v3.core.Handle;

/** Remembers what recipes build, so that a plan needs no model that was built before. */
public final class Models {

  private final Store store;

  Models(Store store) {
    this.store = store;
  }

  /**
   * What is remembered of a recipe.
   *
   * @param model what it builds; empty if it fails
   * @param failure why it builds nothing; empty if it does
   */
  public record Memo(Optional<ModelFacts> model, Optional<String> failure) {
    public Memo {
      if (model.isPresent() == failure.isPresent()) {
        throw new IllegalArgumentException("a recipe builds a model or fails, one of the two");
      }
    }

    /** The recipe builds this. */
    public static Memo built(ModelFacts model) {
      return new Memo(Optional.of(model), Optional.empty());
    }

    /** The recipe fails for this reason. */
    public static Memo failed(String reason) {
      return new Memo(Optional.empty(), Optional.of(reason));
    }
  }

  /** What is remembered of a recipe; empty if nothing is. */
  public Optional<Memo> find(RecipeKey key) {
    return store.read(handle -> find(handle, key));
  }

  /** Remembers what a recipe builds; what was remembered first stays. */
  public void remember(RecipeKey key, Memo memo) {
    store.write(
        handle -> {
          Rows rows = new Rows(handle);
          Ids ids = new Ids(rows);
          long recipe = ids.recipe(key);
          memo.model()
              .ifPresentOrElse(
                  model ->
                      remember(rows, recipe, ids.model(model), ids.problem(key.content(), model)),
                  () -> rememberFailure(rows, recipe, memo.failure().orElseThrow()));
          return null;
        });
  }

  static void remember(Rows rows, long recipe, long model, long problem) {
    rows.run(
        """
        INSERT INTO recipe_model (recipe, model, problem) VALUES (?, ?, ?)
        ON CONFLICT (recipe) DO NOTHING""",
        recipe,
        model,
        problem);
  }

  private static void rememberFailure(Rows rows, long recipe, String reason) {
    rows.run(
        """
        INSERT INTO recipe_model (recipe, failure) VALUES (?, ?)
        ON CONFLICT (recipe) DO NOTHING""",
        recipe,
        reason);
  }

  private static Optional<Memo> find(Handle handle, RecipeKey key) {
    return handle
        .select(
            """
            SELECT m.*, rm.failure FROM recipe r
              JOIN family_code f ON f.id = r.family_code
              JOIN recipe_model rm ON rm.recipe = r.id
              LEFT JOIN model m ON m.id = rm.model
            WHERE f.name = ? AND f.digest = ? AND r.content = ? AND r.amendments = ?""",
            key.family(),
            key.familyCode().bytes(),
            key.content().bytes(),
            RecordJson.text(key.amendments()))
        .map((row, context) -> memo(handle, row))
        .findOne();
  }

  private static Memo memo(Handle handle, ResultSet row) throws SQLException {
    String failure = row.getString("failure");
    return failure == null ? Memo.built(model(handle, row)) : Memo.failed(failure);
  }

  private static ModelFacts model(Handle handle, ResultSet row) throws SQLException {
    return new ModelFacts(
        Digest.of(row.getBytes("as_built")),
        Digest.of(row.getBytes("search")),
        Digest.of(row.getBytes("canonical")),
        Digest.of(row.getBytes("plain_canonical")),
        row.getInt("variables"),
        row.getInt("postings"),
        groups(handle, row.getLong("id")));
  }

  private static SortedMap<String, ModelFacts.Group> groups(Handle handle, long model) {
    SortedMap<String, ModelFacts.Group> groups = new TreeMap<>();
    handle
        .select("SELECT name, digest, postings FROM model_group WHERE model = ?", model)
        .map(
            (row, context) ->
                Map.entry(
                    row.getString(1),
                    new ModelFacts.Group(Digest.of(row.getBytes(2)), row.getInt(3))))
        .forEach(group -> groups.put(group.getKey(), group.getValue()));
    return groups;
  }
}
