package steelyard.results.brief;

import static steelyard.results.brief.Words.name;
import static steelyard.results.brief.Words.plural;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import steelyard.results.brief.Facts.Against;
import steelyard.results.brief.Facts.Tally;
import steelyard.results.brief.Verdict.Evidence;
import steelyard.results.brief.Verdict.Standing;
import steelyard.results.brief.Verdict.Weighed;

/** Puts how the candidates stand into plain words, claiming no more than the runs show. */
final class VerdictSentence {

  private VerdictSentence() {}

  static String of(
      BriefContext.Plan plan,
      boolean serviceHasRun,
      List<Weighed> weighed,
      Optional<Evidence> best) {
    String service = name(plan.inService()) + ", which is in service";
    if (!serviceHasRun) {
      return service + ", has no finished run yet: nothing can be weighed against it.";
    }
    if (weighed.isEmpty()) {
      return "Only " + service + ", has run: there is nothing to weigh.";
    }
    String evidence =
        plan.partial()
            ? "On the runs so far (" + plan.finishedRuns() + " of " + plan.plannedRuns() + ") "
            : "On this evidence ";
    if (best.isPresent()) {
      return evidence + ahead(best.get(), service) + "." + others(weighed, true);
    }
    return weighed.size() == 1
        ? evidence + single(weighed.get(0), service) + "."
        : evidence + "no candidate is ahead of " + service + "." + others(weighed, false);
  }

  private static String ahead(Evidence best, String service) {
    Against against = best.against();
    Tally tally = against.tally();
    StringBuilder said = new StringBuilder();
    said.append(name(best.candidate()))
        .append(" is ahead of ")
        .append(service)
        .append(": better on ")
        .append(tally.wins())
        .append(" of ")
        .append(plural(against.instances(), "instance"))
        .append(", worse on ")
        .append(tally.losses());
    if (against.penalisedBefore().isPresent() && against.penalisedAfter().isPresent()) {
      said.append(", penalised mean time ")
          .append(Words.seconds(against.penalisedAfter()))
          .append(" s against ")
          .append(Words.seconds(against.penalisedBefore()))
          .append(" s");
    }
    against
        .worstSlowdown()
        .ifPresent(
            worst ->
                said.append("; at worst ")
                    .append(Words.ratio(worst.ratio()))
                    .append(" as long, on ")
                    .append(name(worst.instance())));
    return said.toString();
  }

  private static String single(Weighed weighed, String service) {
    String candidate = name(weighed.candidate());
    return switch (weighed.standing()) {
      case AHEAD, NO_CLEAR_DIFFERENCE ->
          candidate + " shows no clear difference yet from " + service + ": " + weighed.reason();
      case BEHIND -> candidate + " is behind " + service + ": " + weighed.reason();
      case BARRED -> candidate + " is barred: " + weighed.reason();
      case NOT_WEIGHED ->
          candidate + " cannot be weighed against " + service + ": " + weighed.reason();
    };
  }

  private static String others(List<Weighed> weighed, boolean oneIsNamed) {
    List<String> parts = new ArrayList<>();
    add(parts, count(weighed, Standing.AHEAD) - (oneIsNamed ? 1 : 0), "ahead too");
    add(parts, count(weighed, Standing.BEHIND), "behind");
    add(parts, count(weighed, Standing.NO_CLEAR_DIFFERENCE), "without a clear difference yet");
    add(parts, count(weighed, Standing.BARRED), "barred for answers that did not stand up");
    add(parts, count(weighed, Standing.NOT_WEIGHED), "not weighed yet");
    return parts.isEmpty() ? "" : " The others: " + String.join(", ", parts) + ".";
  }

  private static void add(List<String> parts, long count, String words) {
    if (count > 0) {
      parts.add(count + " " + words);
    }
  }

  private static long count(List<Weighed> weighed, Standing standing) {
    return weighed.stream().filter(w -> w.standing() == standing).count();
  }
}
