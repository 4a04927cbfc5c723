package steelyard.results.ledger;

import java.util.Collection;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.OptionalLong;
import java.util.Set;

/**
 * How the claims of optimality and infeasibility about one problem stand beside each other.
 *
 * <p>A solution that judging found valid is a witness. A claim that a witness refutes is
 * contradicted, and speaks against no other claim: an optimum with a better valid solution, no
 * solution where there is a valid one, a bound that a valid solution passes. Where claims that no
 * witness refutes differ from each other, all of them are contradicted. A claim agrees with the
 * equal claims of other technologies; a technology does not confirm itself. A run whose solutions
 * judging refused supports and contradicts nobody.
 */
final class Claims {

  /**
   * What one run answered.
   *
   * @param technology the adapter's name
   */
  record Answer(
      String technology,
      Status status,
      boolean minimize,
      OptionalLong objective,
      OptionalLong bound,
      Check check) {}

  /** What is claimed: an optimum, or (empty) that there is no solution. */
  private record Assertion(OptionalLong optimum) {}

  private static final Standing NONE = new Standing(Claim.NONE, 0);
  private static final Standing CONTRADICTED = new Standing(Claim.CONTRADICTED, 0);

  private boolean witnessed;
  private OptionalLong least = OptionalLong.empty();
  private OptionalLong greatest = OptionalLong.empty();
  private final Map<Assertion, Set<String>> supporters = new HashMap<>();

  /**
   * Weighs all that is known of one problem.
   *
   * @param answers every answer to the problem, in any order
   */
  Claims(Collection<Answer> answers) {
    answers.stream().filter(a -> a.check() == Check.VALID).forEach(this::addWitness);
    answers.stream().filter(this::counts).forEach(this::addSupport);
  }

  /** How the claim of one of the answers stands. */
  Standing of(Answer answer) {
    if (refuted(answer)) {
      return CONTRADICTED;
    }
    if (!claims(answer)) {
      return NONE;
    }
    Assertion own = assertion(answer);
    boolean disputed = supporters.keySet().stream().anyMatch(other -> !other.equals(own));
    if (disputed) {
      return CONTRADICTED;
    }
    int agreeing =
        (int)
            supporters.getOrDefault(own, Set.of()).stream()
                .filter(other -> !other.equals(answer.technology()))
                .count();
    return new Standing(agreeing == 0 ? Claim.ALONE : Claim.AGREED, agreeing);
  }

  private void addWitness(Answer answer) {
    witnessed = true;
    answer
        .objective()
        .ifPresent(
            value -> {
              least = OptionalLong.of(Math.min(value, least.orElse(value)));
              greatest = OptionalLong.of(Math.max(value, greatest.orElse(value)));
            });
  }

  private boolean counts(Answer answer) {
    return claims(answer) && answer.check() != Check.INVALID && !refuted(answer);
  }

  private void addSupport(Answer answer) {
    supporters.computeIfAbsent(assertion(answer), a -> new HashSet<>()).add(answer.technology());
  }

  private static boolean claims(Answer answer) {
    return answer.status() == Status.OPTIMAL || answer.status() == Status.INFEASIBLE;
  }

  private static Assertion assertion(Answer answer) {
    return new Assertion(
        answer.status() == Status.OPTIMAL ? answer.objective() : OptionalLong.empty());
  }

  private boolean refuted(Answer answer) {
    if (answer.status() == Status.INFEASIBLE) {
      return witnessed;
    }
    return bettered(answer, answer.bound())
        || (answer.status() == Status.OPTIMAL && bettered(answer, answer.objective()));
  }

  /** Whether some valid solution is better than this value. */
  private boolean bettered(Answer answer, OptionalLong limit) {
    OptionalLong best = answer.minimize() ? least : greatest;
    if (best.isEmpty() || limit.isEmpty()) {
      return false;
    }
    int order = Long.compare(best.getAsLong(), limit.getAsLong());
    return answer.minimize() ? order < 0 : order > 0;
  }
}
