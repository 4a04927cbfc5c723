package steelyard.adapters.sat.encoding;

import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.SortedMap;
import java.util.SortedSet;
import java.util.TreeMap;
import java.util.TreeSet;
import steelyard.adapters.spi.Decomposition;
import steelyard.adapters.spi.Fresh;
import steelyard.adapters.spi.Reduction;
import steelyard.adapters.spi.Sizes;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Linear;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Variables;

/**
 * Writes a model as clauses: its variables within their {@link RootDomains}, then posting by
 * posting what is lowered, then its objective.
 */
public final class ModelEncoder {
  private final Model model;

  /** Empty where the model was found to have no solution. */
  private final Optional<List<Domain>> root;

  private final Cnf cnf;
  private final Integers integers;
  private final RelationEncoder relations;
  private final LinearEncoder linear;
  private final Fresh fresh;
  private final long mostEdges;
  private final long[] byPosting;
  private final SortedMap<String, SortedSet<String>> how = new TreeMap<>();
  private Optional<ObjectiveBound> objective = Optional.empty();

  private long clausesBeforePostings;

  /** How many of the model's variables and of fresh ones have been looked at. */
  private int declared;

  /** What is being written. */
  private String at = "";

  /**
   * An encoder of one model into one sink.
   *
   * @param mostEdges a sum whose diagram would have more edges is encoded as a binary number
   */
  public ModelEncoder(Model model, long mostEdges, ClauseSink sink, Limits limits) {
    this(model, RootDomains.of(model, limits.stop()), mostEdges, new Cnf(sink, limits));
  }

  private ModelEncoder(Model model, Optional<List<Domain>> root, long mostEdges, Cnf cnf) {
    this.model = model;
    this.root = root;
    this.mostEdges = mostEdges;
    this.cnf = cnf;
    this.integers = new Integers(cnf);
    this.linear = new LinearEncoder(cnf, integers, mostEdges);
    this.relations = new RelationEncoder(cnf, integers, linear);
    this.fresh = root.isPresent() ? Fresh.beside(root.get()) : Fresh.beside(model.variables());
    this.byPosting = new long[model.postings().size()];
    this.declared = model.variables().size();
  }

  /** An encoder of the same formula into another sink. */
  public ModelEncoder into(ClauseSink sink, Limits limits) {
    return new ModelEncoder(model, root, mostEdges, new Cnf(sink, limits));
  }

  /**
   * Writes everything; to be called once.
   *
   * @throws EncodingStopped if a limit is passed
   */
  public void encode() {
    Variables variables = model.variables();
    for (int v = 0; v < variables.size(); v++) {
      if (model.isNeeded(v)) {
        at = "variable " + variables.name(v) + " of " + fresh.domain(v).size() + " values";
        integers.add(v, fresh.domain(v));
      }
    }
    if (root.isEmpty()) {
      cnf.end();
    }
    clausesBeforePostings = cnf.clauses();
    model.lowered().forEach(this::encode);
    at = "the objective";
    objective = model.objective().map(o -> new ObjectiveBound(cnf, integers, o, mostEdges));
  }

  public Cnf cnf() {
    return cnf;
  }

  public Integers integers() {
    return integers;
  }

  public Optional<ObjectiveBound> objective() {
    return objective;
  }

  /** What was being written last: a variable or a posting. */
  public String at() {
    return at;
  }

  /** How many clauses say what the variables' literals mean, before the first posting's. */
  long clausesBeforePostings() {
    return clausesBeforePostings;
  }

  public Sizes sizes() {
    SortedMap<String, Long> totals = new TreeMap<>();
    totals.put("variables", (long) cnf.variables());
    totals.put("clauses", cnf.clauses());
    totals.put("literals", cnf.literals());
    SortedMap<String, String> names = new TreeMap<>();
    how.forEach((kind, used) -> names.put(kind, String.join("; ", used)));
    return new Sizes(totals, "clauses", Longs.of(byPosting), names);
  }

  private void encode(Posting posting) {
    long before = cnf.clauses();
    at = posting.origin().toString();
    try {
      posting.definitions().forEach(definition -> encode(definition.constraint()));
      posting.asserted().forEach(this::encode);
    } finally {
      byPosting[posting.id()] += cnf.clauses() - before;
    }
  }

  private void encode(Constraint constraint) {
    if (constraint instanceof Conditional conditional) {
      encode(conditional);
    } else {
      Relation relation = (Relation) constraint;
      Optional<Set<String>> names = relation.accept(relations);
      names.ifPresent(all -> all.forEach(name -> used(relation, name)));
      if (names.isEmpty()) {
        Reduction reduction = Decomposition.posted(relation, fresh);
        used(relation, reduction.how());
        encode(reduction);
      }
    }
  }

  private void encode(Conditional conditional) {
    int when = integers.literal(conditional.when());
    Relation then = conditional.then();
    if (then instanceof Linear relation) {
      under(when, conditional.mode(), relation);
    } else if (then instanceof Clause clause) {
      under(when, conditional.mode(), clause);
      used(clause, RelationEncoder.ITSELF);
    } else {
      Reduction reduction = Decomposition.of(conditional, fresh);
      used(then, "conditional: " + reduction.how());
      encode(reduction);
    }
  }

  private void under(int when, Conditional.Mode mode, Linear relation) {
    if (mode != Conditional.Mode.ONLY_IF && when != Cnf.FALSE) {
      linear.encode(relation, when);
    }
    if (mode != Conditional.Mode.IF && when != Cnf.TRUE) {
      linear.encodeNegated(relation, -when);
    }
    linear.used().forEach(name -> used(relation, name));
  }

  private void under(int when, Conditional.Mode mode, Clause clause) {
    if (mode != Conditional.Mode.ONLY_IF) {
      cnf.or(-when);
      relations.anyOf(clause).end();
    }
    if (mode != Conditional.Mode.IF) {
      for (int i = 0; i < clause.atoms().size(); i++) {
        cnf.clause(when, -integers.literal(clause.atoms().get(i)));
      }
    }
  }

  private void encode(Reduction reduction) {
    for (; declared < fresh.size(); declared++) {
      integers.add(declared, fresh.domain(declared));
    }
    reduction.definitions().forEach(definition -> encode(definition.constraint()));
    reduction.asserted().forEach(this::encode);
  }

  private void used(Relation relation, String name) {
    how.computeIfAbsent(relation.kind(), kind -> new TreeSet<>()).add(name);
  }
}
