package steelyard.variants.model;

import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.SortedMap;

/**
 * An immutable constraint model: variables, postings, objective, branching, hint. Adapters lower
 * {@link #lowered()}; the judge reads the sources of {@link #postings()}.
 */
public final class Model {
  private final Variables variables;
  private final List<Posting> postings;
  private final Optional<Objective> objective;
  private final Branching branching;
  private final Hint hint;
  private final BitSet needed;
  private final List<Posting> lowered;

  private Model(
      Variables variables,
      List<Posting> postings,
      Optional<Objective> objective,
      Branching branching,
      Hint hint,
      Needed needed) {
    this.variables = Objects.requireNonNull(variables, "variables");
    this.postings = List.copyOf(postings);
    this.objective = Objects.requireNonNull(objective, "objective");
    this.branching = Objects.requireNonNull(branching, "branching");
    this.hint = Objects.requireNonNull(hint, "hint");
    this.needed = needed.variables();
    this.lowered = needed.postings();
  }

  /**
   * A model of the given parts.
   *
   * @param postings in order of posting; each id is its position
   */
  public static Model of(
      Variables variables,
      List<Posting> postings,
      Optional<Objective> objective,
      Branching branching,
      Hint hint) {
    for (int id = 0; id < postings.size(); id++) {
      if (postings.get(id).id() != id) {
        throw new IllegalArgumentException(
            "posting " + postings.get(id).id() + " stands at position " + id);
      }
    }
    Needed needed = Needed.of(variables, postings, objective, branching);
    return new Model(variables, postings, objective, branching, hint, needed);
  }

  public Variables variables() {
    return variables;
  }

  /** Every posting, withdrawn ones included, in order of id unless the model was rewritten. */
  public List<Posting> postings() {
    return postings;
  }

  public Optional<Objective> objective() {
    return objective;
  }

  public Branching branching() {
    return branching;
  }

  public Hint hint() {
    return hint;
  }

  /** What a backend gets: asserted postings, and the definitions of variables that are used. */
  public List<Posting> lowered() {
    return lowered;
  }

  /** Whether a backend gets the variable: every decision, and what a lowered posting mentions. */
  public boolean isNeeded(int variable) {
    return needed.get(variable);
  }

  /**
   * The digest of what a backend gets, in order, without names, groups and branching: models of
   * equal digest are the same model.
   */
  public Digest asBuilt() {
    return ModelDigests.asBuilt(this);
  }

  /** The digest of the branching and the hint; matters only to backends that follow them. */
  public Digest search() {
    return ModelDigests.search(this);
  }

  /** The digest of variables, postings and objective by name, free of every order. */
  public Digest canonical() {
    return ModelDigests.canonical(this);
  }

  /** The canonical digest of each group, by {@link Origin#qualifiedGroup()}. */
  public SortedMap<String, Digest> groups() {
    return ModelDigests.groups(this);
  }

  /**
   * The same model under other variable ids, with postings in another order; posting ids stay.
   *
   * @param rewriting a permutation of this model's variables
   * @param order position in the result to position before
   */
  public Model rewrite(Rewriting rewriting, int[] order) {
    List<Posting> moved = new ArrayList<>(postings.size());
    for (int from : order) {
      moved.add(postings.get(from).rewrite(rewriting));
    }
    Variables renamed = variables.rewrite(rewriting);
    Optional<Objective> goal =
        objective.map(o -> new Objective(o.sense(), o.sum().rewrite(rewriting)));
    Branching phases = branching.rewrite(rewriting);
    BitSet used = new BitSet();
    needed.stream().forEach(v -> used.set(rewriting.variable(v)));
    List<Posting> kept = moved.stream().filter(p -> isLowered(p, used)).toList();
    return new Model(renamed, moved, goal, phases, hint.rewrite(rewriting), new Needed(used, kept));
  }

  private static boolean isLowered(Posting posting, BitSet used) {
    return switch (posting.duty()) {
      case ASSERTED -> true;
      case DEFINITION -> used.get(posting.defined());
      case WITHDRAWN -> false;
    };
  }

  /** Which variables and postings a backend gets. */
  private record Needed(BitSet variables, List<Posting> postings) {
    static Needed of(
        Variables variables,
        List<Posting> postings,
        Optional<Objective> objective,
        Branching branching) {
      BitSet used = new BitSet(variables.size());
      variables.decisions().stream().forEach(used::set);
      Mentions mentions = new Mentions(used::set);
      objective.ifPresent(o -> mentions.of(o.sum()));
      branching.phases().forEach(phase -> mentions.of(phase.views()));
      postings.stream()
          .filter(p -> p.duty() == Posting.Duty.ASSERTED)
          .forEach(p -> mark(p, mentions));
      for (int id = postings.size() - 1; id >= 0; id--) {
        Posting posting = postings.get(id);
        if (posting.duty() == Posting.Duty.DEFINITION && used.get(posting.defined())) {
          mark(posting, mentions);
        }
      }
      return new Needed(used, postings.stream().filter(p -> isLowered(p, used)).toList());
    }

    private static void mark(Posting posting, Mentions mentions) {
      posting.definitions().forEach(d -> mentions.of(d.constraint()));
      posting.asserted().forEach(mentions::of);
    }
  }
}
