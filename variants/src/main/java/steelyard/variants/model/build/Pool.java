package steelyard.variants.model.build;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Variables;

/** The variables of a model being built. */
final class Pool {
  private final List<Variables.Variable> list = new ArrayList<>();
  private final Map<String, Integer> ids = new HashMap<>();

  /**
   * A new named variable.
   *
   * @throws ModelException if the name is taken or blank
   */
  IntVar add(String name, Domain domain, Variables.Kind kind) {
    if (name.isBlank()) {
      throw new ModelException("a variable needs a name");
    }
    if (ids.putIfAbsent(name, list.size()) != null) {
      throw new ModelException("the name '" + name + "' is taken by another variable");
    }
    list.add(new Variables.Variable(name, domain, kind));
    return new IntVar(name, list.size() - 1);
  }

  /** A new variable that only normalising knows. */
  int auxiliary(Domain domain) {
    list.add(new Variables.Variable("", domain, Variables.Kind.AUXILIARY));
    return list.size() - 1;
  }

  int size() {
    return list.size();
  }

  Domain domain(int variable) {
    if (variable >= list.size()) {
      throw new ModelException("variable " + variable + " is not of this model");
    }
    return list.get(variable).domain();
  }

  String name(int variable) {
    return list.get(variable).name();
  }

  Optional<IntVar> find(String name) {
    return Optional.ofNullable(ids.get(name)).map(id -> new IntVar(name, id));
  }

  Variables variables() {
    return Variables.of(list);
  }
}
