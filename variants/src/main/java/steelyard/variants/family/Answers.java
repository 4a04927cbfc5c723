package steelyard.variants.family;

import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.variants.model.Model;
import steelyard.variants.model.Variables;
import steelyard.variants.model.judge.Evaluator.Judgement;

/** Turns judged solutions into answers by name. */
public final class Answers {
  private Answers() {}

  /**
   * The named variables' values.
   *
   * @param model the model that {@code judgement} was made on
   */
  public static Answer of(Model model, Judgement judgement) {
    SortedMap<String, Integer> values = new TreeMap<>();
    Variables variables = model.variables();
    for (int v = 0; v < variables.size(); v++) {
      if (variables.get(v).kind() != Variables.Kind.AUXILIARY) {
        values.put(variables.name(v), judgement.complete().get(v));
      }
    }
    return new Answer(values, judgement.objective());
  }
}
