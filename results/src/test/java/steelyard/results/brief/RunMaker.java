package steelyard.results.brief;

import java.util.Optional;
import java.util.OptionalLong;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Claim;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Observation;
import steelyard.results.ledger.Status;

/** Makes observations that differ from an everyday proved run in what a test is about. */
public final class RunMaker {

  private String run = "";
  private String family = "workshop";
  private String instance = "i1";
  private String instanceClass = "-";
  private final String variant;
  private String backend = "cpsat";
  private long seed;
  private int block = 1;
  private String model = "";
  private double seconds;
  private Limits limits = new Limits(60, Optional.empty(), 1L << 30);
  private Status status = Status.OPTIMAL;
  private Ending ending = Ending.COMPLETED;
  private Check check = Check.VALID;
  private Claim claim = Claim.ALONE;
  private boolean minimize = true;
  private OptionalLong objective = OptionalLong.of(100);
  private OptionalLong bound = OptionalLong.of(100);
  private boolean disturbed;

  private RunMaker(String variant) {
    this.variant = variant;
  }

  /** A run of this variant on {@code cpsat} that proved 100 to be optimal. */
  public static RunMaker proved(String variant, String instance, double seconds) {
    RunMaker maker = new RunMaker(variant);
    maker.instance = instance;
    maker.seconds = seconds;
    return maker;
  }

  /** A run that its limit of 60 s ended before it found anything. */
  public static RunMaker open(String variant, String instance) {
    RunMaker maker = proved(variant, instance, 60);
    maker.status = Status.UNKNOWN;
    maker.ending = Ending.TIME_LIMIT;
    maker.check = Check.UNCHECKED;
    maker.claim = Claim.NONE;
    maker.objective = OptionalLong.empty();
    maker.bound = OptionalLong.empty();
    return maker;
  }

  /** A run that its limit ended with this solution. */
  public static RunMaker found(String variant, String instance, long objective) {
    RunMaker maker = open(variant, instance);
    maker.status = Status.FEASIBLE;
    maker.check = Check.VALID;
    maker.objective = OptionalLong.of(objective);
    return maker;
  }

  public RunMaker run(String id) {
    this.run = id;
    return this;
  }

  public RunMaker family(String name) {
    this.family = name;
    return this;
  }

  public RunMaker inClass(String name) {
    this.instanceClass = name;
    return this;
  }

  public RunMaker backend(String name) {
    this.backend = name;
    return this;
  }

  public RunMaker seed(long value) {
    this.seed = value;
    return this;
  }

  public RunMaker block(int number) {
    this.block = number;
    return this;
  }

  public RunMaker model(String digest) {
    this.model = digest;
    return this;
  }

  public RunMaker limits(Limits value) {
    this.limits = value;
    return this;
  }

  public RunMaker status(Status value) {
    this.status = value;
    return this;
  }

  public RunMaker ending(Ending value) {
    this.ending = value;
    return this;
  }

  public RunMaker check(Check value) {
    this.check = value;
    return this;
  }

  public RunMaker claim(Claim value) {
    this.claim = value;
    return this;
  }

  public RunMaker maximize() {
    this.minimize = false;
    return this;
  }

  public RunMaker objective(long value) {
    this.objective = OptionalLong.of(value);
    return this;
  }

  public RunMaker disturbed() {
    this.disturbed = true;
    return this;
  }

  public Observation make() {
    String id =
        run.isEmpty() ? variant + "." + backend + "." + instance + "." + seed + "." + block : run;
    return new Observation(
        id,
        family,
        instance,
        instanceClass,
        1,
        variant,
        backend,
        Observation.DEFAULT_SETTING,
        seed,
        block,
        model.isEmpty() ? variant + " of " + instance : model,
        seconds,
        limits,
        status,
        ending,
        check,
        claim,
        minimize,
        objective,
        bound,
        1L << 28,
        disturbed);
  }
}
