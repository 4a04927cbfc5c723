package steelyard.adapters.sat.encoding;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.PriorityQueue;

/**
 * The possible values of a sum, each with a literal that is true where the sum reaches it: terms
 * are merged two by two, the smallest first. Only that half of the meaning which bounds the sum
 * from above.
 *
 * <p>Source: Joshi, Martins &amp; Manquinho (2015), "Generalized Totalizer Encoding for
 * Pseudo-Boolean Constraints", CP, LNCS 9255:200-209, over order literals.
 */
final class GeneralizedTotalizer {
  /** A term, or the sum of two nodes. */
  private static final class Node {
    private final int place;
    private final long[] values;
    private final Optional<Ladder> term;
    private final List<Node> parts;

    private Node(int place, long[] values, Optional<Ladder> term, List<Node> parts) {
      this.place = place;
      this.values = values;
      this.term = term;
      this.parts = parts;
    }

    static Node leaf(int place, Ladder term) {
      return new Node(place, term.values(), Optional.of(term), List.of());
    }

    static Node sum(int place, Node a, Node b) {
      long[] all = new long[a.values.length * b.values.length];
      int size = 0;
      for (long x : a.values) {
        for (long y : b.values) {
          all[size++] = x + y;
        }
      }
      long[] values = Arrays.stream(all).sorted().distinct().toArray();
      return new Node(place, values, Optional.empty(), List.of(a, b));
    }
  }

  private final Node root;

  private GeneralizedTotalizer(Node root) {
    this.root = root;
  }

  /** The totalizer of at least one term, if it needs no more clauses than {@code most}. */
  static Optional<GeneralizedTotalizer> of(List<Ladder> terms, long most) {
    PriorityQueue<Node> open =
        new PriorityQueue<>(
            Comparator.<Node>comparingInt(n -> n.values.length).thenComparingInt(n -> n.place));
    int made = 0;
    for (Ladder term : terms) {
      open.add(Node.leaf(made++, term));
    }
    long clauses = 0;
    while (open.size() > 1) {
      Node a = open.remove();
      Node b = open.remove();
      clauses += (long) a.values.length * b.values.length;
      if (clauses > most) {
        return Optional.empty();
      }
      open.add(Node.sum(made++, a, b));
    }
    return Optional.ofNullable(open.poll()).map(GeneralizedTotalizer::new);
  }

  Ladder encode(Cnf cnf) {
    return encode(root, cnf);
  }

  private static Ladder encode(Node node, Cnf cnf) {
    if (node.term.isPresent()) {
      return node.term.get();
    }
    Ladder a = encode(node.parts.get(0), cnf);
    Ladder b = encode(node.parts.get(1), cnf);
    int[] literals = new int[node.values.length];
    literals[0] = Cnf.TRUE;
    for (int k = 1; k < literals.length; k++) {
      literals[k] = cnf.variable();
      cnf.clause(-literals[k], literals[k - 1]);
    }
    for (int i = 0; i < a.size(); i++) {
      for (int j = 0; j < b.size(); j++) {
        int reached = literals[Arrays.binarySearch(node.values, a.value(i) + b.value(j))];
        cnf.clause(-a.literal(i), -b.literal(j), reached);
      }
    }
    return Ladder.of(node.values, literals);
  }
}
