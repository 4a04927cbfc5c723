package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import steelyard.variants.model.Ints;

/**
 * A number for the way from each stop to each other. Stop 0 is the works; then come the orders.
 *
 * @param rows as many as each is long; from a stop to itself 0
 */
record Legs(List<Ints> rows) {
  Legs {
    rows = List.copyOf(rows);
    for (int i = 0; i < rows.size(); i++) {
      if (rows.get(i).size() != rows.size() || rows.get(i).get(i) != 0) {
        throw new IllegalArgumentException("no square with zeros from a stop to itself: " + rows);
      }
    }
  }

  int stops() {
    return rows.size();
  }

  int get(int from, int to) {
    return rows.get(from).get(to);
  }

  Ints from(int stop) {
    return rows.get(stop);
  }

  /** The smallest number of a leg into the stop. */
  int smallestInto(int stop) {
    int smallest = Integer.MAX_VALUE;
    for (int from = 0; from < stops(); from++) {
      smallest = from == stop ? smallest : Math.min(smallest, get(from, stop));
    }
    return smallest;
  }

  /**
   * The smallest sum on any way: Floyd (1962), "Algorithm 97: Shortest path", Communications of the
   * ACM 5(6):345.
   */
  Legs shortest() {
    int[][] way = rows.stream().map(Ints::toArray).toArray(int[][]::new);
    for (int over = 0; over < way.length; over++) {
      for (int[] from : way) {
        for (int to = 0; to < way.length; to++) {
          from[to] = Math.min(from[to], from[over] + way[over][to]);
        }
      }
    }
    List<Ints> shortest = new ArrayList<>();
    for (int[] row : way) {
      shortest.add(Ints.of(row));
    }
    return new Legs(shortest);
  }
}
