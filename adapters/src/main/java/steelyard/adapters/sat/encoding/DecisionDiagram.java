package steelyard.adapters.sat.encoding;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * {@code Σ terms ≤ bound} as a decision diagram, a layer for each term: a node says that the terms
 * from its layer on sum to at most what is left for them. Amounts left that the remaining terms
 * cannot tell apart share a node. One clause for each edge gives domain consistency by unit
 * propagation; of two terms, nothing but order clauses remains.
 *
 * <p>Source: Abío &amp; Stuckey (2014), "Encoding Linear Constraints into SAT", CP, LNCS
 * 8656:75-91; equal nodes after Abío, Nieuwenhuis, Oliveras, Rodríguez-Carbonell &amp;
 * Mayer-Eichberger (2012), "A New Look at BDDs for Pseudo-Boolean Constraints", JAIR 45:443-480;
 * two terms: Tamura et al. (2009), Constraints 14(2):254-272. A node that is reached by one edge
 * from an unguarded root is that edge's literal.
 */
final class DecisionDiagram {
  static final String NAME = "decision diagram (Abío & Stuckey 2014)";
  static final String TWO_TERMS = "order clauses (Tamura et al. 2009)";

  /** The candidates looked at for the sums of a layer, by edge allowed. */
  private static final int CANDIDATES_PER_EDGE = 10;

  private final Ladder[] terms;
  private final long bound;

  /** By layer from 1: the sums that the terms from there on can take, as far as it matters. */
  private final long[][] sums;

  /** By layer: the largest sum of the terms from there on. */
  private final long[] tops;

  private DecisionDiagram(Ladder[] terms, long bound) {
    this.terms = terms;
    this.bound = bound;
    this.sums = new long[terms.length][];
    this.tops = new long[terms.length + 1];
    for (int i = terms.length - 1; i >= 0; i--) {
      tops[i] = tops[i + 1] + terms[i].top();
    }
  }

  /**
   * The diagram, if it needs no more edges than {@code most} or has no more than two terms.
   *
   * @param terms at least one
   * @param bound not negative, less than the largest sum
   */
  static Optional<DecisionDiagram> of(List<Ladder> terms, long bound, long most) {
    DecisionDiagram diagram = new DecisionDiagram(ordered(terms), bound);
    return diagram.findSums(most) ? Optional.of(diagram) : Optional.empty();
  }

  /** Coarse terms first; the one with most values has the last layer, which needs no nodes. */
  private static Ladder[] ordered(List<Ladder> terms) {
    Ladder[] ordered = terms.toArray(Ladder[]::new);
    Comparator<Ladder> byStep = Comparator.comparingDouble(t -> -(double) t.top() / (t.size() - 1));
    Arrays.sort(ordered, byStep.thenComparingInt(Ladder::size));
    return ordered;
  }

  private boolean findSums(long most) {
    int last = terms.length - 1;
    sums[last] = terms[last].values();
    long edges = terms[0].size();
    for (int i = last - 1; i > 0; i--) {
      double candidates = (double) terms[i].size() * sums[i + 1].length;
      if (candidates > CANDIDATES_PER_EDGE * (double) most) {
        return false;
      }
      sums[i] = sums(terms[i], sums[i + 1], bound - (tops[0] - tops[i]));
      edges += (long) terms[i].size() * sums[i].length;
      if (edges > most) {
        return false;
      }
    }
    return true;
  }

  /** Sums of a value of each; above {@code bound} none, below {@code least} only the largest. */
  private long[] sums(Ladder term, long[] rest, long least) {
    long[] all = new long[term.size() * rest.length];
    int size = 0;
    for (int k = 0; k < term.size() && term.value(k) <= bound; k++) {
      for (int j = 0; j < rest.length && term.value(k) + rest[j] <= bound; j++) {
        all[size++] = term.value(k) + rest[j];
      }
    }
    Arrays.sort(all, 0, size);
    int kept = 0;
    for (int i = 0; i < size; i++) {
      boolean replaces = kept > 0 && (all[i] == all[kept - 1] || all[i] <= least);
      all[replaces ? kept - 1 : kept++] = all[i];
    }
    return Arrays.copyOf(all, kept);
  }

  /** Writes the clauses that hold where {@code guard} does. */
  void encode(Cnf cnf, int guard) {
    if (terms.length == 1) {
      cnf.clause(-guard, terms[0].atMost(bound));
    }
    int[] nodes = {guard};
    long[] left = {bound};
    for (int layer = 0; layer + 1 < terms.length; layer++) {
      int[] below = new int[sums[layer + 1].length];
      for (int p = 0; p < nodes.length; p++) {
        if (nodes[p] != 0) {
          edges(cnf, layer, nodes[p], left[p], below);
        }
      }
      nodes = below;
      left = sums[layer + 1];
    }
  }

  /**
   * The edges of one node: what the term takes decides what is left. A value that leads where the
   * one before it leads needs no clause.
   *
   * @param below the nodes of the next layer, 0 where there is none yet
   */
  private void edges(Cnf cnf, int layer, int node, long left, int[] below) {
    Ladder term = terms[layer];
    int before = 0;
    for (int k = 0; k < term.size(); k++) {
      long rest = left - term.value(k);
      if (rest < 0) {
        cnf.clause(-node, -term.literal(k));
        return;
      }
      if (rest < tops[layer + 1]) {
        int child = child(cnf, layer, node, term.literal(k), rest, below);
        if (child != before && child != term.literal(k)) {
          cnf.clause(-node, -term.literal(k), child);
        }
        before = child;
      }
    }
  }

  private int child(Cnf cnf, int layer, int node, int edge, long rest, int[] below) {
    if (layer + 2 == terms.length) {
      return terms[layer + 1].atMost(rest);
    }
    int place = Ladder.floor(sums[layer + 1], rest);
    if (below[place] == 0) {
      below[place] = layer == 0 && node == Cnf.TRUE ? edge : cnf.variable();
    }
    return below[place];
  }
}
