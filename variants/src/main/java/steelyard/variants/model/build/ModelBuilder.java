package steelyard.variants.model.build;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import java.util.function.Supplier;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Branching;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Hint;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Origin;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Role;
import steelyard.variants.model.Task;
import steelyard.variants.model.Term;
import steelyard.variants.model.Variables.Kind;
import steelyard.variants.model.View;
import steelyard.variants.model.Viewable;
import steelyard.variants.model.Views;

/**
 * Builds one model: first {@link #plain()} is written, then each amendment through {@link #amend},
 * then {@link #build()}.
 */
public final class ModelBuilder {
  /** The group of definitions that no group was named for. */
  public static final String DEFINITIONS = "definitions";

  private final Pool pool = new Pool();
  private final Admission admission = new Admission(pool);
  private final List<Posting> postings = new ArrayList<>();
  private final Map<String, Integer> groupSizes = new HashMap<>();
  private final List<Branching.Phase> phases = new ArrayList<>();
  private final Map<IntVar, Integer> hints = new LinkedHashMap<>();
  private Optional<Objective> objective = Optional.empty();

  /** The plain model's draft. */
  public Draft plain() {
    return new Writing(Origin.PLAIN, Optional.empty(), Set.of());
  }

  /**
   * The draft of an amendment.
   *
   * @param requires amendments whose groups it may withdraw beside plain's
   */
  public Change amend(String amendment, Role role, Set<String> requires) {
    return new Writing(amendment, Optional.of(role), requires);
  }

  public Model build() {
    Hint hint =
        new Hint(
            Ints.of(hints.keySet().stream().mapToInt(IntVar::id).toArray()),
            Ints.of(hints.values().stream().mapToInt(Integer::intValue).toArray()));
    return Model.of(pool.variables(), postings, objective, new Branching(phases), hint);
  }

  /** A model of the plain draft alone, for tests and small programs. */
  public static Model of(Consumer<Draft> plain) {
    ModelBuilder builder = new ModelBuilder();
    plain.accept(builder.plain());
    return builder.build();
  }

  private final class Writing implements Change {
    private final String author;
    private final Optional<Role> role;
    private final Set<String> requires;
    private boolean hasBranched;

    Writing(String author, Optional<Role> role, Set<String> requires) {
      this.author = author;
      this.role = role;
      this.requires = Set.copyOf(requires);
    }

    @Override
    public IntVar integer(String name, Domain domain) {
      require(role.map(Role::mayReplace), "add the decision variable '" + name + "'");
      return at(name, () -> pool.add(name, domain, Kind.DECISION));
    }

    @Override
    public IntVar define(String name, Term total) {
      require(role.map(Role::mayPost), "define '" + name + "'");
      return at(
          name,
          () -> {
            admission.check(total);
            Domain domain = TermFlattener.domain(total, pool);
            IntVar own = pool.add(name, domain, Kind.DEFINED);
            Flat flat = Normaliser.definition(own.view(), total, pool);
            add(DEFINITIONS, Posting.Duty.DEFINITION, own.eq(total), flat);
            return own;
          });
    }

    @Override
    public IntVar define(String name, Formula formula) {
      require(role.map(Role::mayPost), "define '" + name + "'");
      return at(
          name,
          () -> {
            admission.check(formula);
            IntVar own = pool.add(name, Domain.BOOLEAN, Kind.DEFINED);
            Flat flat = Normaliser.definition(own.view(), formula, pool);
            Formula source = Formula.literal(own.view().atLeast(1)).iff(formula);
            add(DEFINITIONS, Posting.Duty.DEFINITION, source, flat);
            return own;
          });
    }

    @Override
    public Task task(String name, Viewable start, Viewable duration) {
      return task(name, start, duration, Formula.literal(Atom.TRUE));
    }

    @Override
    public Task task(String name, Viewable start, Viewable duration, Formula present) {
      View from = start.view();
      View length = duration.view();
      View end =
          length.isConstant()
              ? from.shifted(length.offset())
              : define(name + ".end", from.plus(length)).view();
      Atom presence =
          present instanceof Formula.Literal literal
              ? literal.atom()
              : define(name + ".present", present).view().atLeast(1);
      return new Task(from, length, end, presence);
    }

    @Override
    public Group group(String name) {
      return formula -> {
        require(role.map(Role::mayPost), "post into '" + name + "'");
        at(
            name,
            () -> {
              admission.check(formula);
              add(name, Posting.Duty.ASSERTED, formula, Normaliser.asserted(formula, pool));
              return formula;
            });
      };
    }

    @Override
    public void minimize(Term term) {
      objective(Objective.Sense.MINIMIZE, term);
    }

    @Override
    public void maximize(Term term) {
      objective(Objective.Sense.MAXIMIZE, term);
    }

    private void objective(Objective.Sense sense, Term term) {
      require(role.map(Role::mayReplace), "set the objective");
      Term linear = Splitting.isLinear(term) ? term : define("objective", term);
      at(
          "objective",
          () -> {
            admission.check(linear);
            SumBuilder sum = new SumBuilder();
            sum.add(1, linear);
            objective = Optional.of(new Objective(sense, sum.build()));
            return sense;
          });
    }

    @Override
    public void branch(Views views, Branching.VariableOrder by, Branching.ValueOrder pick) {
      require(role.map(Role::mayBranch), "change the branching");
      if (!hasBranched && role.isPresent()) {
        phases.clear();
      }
      hasBranched = true;
      phases.add(new Branching.Phase(views, by, pick));
    }

    @Override
    public void hint(IntVar variable, int value) {
      require(role.map(Role::mayBranch), "hint");
      hints.put(variable, value);
    }

    @Override
    public IntVar variable(String name) {
      return pool.find(name)
          .orElseThrow(
              () -> new ModelException(author + ": the model has no variable '" + name + "'"));
    }

    @Override
    public void withdraw(String group) {
      require(role.map(Role::mayReplace), "withdraw '" + group + "'");
      boolean found = false;
      for (int id = 0; id < postings.size(); id++) {
        Posting posting = postings.get(id);
        if (mayWithdraw(posting, group)) {
          postings.set(id, posting.withdrawn());
          found = true;
        }
      }
      if (!found) {
        throw new ModelException(
            author + ": no group '" + group + "' of plain or of a required amendment to withdraw");
      }
    }

    private boolean mayWithdraw(Posting posting, String group) {
      Origin origin = posting.origin();
      return posting.duty() == Posting.Duty.ASSERTED
          && origin.qualifiedGroup().equals(group)
          && (origin.amendment().equals(Origin.PLAIN) || requires.contains(origin.amendment()));
    }

    private void add(String group, Posting.Duty duty, Formula source, Flat flat) {
      String counted = author + "/" + group;
      int index = groupSizes.merge(counted, 1, Integer::sum) - 1;
      Origin origin = new Origin(author, group, index);
      postings.add(
          new Posting(postings.size(), origin, duty, source, flat.definitions(), flat.asserted()));
    }

    /** Puts the author and {@code place} in front of what goes wrong. */
    private <T> T at(String place, Supplier<T> step) {
      try {
        return step.get();
      } catch (ModelException | IllegalArgumentException | ArithmeticException e) {
        throw new ModelException(author + "/" + place + ": " + e.getMessage(), e);
      }
    }

    private void require(Optional<Boolean> right, String deed) {
      if (!right.orElse(true)) {
        throw new ModelException(
            author + ": an amendment of role " + role.orElseThrow().label() + " may not " + deed);
      }
    }
  }
}
