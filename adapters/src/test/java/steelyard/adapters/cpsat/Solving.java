package steelyard.adapters.cpsat;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.variants.model.Branching;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Hint;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Origin;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Variables;

/** Solves small models in tests. */
final class Solving {
  static final CpSatBackend BACKEND = new CpSatBackend();

  private Solving() {}

  /** What a solve said. */
  record Solved(SolveOutcome outcome, Recording heard) {}

  static Solved solve(Model model, Goal goal, Map<String, String> settings, Deadline deadline) {
    return solve(model, goal, request(settings, 1, deadline));
  }

  static Solved solve(Model model, Goal goal, SolveRequest request) {
    return solve(model, goal, request, new Recording());
  }

  static Solved solve(Model model, Goal goal, SolveRequest request, Recording heard) {
    try (Lowering lowering = (Lowering) BACKEND.lower(model, request, heard)) {
      SolveOutcome outcome = lowering.solve(goal, heard);
      return new Solved(outcome, heard);
    }
  }

  static Solved solve(Model model, Goal goal) {
    return solve(model, goal, Map.of(), Limit.none());
  }

  static SolveRequest request(Map<String, String> settings, int threads, Deadline deadline) {
    return new SolveRequest(Settings.of(BACKEND.describe(), settings), 0, threads, deadline);
  }

  /** A model of decisions x0, x1, ... and constraints as adapters see them. */
  static Model flat(
      List<Domain> domains, List<? extends Constraint> constraints, Optional<Objective> objective) {
    List<Variables.Variable> variables = new ArrayList<>();
    IntStream.range(0, domains.size())
        .forEach(
            v ->
                variables.add(
                    new Variables.Variable("x" + v, domains.get(v), Variables.Kind.DECISION)));
    List<Posting> postings = new ArrayList<>();
    for (Constraint constraint : constraints) {
      int id = postings.size();
      postings.add(
          new Posting(
              id,
              new Origin(Origin.PLAIN, "stated", id),
              Posting.Duty.ASSERTED,
              source(constraint),
              List.of(),
              List.of(constraint)));
    }
    return Model.of(Variables.of(variables), postings, objective, Branching.NONE, Hint.NONE);
  }

  private static Formula source(Constraint constraint) {
    if (constraint instanceof Conditional conditional) {
      Formula when = Formula.literal(conditional.when());
      Formula then = Formula.holds(conditional.then());
      return switch (conditional.mode()) {
        case IF -> when.implies(then);
        case ONLY_IF -> then.implies(when);
        case IFF -> when.iff(then);
      };
    }
    return Formula.holds((Relation) constraint);
  }
}
