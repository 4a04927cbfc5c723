package steelyard.results.ledger;

import java.util.Optional;
import java.util.OptionalLong;
import org.jdbi.v3.core.Handle;

/** Brings records into the tables. */
final class Collecting {

  private static final String INSERT =
      """
      INSERT INTO run
        (name, key, attempt, block, position, recipe, model, problem, backend_build, settings,
         seed, threads, goal, limits, mode, session, status, ending, killed, minimize,
         objective, bound, lower_ns, solve_ns, answer_ns, overshoot_ns, cpu_ns, rss,
         decisions, failures, propagations, restarts, disturbed, finished)
      VALUES
        (:name, :key, :attempt, :block, :position, :recipe, :model, :problem, :backend, :settings,
         :seed, :threads, :goal, :limits, :mode, :session, :status, :ending, :killed, :minimize,
         :objective, :bound, :lower, :solve, :answer, :overshoot, :cpu, :rss,
         :decisions, :failures, :propagations, :restarts, :disturbed, :finished)""";

  private final Handle handle;
  private final Rows rows;
  private final Ids ids;
  private final StoredRecords stored;

  Collecting(Handle handle) {
    this.handle = handle;
    this.rows = new Rows(handle);
    this.ids = new Ids(rows);
    this.stored = new StoredRecords(handle);
  }

  /** What became of a record. */
  enum Added {
    /** It is new. */
    FRESH,
    /** It was there. */
    KNOWN,
    /** Another run has its id; nothing was added. */
    CLASH
  }

  /** Adds a run unless its id is there. */
  Added add(RunRecord record) {
    if (rows.find("SELECT 1 FROM run WHERE name = ?", record.run()).isPresent()) {
      return stored.record(record.run()).equals(record) ? Added.KNOWN : Added.CLASH;
    }
    long session = ids.session(record.session());
    stored.add(addRun(record, session), session, RunRecords.toJson(record));
    return Added.FRESH;
  }

  private long addRun(RunRecord r, long session) {
    Conditions c = r.conditions();
    Outcome o = r.outcome();
    Optional<Long> model = r.model().map(ids::model);
    Optional<Long> problem = r.model().map(m -> ids.problem(r.recipe().instance().content(), m));
    long recipe = ids.recipe(r.recipe().key());
    if (model.isPresent()) {
      Models.remember(rows, recipe, model.get(), problem.orElseThrow());
    }
    handle
        .createUpdate(INSERT)
        .bind("name", r.run())
        .bind("key", r.key().bytes())
        .bind("attempt", r.attempt())
        .bind("block", r.place().map(place -> cell(place, r)))
        .bind("position", r.place().map(Place::position))
        .bind("recipe", recipe)
        .bind("model", model)
        .bind("problem", problem)
        .bind("backend", ids.backendBuild(r.backend()))
        .bind("settings", ids.settings(r.setting()))
        .bind("seed", c.seed())
        .bind("threads", c.threads())
        .bind("goal", Codes.GOAL.of(c.goal().kind()))
        .bind("limits", ids.limits(c.limits()))
        .bind("mode", Codes.MODE.of(c.mode()))
        .bind("session", session)
        .bind("status", Codes.STATUS.of(o.status()))
        .bind("ending", Codes.ENDING.of(o.ending()))
        .bind("killed", o.killed().isPresent())
        .bind("minimize", o.minimize())
        .bind("objective", o.objective())
        .bind("bound", o.bound())
        .bind("lower", r.times().wallNanos(Times.Phase.LOWER))
        .bind("solve", r.times().wallNanos(Times.Phase.SOLVE))
        .bind("answer", r.times().wallNanos(Times.Phase.ANSWER))
        .bind("overshoot", r.times().overshootNanos())
        .bind("cpu", r.times().limitedCpuNanos())
        .bind("rss", r.memory().bytes())
        .bind("decisions", counter(r, "decisions"))
        .bind("failures", counter(r, "failures"))
        .bind("propagations", counter(r, "propagations"))
        .bind("restarts", counter(r, "restarts"))
        .bind("disturbed", r.disturbed())
        .bind("finished", r.finished().toEpochMilli())
        .execute();
    return rows.find("SELECT last_insert_rowid()").orElseThrow();
  }

  /** The plan's names come with the record too, so that records alone make a ledger. */
  private long cell(Place place, RunRecord r) {
    long sweep = ids.sweep(place.sweep(), place.sweepName());
    long block = ids.block(sweep, place.block(), r.conditions().seed(), r.recipe());
    Plans.addCell(
        rows,
        ids,
        sweep,
        block,
        new Cell(place.position(), r.recipe(), r.backend(), r.setting(), r.key()));
    return block;
  }

  private static OptionalLong counter(RunRecord record, String name) {
    Long value = record.counters().get(name);
    return value == null ? OptionalLong.empty() : OptionalLong.of(value);
  }
}
