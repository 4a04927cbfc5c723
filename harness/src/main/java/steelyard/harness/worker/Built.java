package steelyard.harness.worker;

import java.io.IOException;
import java.nio.file.Files;
import java.util.Collection;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.concurrent.Callable;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;
import steelyard.variants.family.Family;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.Variant;
import steelyard.variants.model.Digest;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Posting;
import steelyard.variants.model.build.ModelException;

/**
 * A family with an instance read: builds variants on it and asks the family about answers. What
 * foreign code throws comes out as one line that names it.
 */
final class Built<I> {
  private final Family<I> family;
  private final I instance;

  private Built(Family<I> family, I instance) {
    this.family = family;
    this.instance = instance;
  }

  static Built<?> read(Subject subject) {
    Subject.OfVariant variant = (Subject.OfVariant) subject;
    return read(Registry.family(variant.family()), variant);
  }

  private static <I> Built<I> read(Family<I> family, Subject.OfVariant variant) {
    if (!Files.isReadable(variant.path())) {
      throw bad("cannot read the instance file " + variant.path());
    }
    InstanceSource source = new InstanceSource(variant.instance(), variant.path());
    return new Built<>(family, guarded(family, "reading", () -> family.read(source)));
  }

  Model model(Collection<String> amendments) {
    return guarded(
        family, "building", () -> Variant.of(family, amendments).build(family, instance));
  }

  Check check(Answer answer) {
    return guarded(family, "checking", () -> family.check(instance, answer));
  }

  String show(Answer answer) {
    return guarded(family, "showing", () -> family.show(instance, answer));
  }

  private static <T> T guarded(Family<?> family, String doing, Callable<T> step) {
    try {
      T result = step.call();
      if (result == null) {
        throw foreign(family, doing, "returned null", null);
      }
      return result;
    } catch (InstanceException | ModelException e) {
      throw bad(e.getMessage());
    } catch (IOException e) {
      throw bad("cannot read: " + e);
    } catch (WorkerException e) {
      throw e;
    } catch (Exception | StackOverflowError | LinkageError | AssertionError e) {
      throw foreign(family, doing, "threw " + at(e), e);
    }
  }

  private static String at(Throwable thrown) {
    StackTraceElement[] trace = thrown.getStackTrace();
    return thrown + (trace.length == 0 ? "" : " at " + trace[0]);
  }

  private static WorkerException bad(String message) {
    return new WorkerException(Event.Failure.Kind.BAD_INPUT, message);
  }

  private static WorkerException foreign(
      Family<?> family, String doing, String what, Throwable cause) {
    return new WorkerException(
        Event.Failure.Kind.FAMILY,
        "family " + family.name() + " " + what + " while " + doing,
        cause);
  }

  /** What the harness keeps of a model. */
  static Event.Built.Facts facts(Model model, int subject) {
    SortedMap<String, Integer> sizes = new TreeMap<>();
    for (Posting posting : model.lowered()) {
      sizes.merge(posting.origin().qualifiedGroup(), 1, Integer::sum);
    }
    SortedMap<String, Event.Built.Group> groups = new TreeMap<>();
    for (Map.Entry<String, Digest> group : model.groups().entrySet()) {
      groups.put(
          group.getKey(),
          new Event.Built.Group(group.getValue(), sizes.getOrDefault(group.getKey(), 0)));
    }
    return new Event.Built.Facts(
        subject,
        model.asBuilt(),
        model.search(),
        model.canonical(),
        model.variables().size(),
        model.postings().size(),
        model.objective().map(o -> o.sense() == Objective.Sense.MINIMIZE).orElse(true),
        groups);
  }
}
