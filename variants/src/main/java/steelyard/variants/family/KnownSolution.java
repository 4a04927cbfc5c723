package steelyard.variants.family;

import java.util.Collections;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.variants.model.Model;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.Evaluator.Judgement;

/**
 * A solution that somebody made elsewhere.
 *
 * @param decisions a value for each decision of the plain model, by name
 * @param objective what it was worth there, if that is known
 */
public record KnownSolution(SortedMap<String, Integer> decisions, OptionalLong objective) {
  public KnownSolution {
    decisions = Collections.unmodifiableSortedMap(new TreeMap<>(decisions));
  }

  /**
   * What the plain model says of it.
   *
   * @throws IllegalArgumentException if it lacks a decision of the model or has one that the model
   *     lacks
   */
  public Judgement judgedBy(Model plain) {
    int[] values =
        plain.variables().decisions().stream()
            .map(variable -> valueOf(plain.variables().name(variable)))
            .toArray();
    if (values.length < decisions.size()) {
      String foreign =
          decisions.keySet().stream()
              .filter(name -> plain.variables().find(name).isEmpty())
              .findFirst()
              .orElse("a name that is no decision");
      throw new IllegalArgumentException("the plain model decides no '" + foreign + "'");
    }
    return new Evaluator(plain).judge(values);
  }

  private int valueOf(String name) {
    Integer value = decisions.get(name);
    if (value == null) {
      throw new IllegalArgumentException("the known solution does not decide '" + name + "'");
    }
    return value;
  }
}
