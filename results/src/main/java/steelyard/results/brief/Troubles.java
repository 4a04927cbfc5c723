package steelyard.results.brief;

import static steelyard.results.brief.Words.plural;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.Predicate;
import steelyard.results.brief.BriefContext.Finding;
import steelyard.results.brief.BriefContext.Gravity;
import steelyard.results.brief.Facts.Trouble;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Claim;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Observation;
import steelyard.results.ledger.Status;

/** Is anything wrong: what others found, then what the runs' own records show, gravest first. */
final class Troubles {

  /** A sign in the record, with the words for it between the candidate and the count of runs. */
  private record Sign(Gravity gravity, Predicate<Observation> shows, String words) {}

  private static final List<Sign> SIGNS =
      List.of(
          new Sign(
              Gravity.WRONG,
              run -> run.check() == Check.INVALID,
              "gave a solution that judging refused"),
          new Sign(
              Gravity.WRONG,
              run -> run.claim() == Claim.CONTRADICTED,
              "claimed what another run's answer contradicts"),
          new Sign(Gravity.WRONG, run -> run.ending() == Ending.CRASHED, "crashed"),
          new Sign(
              Gravity.CAUTION,
              run -> run.ending() == Ending.MEMORY_LIMIT,
              "asked for more memory than it was allowed"),
          new Sign(
              Gravity.CAUTION,
              run -> run.ending() == Ending.UNSUPPORTED,
              "was refused by its backend"),
          new Sign(
              Gravity.CAUTION,
              run -> run.ending() == Ending.STOPPED,
              "was stopped from outside and counts for nothing until it is run again"),
          new Sign(
              Gravity.CAUTION,
              Observation::disturbed,
              "was disturbed by the machine, so that its time may be too long"),
          new Sign(Gravity.CAUTION, Troubles::unjudged, "has a solution that was not judged yet"));

  private Troubles() {}

  private static boolean unjudged(Observation run) {
    return run.check() == Check.UNCHECKED
        && (run.status() == Status.OPTIMAL || run.status() == Status.FEASIBLE);
  }

  /**
   * The list.
   *
   * @param byCandidate every candidate's runs, in the order to show
   */
  static List<Trouble> of(List<Finding> findings, Map<String, List<Observation>> byCandidate) {
    List<Trouble> troubles = new ArrayList<>();
    findings.forEach(f -> troubles.add(new Trouble(f.gravity(), f.text(), f.runs())));
    for (Sign sign : SIGNS) {
      byCandidate.forEach(
          (candidate, runs) -> {
            List<String> showing =
                runs.stream().filter(sign.shows()).map(Observation::run).toList();
            if (!showing.isEmpty()) {
              troubles.add(
                  new Trouble(sign.gravity(), sentence(candidate, showing, sign), showing));
            }
          });
    }
    troubles.sort(Comparator.comparing(Trouble::gravity));
    return troubles;
  }

  private static String sentence(String candidate, List<String> showing, Sign sign) {
    return Words.name(candidate) + " " + sign.words() + " (" + plural(showing.size(), "run") + ").";
  }

  /** The candidates whose answers cannot be trusted, and which are therefore never called ahead. */
  static Set<String> barred(List<Finding> findings, Map<String, List<Observation>> byCandidate) {
    Set<String> barred = new HashSet<>();
    findings.stream()
        .filter(finding -> finding.gravity() == Gravity.WRONG)
        .forEach(finding -> finding.candidate().ifPresent(barred::add));
    byCandidate.forEach(
        (candidate, runs) -> {
          if (runs.stream().anyMatch(Troubles::untrustworthy)) {
            barred.add(candidate);
          }
        });
    return Set.copyOf(barred);
  }

  private static boolean untrustworthy(Observation run) {
    return run.check() == Check.INVALID || run.claim() == Claim.CONTRADICTED;
  }
}
