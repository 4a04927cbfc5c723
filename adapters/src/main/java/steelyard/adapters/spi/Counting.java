package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.variants.model.Atom;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Count;
import steelyard.variants.model.DistinctValues;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Longs;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/** Decompositions that count literals, or weigh them, and compare the sum. */
final class Counting {
  private final Definer definer;
  private final Conditions conditions;

  Counting(Definer definer, Conditions conditions) {
    this.definer = definer;
    this.conditions = conditions;
  }

  String count(Count relation) {
    requireCount(relation.scope(), relation.values(), relation.op(), relation.bound());
    return "sum of value literals (Beldiceanu & Contejean 1994)";
  }

  /** For each value, the views that have it are counted. */
  String globalCardinality(GlobalCardinality relation) {
    Ints values = relation.values();
    if (relation.others() == GlobalCardinality.Others.FORBIDDEN) {
      relation.scope().stream()
          .forEach(view -> conditions.require(values.stream().mapToObj(view::is).toList()));
    }
    for (int k = 0; k < values.size(); k++) {
      Ints value = Ints.of(values.get(k));
      requireCount(relation.scope(), value, Comparison.EQ, relation.counts().get(k));
    }
    return "sum of value literals per value (Regin 1996)";
  }

  private void requireCount(Views scope, Ints values, Comparison op, View bound) {
    Sum sum = new Sum().add(-1, bound);
    scope.stream().forEach(view -> sum.add(1, definer.counted(definer.oneOf(view, values))));
    conditions.require(sum.toLinearSum(), op, 0);
  }

  /**
   * Literals say which values are taken, and their sum is compared; where there are too many
   * values, they say which views differ from all before them. Bessi&egrave;re, Katsirelos,
   * Narodytska, Quimper &amp; Walsh (2010), "Decomposition of the NValue Constraint", CP, LNCS
   * 6308:114-128.
   */
  String distinctValues(DistinctValues relation) {
    Views scope = relation.scope();
    long values = scope.stream().mapToLong(view -> definer.domain(view).size()).sum();
    long pairs = (long) scope.size() * scope.size();
    Sum sum = new Sum().add(-1, relation.bound());
    (values <= 4 * pairs ? takenValues(scope) : newValues(scope))
        .forEach(literal -> sum.add(1, definer.counted(literal)));
    conditions.require(sum.toLinearSum(), relation.op(), 0);
    return "sum of taken-value literals (Bessiere et al. 2010)";
  }

  private List<Atom> takenValues(Views scope) {
    SortedMap<Integer, List<Atom>> takers = new TreeMap<>();
    scope.stream()
        .forEach(
            view ->
                definer.domain(view).stream()
                    .forEach(
                        v -> takers.computeIfAbsent(v, x -> new ArrayList<>()).add(view.is(v))));
    return takers.values().stream().map(definer::any).toList();
  }

  private List<Atom> newValues(Views scope) {
    List<Atom> literals = new ArrayList<>();
    for (int i = 0; i < scope.size(); i++) {
      List<Atom> others = new ArrayList<>();
      for (int j = 0; j < i; j++) {
        others.add(definer.compare(scope.get(j), Comparison.NE, scope.get(i)));
      }
      literals.add(definer.all(others));
    }
    return literals;
  }

  /**
   * Every bin exists, and the sizes in each sum to its load: Shaw (2004), "A Constraint for Bin
   * Packing", CP, LNCS 3258:648-662, section 2.
   */
  String binPacking(BinPacking relation) {
    Views bins = relation.bins();
    bins.stream().forEach(bin -> conditions.requireWithin(bin, relation.loads().size()));
    for (int b = 0; b < relation.loads().size(); b++) {
      Sum sum = new Sum().add(-1, relation.loads().get(b));
      for (int i = 0; i < bins.size(); i++) {
        if (relation.sizes().get(i) != 0) {
          sum.add(relation.sizes().get(i), definer.counted(bins.get(i).is(b)));
        }
      }
      conditions.require(sum.toLinearSum(), Comparison.EQ, 0);
    }
    return "weighted sum per bin (Shaw 2004)";
  }

  String knapsack(Knapsack relation) {
    requireTotal(relation.weights(), relation.amounts(), Comparison.LE, relation.capacity());
    requireTotal(relation.profits(), relation.amounts(), Comparison.GE, relation.profit());
    return "two linear inequalities (Fahle & Sellmann 2002)";
  }

  private void requireTotal(Longs factors, Views amounts, Comparison op, View bound) {
    Sum sum = new Sum().add(-1, bound);
    for (int i = 0; i < amounts.size(); i++) {
      sum.add(factors.get(i), amounts.get(i));
    }
    conditions.require(sum.toLinearSum(), op, 0);
  }
}
