package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import steelyard.variants.model.Branching;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Hint;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Origin;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Variables;

/** Models made of constraints as adapters see them, without formulas. */
public final class SmallModels {
  private SmallModels() {}

  public static Model of(List<Domain> domains, List<? extends Constraint> asserted) {
    return of(domains, asserted, Optional.empty());
  }

  /** A model of decisions x0, x1, ... and postings as adapters see them. */
  public static Model of(
      List<Domain> domains, List<? extends Constraint> asserted, Optional<Objective> objective) {
    List<Variables.Variable> variables =
        IntStream.range(0, domains.size())
            .mapToObj(v -> new Variables.Variable("x" + v, domains.get(v), Variables.Kind.DECISION))
            .toList();
    List<Posting> postings = new ArrayList<>();
    for (Constraint constraint : asserted) {
      int id = postings.size();
      postings.add(
          new Posting(
              id,
              new Origin(Origin.PLAIN, "asserted", id),
              Posting.Duty.ASSERTED,
              Formula.all(),
              List.of(),
              List.of(constraint)));
    }
    return Model.of(Variables.of(variables), postings, objective, Branching.NONE, Hint.NONE);
  }
}
