package steelyard.results.statistics;

import java.util.Objects;

/**
 * Which of two runs on the same instance and seed is better, and on what ground?
 *
 * <p>The grounds are tried in order of importance; a later one counts only where the earlier leave
 * the pair undecided: a usable proof, a usable answer, a better objective, then time beyond the
 * margin. Censored times are never compared: a pair of which neither is proved and whose objectives
 * are equal stays open.
 *
 * @see <a href="https://doi.org/10.1002/sim.3923">Buyse (2010), Generalized pairwise comparisons of
 *     prioritized outcomes in the two-sample problem, Statistics in Medicine 29:3245-3257 (there
 *     over all pairs, here over matched ones; from memory)</a>
 */
public final class PairRule {

  /** What decided a pair. */
  public enum Ground {
    /** One answered its goal and the other did not. */
    PROOF,
    /** One found a usable solution and the other found none. */
    ANSWER,
    /** One found the better solution. */
    OBJECTIVE,
    /** One was faster by more than the margin. */
    TIME,
    /** Nothing did. */
    NONE
  }

  /**
   * A pair's outcome and what decided it.
   *
   * @param outcome seen from after
   * @param ground {@code NONE} unless the outcome is a win or a loss
   */
  public record Comparison(Outcome outcome, Ground ground) {
    public Comparison {
      Objects.requireNonNull(outcome, "outcome");
      Objects.requireNonNull(ground, "ground");
    }
  }

  private final TieMargin margin;

  public PairRule(TieMargin margin) {
    this.margin = Objects.requireNonNull(margin, "margin");
  }

  /** Compares the two runs of a pair. */
  public Comparison compare(Attainment before, Attainment after) {
    if (before.proved() != after.proved()) {
      return decided(after.proved(), Ground.PROOF);
    }
    if (before.answered() != after.answered()) {
      return decided(after.answered(), Ground.ANSWER);
    }
    if (before.cost().isPresent() != after.cost().isPresent()) {
      return decided(after.cost().isPresent(), Ground.OBJECTIVE);
    }
    if (before.cost().isPresent() && before.cost().getAsLong() != after.cost().getAsLong()) {
      return decided(after.cost().getAsLong() < before.cost().getAsLong(), Ground.OBJECTIVE);
    }
    if (!before.proved()) {
      return new Comparison(Outcome.BOTH_OPEN, Ground.NONE);
    }
    return byTime(before, after);
  }

  private Comparison byTime(Attainment before, Attainment after) {
    if (before.seconds().isEmpty() || after.seconds().isEmpty()) {
      return new Comparison(Outcome.TIE, Ground.NONE);
    }
    double b = before.seconds().getAsDouble();
    double a = after.seconds().getAsDouble();
    return margin.ties(a, b)
        ? new Comparison(Outcome.TIE, Ground.NONE)
        : decided(a < b, Ground.TIME);
  }

  private static Comparison decided(boolean afterIsBetter, Ground ground) {
    return new Comparison(afterIsBetter ? Outcome.WIN : Outcome.LOSS, ground);
  }
}
