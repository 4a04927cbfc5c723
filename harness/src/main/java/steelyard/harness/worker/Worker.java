package steelyard.harness.worker;

import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Probe;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Settings;
import steelyard.variants.family.Amendment;
import steelyard.variants.family.Family;

/**
 * The main class of child processes. Runs in the folder of its task; says everything in {@code
 * events.jsonl} there, never on standard output, to which native code writes.
 *
 * <ul>
 *   <li>{@code run}: solves the {@code order.json}
 *   <li>{@code lower FORMAT FILE}: lowers it; FORMAT may be empty
 *   <li>{@code digest FILE}: builds each subject in the file and says its digests
 *   <li>{@code state FILE}: says what the models of the subjects in the file state
 *   <li>{@code judge}: judges the run in each folder that is named on standard input
 *   <li>{@code probe BACKEND NAME=VALUE...}: tries out the program that the settings name
 *   <li>{@code describe}: says which families and backends there are
 *   <li>{@code calibrate}: times the calibration task
 *   <li>{@code train}: loads what runs need, for an archive of classes
 * </ul>
 */
public final class Worker {
  /** The task is done, whatever the solver found. */
  public static final int DONE = 0;

  /** The task came to nothing; the last event says why. */
  public static final int FAILED = 2;

  private static final String TRAIN = "train";

  private Worker() {}

  /** Runs one verb and exits. */
  public static void main(String[] args) throws IOException {
    Lifeline lifeline = Lifeline.take();
    int code = FAILED;
    try (EventWriter events = new EventWriter(Path.of(Wire.EVENTS))) {
      try {
        perform(List.of(args), events, lifeline);
        code = DONE;
      } catch (WorkerException e) {
        events.flush();
        events.write(e.failure());
        if (e.getCause() != null) {
          e.getCause().printStackTrace();
        }
      }
      events.flush();
      events.phase(Phases.DONE);
    }
    if (args.length > 0 && args[0].equals(TRAIN)) {
      return; // a halt would write no archive
    }
    // Foreign code may have left threads that are no daemons.
    Runtime.getRuntime().halt(code);
  }

  private static void perform(List<String> args, EventWriter events, Lifeline lifeline)
      throws IOException {
    String verb = args.isEmpty() ? "" : args.get(0);
    switch (verb) {
      case "run" -> new Run(Wire.readOrder(Path.of(Wire.ORDER)), events, lifeline).solve();
      case "lower" ->
          new Run(Wire.readOrder(Path.of(Wire.ORDER)), events, lifeline)
              .print(args.get(1), Path.of(args.get(2)));
      case "digest" -> digest(Path.of(args.get(1)), events);
      case "state" -> state(Path.of(args.get(1)), events);
      case "judge" -> judge(lifeline);
      case "probe" -> probe(args.get(1), args.subList(2, args.size()), events, lifeline);
      case "describe" -> describe(events);
      case TRAIN -> describe(events);
      case "calibrate" -> events.write(new Event.Calibrated(Calibration.nanos()));
      default ->
          throw new WorkerException(
              Event.Failure.Kind.BAD_INPUT, "unknown verb '" + verb + "' of a worker");
    }
  }

  private static void digest(Path file, EventWriter events) throws IOException {
    List<Subject> subjects = Wire.readSubjects(file);
    for (int i = 0; i < subjects.size(); i++) {
      Subject.OfVariant subject = (Subject.OfVariant) subjects.get(i);
      events.phase(Phases.build(i));
      events.write(
          new Event.Built(Built.facts(Built.read(subject).model(subject.amendments()), i)));
    }
  }

  private static void state(Path file, EventWriter events) throws IOException {
    for (Subject subject : Wire.readSubjects(file)) {
      Subject.OfVariant variant = (Subject.OfVariant) subject;
      Statements.of(Built.read(variant).model(variant.amendments()), events::write);
    }
  }

  /** Serves until the lifeline ends; a verdict appears in each folder that was named. */
  private static void judge(Lifeline lifeline) throws IOException {
    Judging judging = new Judging();
    while (!lifeline.stopAsked()) {
      String request;
      try {
        request = lifeline.nextRequest();
      } catch (InterruptedException e) {
        return;
      }
      if (!lifeline.stopAsked()) {
        Path folder = Path.of(request);
        Wire.write(verdict(judging, folder), folder.resolve(Wire.VERDICT));
      }
    }
  }

  private static Verdict verdict(Judging judging, Path folder) {
    try {
      return judging.judge(folder);
    } catch (WorkerException | IOException e) {
      String problem = "cannot be judged: " + e.getMessage();
      return new Verdict(0, List.of(problem), "", new TreeMap<>());
    }
  }

  private static void probe(
      String backend, List<String> options, EventWriter events, Lifeline lifeline) {
    Map<String, String> given = new TreeMap<>();
    for (String option : options) {
      int equals = option.indexOf('=');
      given.put(option.substring(0, equals), option.substring(equals + 1));
    }
    Backend technology = Registry.backend(backend);
    Settings settings = Run.settings(technology.describe(), given);
    Probe probe = technology.probe(settings, new RunPrograms(lifeline));
    if (probe instanceof Probe.Usable usable) {
      events.write(new Event.Program(usable.program().toString(), usable.version()));
    } else {
      throw new WorkerException(Event.Failure.Kind.UNSUPPORTED, ((Refusal) probe).reason());
    }
  }

  private static void describe(EventWriter events) {
    Registry.Found<Family<?>> families = Registry.families();
    families.working().forEach(family -> events.write(described(family)));
    Registry.Found<Backend> backends = Registry.backends();
    backends.working().forEach(b -> events.write(new Event.Backend(b.describe())));
    families.broken().forEach(b -> events.write(new Event.Missing("family", b.reason())));
    backends.broken().forEach(b -> events.write(new Event.Missing("backend", b.reason())));
  }

  private static <I> Event.Family described(Family<I> family) {
    Class<?> type = family.getClass();
    return new Event.Family(
        family.name(),
        family.summary(),
        place(type),
        type.getPackageName(),
        family.amendments().stream().map(Worker::described).toList());
  }

  private static String place(Class<?> type) {
    try {
      return Path.of(type.getProtectionDomain().getCodeSource().getLocation().toURI()).toString();
    } catch (URISyntaxException e) {
      throw new IllegalStateException("a class was loaded from no file: " + type, e);
    }
  }

  private static Event.Amendment described(Amendment<?> amendment) {
    return new Event.Amendment(
        amendment.name(),
        amendment.roleLabel(),
        amendment.summary(),
        List.copyOf(amendment.requires()),
        List.copyOf(amendment.excludes()));
  }
}
