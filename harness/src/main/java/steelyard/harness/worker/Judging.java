package steelyard.harness.worker;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import java.util.TreeMap;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Answers;
import steelyard.variants.family.Check;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Model;
import steelyard.variants.model.Variables;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.Evaluator.Judgement;

/**
 * Judges the solutions of finished runs from their values alone: on the variant's own model, on the
 * plain model through the names that they share, and by the family's own checker.
 */
final class Judging {
  /** Models kept between requests: a block's runs share an instance. */
  private static final int MOST_KEPT = 16;

  private final Map<Subject, Judged> kept =
      new LinkedHashMap<>(MOST_KEPT, 0.75f, true) {
        private static final long serialVersionUID = 1L;

        @Override
        protected boolean removeEldestEntry(Map.Entry<Subject, Judged> eldest) {
          return size() > MOST_KEPT;
        }
      };

  /** A model that solutions are judged on. */
  private record Judged(Built<?> family, Model model, Evaluator evaluator) {
    static Judged of(Subject.OfVariant subject) {
      Built<?> family = Built.read(subject);
      Model model = family.model(subject.amendments());
      return new Judged(family, model, new Evaluator(model));
    }
  }

  /** Judges every solution in a run's folder. */
  Verdict judge(Path folder) throws IOException {
    RunOrder order = Wire.readOrder(folder.resolve(Wire.ORDER));
    Subject.OfVariant subject = (Subject.OfVariant) order.subject();
    Judged variant = kept.computeIfAbsent(subject, s -> Judged.of(subject));
    Judged plain = kept.computeIfAbsent(subject.plain(), s -> Judged.of(subject.plain()));
    List<String> problems = new ArrayList<>();
    long judged = 0;
    Answer last = new Answer(new TreeMap<>(), OptionalLong.empty());
    for (StampedEvent stamped : new EventTail(folder.resolve(Wire.EVENTS)).next()) {
      if (stamped.event() instanceof Event.Solution solution) {
        judged++;
        last = judge(solution, variant, plain, problems);
      }
    }
    String shown = judged > 0 && problems.isEmpty() ? plain.family().show(last) : "";
    return new Verdict(judged, problems, shown, last.values());
  }

  private static Answer judge(
      Event.Solution solution, Judged variant, Judged plain, List<String> problems) {
    Judgement own = variant.evaluator().judge(solution.decisions().toArray());
    own.violations().forEach(v -> problems.add(v.describe()));
    Answer answer = Answers.of(variant.model(), own);
    if (!own.isValid()) {
      return answer;
    }
    requireSame("the run says", solution.objective(), "its model", own.objective(), problems);
    int[] decisions = shared(answer, plain.model().variables(), problems);
    if (!problems.isEmpty()) {
      return answer;
    }
    Judgement onPlain = plain.evaluator().judge(decisions);
    onPlain.violations().forEach(v -> problems.add("plain: " + v.describe()));
    Answer inPlain = Answers.of(plain.model(), onPlain);
    requireSame("its model says", own.objective(), "plain", onPlain.objective(), problems);
    if (onPlain.isValid()) {
      Check check = plain.family().check(inPlain);
      check.problems().forEach(problem -> problems.add("checker: " + problem));
      requireSame("plain says", onPlain.objective(), "the checker", check.objective(), problems);
    }
    return inPlain;
  }

  private static int[] shared(Answer answer, Variables plain, List<String> problems) {
    Ints decisions = plain.decisions();
    int[] values = new int[decisions.size()];
    for (int i = 0; i < values.length; i++) {
      String name = plain.name(decisions.get(i));
      Integer value = answer.values().get(name);
      if (value == null) {
        problems.add("the variant has no variable '" + name + "' of plain");
      } else {
        values[i] = value;
      }
    }
    return values;
  }

  private static void requireSame(
      String one, OptionalLong first, String other, OptionalLong second, List<String> problems) {
    if (!first.equals(second)) {
      problems.add(
          "objective: " + one + " " + text(first) + ", " + other + " says " + text(second));
    }
  }

  private static String text(OptionalLong value) {
    return value.isPresent() ? Long.toString(value.getAsLong()) : "none";
  }
}
