package steelyard.results.ledger;

import static java.nio.charset.StandardCharsets.UTF_8;

import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Arrays;

/** Finds the row that stands for a thing, and adds it the first time. */
final class Ids {

  private final Rows rows;

  Ids(Rows rows) {
    this.rows = rows;
  }

  long familyCode(String family, Digest code) {
    return rows.id("family_code", "name", family, "digest", code.bytes());
  }

  long instance(String family, Recipe.Instance instance) {
    return rows.id(
        "instance",
        "family",
        family,
        "name",
        instance.name(),
        "content",
        instance.content().bytes());
  }

  long recipe(RecipeKey key) {
    return rows.id(
        "recipe",
        "family_code",
        familyCode(key.family(), key.familyCode()),
        "content",
        key.content().bytes(),
        "amendments",
        RecordJson.text(key.amendments()));
  }

  long problem(Digest content, ModelFacts model) {
    return rows.id(
        "problem", "content", content.bytes(), "plain_canonical", model.plainCanonical().bytes());
  }

  long backendBuild(BackendBuild build) {
    return rows.id(
        "backend_build",
        "adapter",
        build.adapter(),
        "version",
        build.version(),
        "digest",
        build.code().bytes());
  }

  long settings(Setting setting) {
    return rows.id("settings", "options", RecordJson.text(setting.options()));
  }

  long limits(Limits limits) {
    return rows.id(
        "limits",
        "wall_seconds",
        limits.wallSeconds(),
        "work_unit",
        limits.work().map(Limits.Work::unit).orElse(""),
        "work_amount",
        limits.work().map(Limits.Work::amount).orElse(0.0),
        "memory_bytes",
        limits.memoryBytes());
  }

  long sweep(String id, String name) {
    return rows.find("SELECT id FROM sweep WHERE name = ?", id)
        .orElseGet(() -> rows.add("INSERT INTO sweep (name, title) VALUES (?, ?)", id, name));
  }

  long session(Session session) {
    return rows.find("SELECT id FROM session WHERE name = ?", session.id())
        .orElseGet(() -> addSession(session));
  }

  private long addSession(Session session) {
    long machine =
        rows.id(
            "machine",
            "class",
            session.machineClass(),
            "facts",
            RecordJson.text(session.machine()));
    return rows.add(
        "INSERT INTO session (name, started, machine, harness, launch) VALUES (?, ?, ?, ?, ?)",
        session.id(),
        session.started().toEpochMilli(),
        machine,
        session.harness(),
        RecordJson.text(session.launch()));
  }

  long candidate(long sweep, Recipe recipe, BackendBuild backend, Setting setting) {
    return rows.id(
        "candidate",
        "sweep",
        sweep,
        "family",
        recipe.family(),
        "alias",
        recipe.alias().orElse(""),
        "variant",
        recipe.variant(),
        "backend",
        backend.name(),
        "setting",
        setting.name());
  }

  long block(long sweep, int number, long seed, Recipe recipe) {
    return rows.find("SELECT id FROM block WHERE sweep = ? AND number = ?", sweep, number)
        .orElseGet(() -> addBlock(sweep, number, seed, recipe));
  }

  private long addBlock(long sweep, int number, long seed, Recipe recipe) {
    Recipe.Instance instance = recipe.instance();
    return rows.add(
        """
        INSERT INTO block (sweep, number, instance, path, class, weight, seed)
        VALUES (?, ?, ?, ?, ?, ?, ?)""",
        sweep,
        number,
        instance(recipe.family(), instance),
        instance.path(),
        instance.instanceClass(),
        instance.weight(),
        seed);
  }

  long model(ModelFacts model) {
    byte[] groups = groupsDigest(model);
    return rows.find(
            """
            SELECT id FROM model WHERE as_built = ? AND search = ? AND canonical = ?
              AND plain_canonical = ? AND groups = ?""",
            model.asBuilt().bytes(),
            model.search().bytes(),
            model.canonical().bytes(),
            model.plainCanonical().bytes(),
            groups)
        .orElseGet(() -> addModel(model, groups));
  }

  private long addModel(ModelFacts model, byte[] groups) {
    long id =
        rows.add(
            """
            INSERT INTO model
              (as_built, search, canonical, plain_canonical, groups, variables, postings)
            VALUES (?, ?, ?, ?, ?, ?, ?)""",
            model.asBuilt().bytes(),
            model.search().bytes(),
            model.canonical().bytes(),
            model.plainCanonical().bytes(),
            groups,
            model.variables(),
            model.postings());
    model
        .groups()
        .forEach(
            (name, group) ->
                rows.run(
                    "INSERT INTO model_group (model, name, digest, postings) VALUES (?, ?, ?, ?)",
                    id,
                    name,
                    group.digest().bytes(),
                    group.postings()));
    return id;
  }

  private static byte[] groupsDigest(ModelFacts model) {
    String groups = RecordJson.text(model.groups());
    try {
      return Arrays.copyOf(
          MessageDigest.getInstance("SHA-256").digest(groups.getBytes(UTF_8)), RunKey.BYTES);
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }
}
