package steelyard.results.ledger;

import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;

/**
 * One finished run as the statistics and the reports see it: names from the plan, facts from the
 * record, verdicts as they stand now.
 *
 * @param run the run's id, as {@code show} takes it
 * @param family the family's name
 * @param instance the instance's name within its family
 * @param instanceClass the instance's class; {@code "-"} where it has none
 * @param weight the instance's weight in production; 1 where none is given
 * @param variant the variant's name, such as {@code plain+load-bound}, with the alias of the
 *     family's jar where it has one: {@code plain@old}
 * @param backend the backend's name in the sweep file
 * @param setting the setting's name
 * @param seed the seed
 * @param block the block's number within its sweep
 * @param model digests of the model as built and of its branching and hint; runs with equal ones
 *     solved the identical model; one that built none has a text of its own
 * @param seconds wall seconds of lower, solve and answer, at most the limit
 * @param limits what the run was allowed
 * @param status what it established
 * @param ending how it ended
 * @param check what judging said of its solutions
 * @param claim how its claim stands beside the others
 * @param minimize false if the objective is maximised; true also for satisfaction problems
 * @param objective the best solution's exact objective; empty without one
 * @param bound the proved bound on the objective; empty without one
 * @param peakBytes peak resident memory of all its processes; 0 where it was not measured
 * @param disturbed true if the machine was seen to interfere
 */
public record Observation(
    String run,
    String family,
    String instance,
    String instanceClass,
    double weight,
    String variant,
    String backend,
    String setting,
    long seed,
    int block,
    String model,
    double seconds,
    Limits limits,
    Status status,
    Ending ending,
    Check check,
    Claim claim,
    boolean minimize,
    OptionalLong objective,
    OptionalLong bound,
    long peakBytes,
    boolean disturbed) {

  public Observation {
    Objects.requireNonNull(run, "run");
    Objects.requireNonNull(limits, "limits");
    Objects.requireNonNull(objective, "objective");
    Objects.requireNonNull(bound, "bound");
    if (!(seconds >= 0)) {
      throw new IllegalArgumentException("seconds must be at least 0, was " + seconds);
    }
  }

  /**
   * What can be deployed: the variant on a backend with a setting, as people write it.
   *
   * @return {@code VARIANT on BACKEND}, with {@code /SETTING} unless the setting is the default one
   */
  public String candidate() {
    String on = setting.equals(DEFAULT_SETTING) ? backend : backend + "/" + setting;
    return variant + " on " + on;
  }

  /** The name of the setting that changes nothing. */
  public static final String DEFAULT_SETTING = "default";

  /**
   * Whether the run answered its goal: an optimum or infeasibility claimed, or a satisfaction
   * problem solved. Solutions that judging refused never count.
   */
  public boolean proved() {
    return ending == Ending.COMPLETED && check != Check.INVALID && status != Status.UNKNOWN;
  }

  /** Whether the run has a solution that judging did not refuse, or proved that there is none. */
  public boolean solved() {
    return check != Check.INVALID && (status != Status.UNKNOWN);
  }

  /** The best objective of a usable solution. */
  public Optional<Long> usableObjective() {
    return check == Check.INVALID || objective.isEmpty()
        ? Optional.empty()
        : Optional.of(objective.getAsLong());
  }
}
