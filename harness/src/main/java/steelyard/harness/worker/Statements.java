package steelyard.harness.worker;

import java.util.function.Consumer;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import steelyard.variants.model.Branching;
import steelyard.variants.model.Hint;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Variables;

/**
 * What a model says, statement by statement: its constraints and definitions by group, then beside
 * the groups its decision variables, objective, branching and hint.
 */
final class Statements {
  /** A variable in the text of a relation, which knows only numbers. */
  private static final Pattern NUMBERED = Pattern.compile("\\bx(\\d+)");

  private final Model model;
  private final Variables variables;

  private Statements(Model model) {
    this.model = model;
    this.variables = model.variables();
  }

  static void of(Model model, Consumer<Event.Stated> each) {
    new Statements(model).tell(each);
  }

  private void tell(Consumer<Event.Stated> each) {
    for (int v = 0; v < variables.size(); v++) {
      if (variables.get(v).kind() == Variables.Kind.DECISION) {
        String text = variables.name(v) + " in " + variables.domain(v);
        each.accept(new Event.Stated("(variables)", text));
      }
    }
    for (Posting posting : model.postings()) {
      if (posting.duty() != Posting.Duty.WITHDRAWN) {
        String text = named(posting.source().toString());
        each.accept(new Event.Stated(posting.origin().qualifiedGroup(), text));
      }
    }
    model
        .objective()
        .ifPresent(
            it -> each.accept(new Event.Stated("(objective)", it.sense() + " " + named(it.sum()))));
    for (Branching.Phase phase : model.branching().phases()) {
      String text = phase.by() + ", " + phase.pick() + ": " + named(phase.views());
      each.accept(new Event.Stated("(branching)", text));
    }
    Hint hint = model.hint();
    for (int i = 0; i < hint.size(); i++) {
      String text = variables.name(hint.variables().get(i)) + " = " + hint.values().get(i);
      each.accept(new Event.Stated("(hint)", text));
    }
  }

  private String named(Object statement) {
    return NUMBERED
        .matcher(statement.toString())
        .replaceAll(
            found -> {
              int variable = Integer.parseInt(found.group(1));
              return Matcher.quoteReplacement(
                  variable < variables.size() ? variables.name(variable) : found.group());
            });
  }
}
