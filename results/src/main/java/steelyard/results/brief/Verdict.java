package steelyard.results.brief;

import static steelyard.results.brief.Words.plural;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalDouble;
import steelyard.results.brief.Facts.Against;
import steelyard.results.brief.Facts.Tally;
import steelyard.results.statistics.Holm;
import steelyard.results.statistics.SignTest;
import steelyard.results.statistics.TieMargin;

/**
 * Which candidates are ahead of the one in service, on the evidence so far?
 *
 * <p>A candidate is ahead if it did better on more instances than it did worse, by a split that
 * luck would give in fewer than one of twenty sweeps (exact sign test, adjusted by Holm for the
 * number of candidates weighed), and its penalised mean is lower by more than the tie margin.
 * Behind is the mirror image. Everything else is no clear difference yet. A candidate with a
 * refused solution or a contradicted claim is barred whatever its times. It says how things stand;
 * it does not decide.
 *
 * @param sentence the whole verdict in plain words
 * @param best the candidate that is ahead with the lowest penalised mean; empty if none is
 * @param weighed every other candidate, in the order given
 */
public record Verdict(String sentence, Optional<String> best, List<Weighed> weighed) {

  /** How a candidate stands beside the one in service. */
  public enum Standing {
    AHEAD,
    BEHIND,
    NO_CLEAR_DIFFERENCE,
    BARRED,
    /** No instance has been run by both. */
    NOT_WEIGHED
  }

  /** A candidate, how it stands, and why in plain words. */
  public record Weighed(String candidate, Standing standing, String reason) {
    public Weighed {
      Objects.requireNonNull(standing, "standing");
    }
  }

  /**
   * What is known of one candidate.
   *
   * @param against its comparison with the candidate in service
   * @param barred whether its answers cannot be trusted
   */
  record Evidence(String candidate, Against against, boolean barred) {}

  private static final double LUCK = 0.05;
  private static final int FEWEST_INFORMATIVE = 6;

  public Verdict {
    Objects.requireNonNull(sentence, "sentence");
    Objects.requireNonNull(best, "best");
    weighed = List.copyOf(weighed);
  }

  /** Weighs the candidates against the one in service. */
  static Verdict of(
      BriefContext.Plan plan, boolean serviceHasRun, List<Evidence> others, TieMargin margin) {
    double[] luck = Holm.adjust(others.stream().mapToDouble(Verdict::luck).toArray());
    List<Weighed> weighed = new ArrayList<>();
    for (int i = 0; i < others.size(); i++) {
      weighed.add(weigh(others.get(i), luck[i], margin));
    }
    Optional<Evidence> best = best(others, weighed);
    return new Verdict(
        VerdictSentence.of(plan, serviceHasRun, weighed, best),
        best.map(Evidence::candidate),
        weighed);
  }

  /**
   * The sign test's value; 1 for who cannot be ahead, which keeps Holm's count at its full size.
   */
  private static double luck(Evidence evidence) {
    Tally tally = evidence.against().tally();
    return evidence.barred() ? 1 : SignTest.twoSided(tally.wins(), tally.losses());
  }

  private static Weighed weigh(Evidence evidence, double luck, TieMargin margin) {
    String candidate = evidence.candidate();
    if (evidence.barred()) {
      return new Weighed(candidate, Standing.BARRED, "not all of its answers stood up to checking");
    }
    Against against = evidence.against();
    Tally tally = against.tally();
    if (against.instances() == 0) {
      return new Weighed(candidate, Standing.NOT_WEIGHED, "no instance has been run by both yet");
    }
    if (tally.unchanged() == against.instances()) {
      return undecided(candidate, "the model is unchanged on every instance");
    }
    int informative = tally.wins() + tally.losses();
    if (informative < FEWEST_INFORMATIVE) {
      return undecided(
          candidate,
          "only "
              + plural(informative, "instance")
              + (informative == 1 ? " tells" : " tell")
              + " the two apart; it takes at least "
              + FEWEST_INFORMATIVE);
    }
    return compare(candidate, against, luck, margin);
  }

  private static Weighed compare(String candidate, Against against, double luck, TieMargin margin) {
    Tally tally = against.tally();
    String split = "better on " + tally.wins() + ", worse on " + tally.losses();
    if (luck > LUCK) {
      return undecided(candidate, split + ": this split can be luck");
    }
    int means = meansSay(against, margin);
    boolean wins = tally.wins() > tally.losses();
    if (wins ? means < 0 : means > 0) {
      return undecided(candidate, split + ", but its penalised mean says otherwise");
    }
    if (means == 0) {
      return undecided(candidate, split + ", but its penalised mean is about the same");
    }
    return new Weighed(candidate, wins ? Standing.AHEAD : Standing.BEHIND, split);
  }

  private static Weighed undecided(String candidate, String reason) {
    return new Weighed(candidate, Standing.NO_CLEAR_DIFFERENCE, reason);
  }

  /** 1 if the penalised means favour after, -1 if before, 0 if they tie; the split if untimed. */
  private static int meansSay(Against against, TieMargin margin) {
    if (against.penalisedBefore().isEmpty() || against.penalisedAfter().isEmpty()) {
      return Integer.compare(against.tally().wins(), against.tally().losses());
    }
    double before = against.penalisedBefore().getAsDouble();
    double after = against.penalisedAfter().getAsDouble();
    return margin.ties(before, after) ? 0 : Double.compare(before, after);
  }

  private static Optional<Evidence> best(List<Evidence> others, List<Weighed> weighed) {
    List<Evidence> ahead = new ArrayList<>();
    for (int i = 0; i < others.size(); i++) {
      if (weighed.get(i).standing() == Standing.AHEAD) {
        ahead.add(others.get(i));
      }
    }
    return ahead.stream()
        .min(
            Comparator.comparingDouble(Verdict::gain)
                .thenComparingInt(e -> e.against().tally().losses() - e.against().tally().wins()));
  }

  /** The penalised mean as a share of what the candidate in service needs on the same instances. */
  private static double gain(Evidence evidence) {
    OptionalDouble before = evidence.against().penalisedBefore();
    OptionalDouble after = evidence.against().penalisedAfter();
    return before.isPresent() && after.isPresent() ? after.getAsDouble() / before.getAsDouble() : 1;
  }
}
