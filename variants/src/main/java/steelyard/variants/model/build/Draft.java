package steelyard.variants.model.build;

import steelyard.variants.model.Branching;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Task;
import steelyard.variants.model.Term;
import steelyard.variants.model.Viewable;
import steelyard.variants.model.Views;

/**
 * A model being written: declare variables, define others from them, post constraints in named
 * groups, say what is wanted. Names are for people and for comparing variants: a variable's name is
 * what a variant shares with the plain model.
 *
 * <pre>{@code
 * IntVar start = draft.integer("start[3]", 0, 480);
 * IntVar end = draft.define("end[3]", start.plus(25));
 * draft.group("one lot per kiln").post(end.le(other).or(otherEnd.le(start)));
 * draft.minimize(Term.max(end, otherEnd));
 * }</pre>
 *
 * <p>Every method throws {@link ModelException} with one line that names the amendment and the
 * group where something cannot be.
 */
public interface Draft {
  /** A decision variable with the given domain. */
  IntVar integer(String name, Domain domain);

  /** A decision variable over {@code min..max}. */
  default IntVar integer(String name, int min, int max) {
    return integer(name, Domain.between(min, max));
  }

  /** A decision variable over 0..1. */
  default IntVar bool(String name) {
    return integer(name, Domain.BOOLEAN);
  }

  /**
   * A variable that has the term's value: completed by the judge, never negated, not lowered where
   * nothing uses it. The term must be total: no array entry that may lie outside, no divisor that
   * may be 0.
   */
  IntVar define(String name, Term total);

  /** A variable that is 1 where the formula holds, else 0. */
  IntVar define(String name, Formula formula);

  /**
   * A task that is always there. Its end is {@code start + duration}, defined as {@code NAME.end}
   * where the duration is a variable.
   */
  Task task(String name, Viewable start, Viewable duration);

  /** A task that is there only where {@code present} holds; its start is free where it is not. */
  Task task(String name, Viewable start, Viewable duration, Formula present);

  /** The group of that name, made at its first use. Its constraints are counted from 0. */
  Group group(String name);

  /** Makes {@code term} the objective, to be minimised. */
  void minimize(Term term);

  /** Makes {@code term} the objective, to be maximised. */
  void maximize(Term term);

  /** Adds a phase to the branching: decide {@code views} in this way before what follows. */
  void branch(Views views, Branching.VariableOrder by, Branching.ValueOrder pick);

  /** Adds to the hint: try this value first. */
  void hint(IntVar variable, int value);
}
