package steelyard.variants.family;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalLong;
import java.util.TreeSet;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Mentions;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Variables;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.Evaluator.Judgement;

/**
 * Solutions of a small model, by trying every value of every decision in turn. The judge decides; a
 * branch is left early where it finds a posting broken whose variables are all decided.
 */
public final class AllSolutions {
  private final Evaluator evaluator;
  private final Variables variables;
  private final Ints decisions;

  /** By variable id; undecided ones have any value of their domain. */
  private final int[] values;

  /** By variable id, the postings over decisions alone of which it is the last. */
  private final List<List<Posting>> decidedBy = new ArrayList<>();

  private final long atMost;
  private final List<Judgement> found = new ArrayList<>();

  private AllSolutions(Model model, long atMost) {
    this.atMost = atMost;
    evaluator = new Evaluator(model);
    variables = model.variables();
    decisions = variables.decisions();
    values = new int[variables.size()];
    for (int v = 0; v < values.length; v++) {
      values[v] = variables.domain(v).min();
      decidedBy.add(new ArrayList<>());
    }
    for (Posting posting : model.postings()) {
      if (posting.duty() == Posting.Duty.ASSERTED) {
        file(posting);
      }
    }
  }

  /** The judgements of all solutions, in lexicographic order of the decisions. */
  public static List<Judgement> of(Model model) {
    return first(Long.MAX_VALUE, model);
  }

  /** The first of them, so many or as many as there are. */
  public static List<Judgement> first(long atMost, Model model) {
    AllSolutions all = new AllSolutions(model, atMost);
    all.extend(0);
    return all.found;
  }

  /** The smallest objective of the solutions; empty if there are none or it has none. */
  public static OptionalLong minimum(List<Judgement> solutions) {
    return solutions.stream()
        .filter(s -> s.objective().isPresent())
        .mapToLong(s -> s.objective().getAsLong())
        .min();
  }

  /** The values of the variables that are decisions, in order of id. */
  public static int[] decisions(Model model, Judgement solution) {
    return model.variables().decisions().stream().map(v -> solution.complete().get(v)).toArray();
  }

  private void file(Posting posting) {
    TreeSet<Integer> mentioned = new TreeSet<>();
    Mentions mentions = new Mentions(mentioned::add);
    posting.definitions().forEach(d -> mentions.of(d.constraint()));
    posting.asserted().forEach(mentions::of);
    mentioned.removeIf(v -> variables.get(v).kind() == Variables.Kind.AUXILIARY);
    if (!mentioned.isEmpty() && mentioned.stream().allMatch(variables::isDecision)) {
      decidedBy.get(mentioned.last()).add(posting);
    }
  }

  private void extend(int position) {
    if (position == decisions.size()) {
      Judgement judgement = evaluator.judge(decisions.stream().map(v -> values[v]).toArray());
      if (judgement.isValid()) {
        found.add(judgement);
      }
      return;
    }
    int variable = decisions.get(position);
    variables.domain(variable).stream()
        .takeWhile(value -> found.size() < atMost)
        .forEach(
            value -> {
              values[variable] = value;
              if (stillHolds(variable)) {
                extend(position + 1);
              }
            });
    values[variable] = variables.domain(variable).min();
  }

  private boolean stillHolds(int decided) {
    Ints now = Ints.of(values);
    return decidedBy.get(decided).stream().allMatch(posting -> evaluator.holds(posting, now));
  }
}
