package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;

/** What the heats of two firings in a row cost a kiln. */
final class ChangeCosts {
  private ChangeCosts() {}

  /** From a heat to a heat, 0 for unlit. */
  record Row(int from, int to, int cost) {}

  /**
   * Every pair of heats that can follow each other. Nothing is lit after an unlit firing, and what
   * is not lit costs nothing.
   */
  static List<Row> of(Campaign campaign, Kiln kiln) {
    List<Row> rows = new ArrayList<>();
    rows.add(new Row(0, 0, 0));
    for (int from = 1; from <= kiln.hottest(); from++) {
      rows.add(new Row(from, 0, 0));
      for (int to = 1; to <= kiln.hottest(); to++) {
        rows.add(new Row(from, to, campaign.change(kiln, from, to)));
      }
    }
    return rows;
  }
}
