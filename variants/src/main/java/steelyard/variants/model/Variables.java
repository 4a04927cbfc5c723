package steelyard.variants.model;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.stream.IntStream;

/** The variables of a model by dense id: name, domain, and who gives them their value. */
public final class Variables {
  /** Who gives a variable its value. */
  public enum Kind {
    /** The solver. */
    DECISION,
    /** A definition that the model names. */
    DEFINED,
    /** A definition that normalising made; it has no name. */
    AUXILIARY
  }

  /** One variable. The name of an {@link Kind#AUXILIARY} one is empty. */
  public record Variable(String name, Domain domain, Kind kind) {}

  private final List<Variable> list;
  private final Map<String, Integer> ids = new HashMap<>();
  private final Ints decisions;

  private Variables(List<Variable> list) {
    this.list = List.copyOf(list);
    for (int v = 0; v < this.list.size(); v++) {
      Variable variable = this.list.get(v);
      if (variable.kind != Kind.AUXILIARY && ids.put(variable.name, v) != null) {
        throw new IllegalArgumentException("two variables are named '" + variable.name + "'");
      }
    }
    this.decisions = Ints.of(IntStream.range(0, list.size()).filter(v -> isDecision(v)).toArray());
  }

  /**
   * The given variables; ids are positions.
   *
   * @throws IllegalArgumentException if two named variables share a name
   */
  public static Variables of(List<Variable> list) {
    return new Variables(list);
  }

  public int size() {
    return list.size();
  }

  public Variable get(int variable) {
    return list.get(variable);
  }

  public Domain domain(int variable) {
    return list.get(variable).domain;
  }

  public boolean isDecision(int variable) {
    return list.get(variable).kind == Kind.DECISION;
  }

  /** Its name; an auxiliary variable is called by its id. */
  public String name(int variable) {
    Variable it = list.get(variable);
    return it.kind == Kind.AUXILIARY ? "#" + variable : it.name;
  }

  public OptionalInt find(String name) {
    Integer id = ids.get(name);
    return id == null ? OptionalInt.empty() : OptionalInt.of(id);
  }

  /** The variables that are decisions, in order of id: the order of a solution's values. */
  public Ints decisions() {
    return decisions;
  }

  /** The variable of that name as whoever writes a model holds it. */
  public Optional<IntVar> handle(String name) {
    return Optional.ofNullable(ids.get(name)).map(id -> new IntVar(name, id));
  }

  /** The smallest value of {@code view}. */
  public int min(View view) {
    return switch (view.sign()) {
      case 1 -> domain(view.variable()).min() + view.offset();
      case -1 -> view.offset() - domain(view.variable()).max();
      default -> view.offset();
    };
  }

  /** The largest value of {@code view}. */
  public int max(View view) {
    return -min(view.negated());
  }

  Variables rewrite(Rewriting rewriting) {
    List<Variable> moved = new ArrayList<>(list);
    for (int v = 0; v < list.size(); v++) {
      moved.set(rewriting.variable(v), list.get(v));
    }
    return new Variables(moved);
  }
}
