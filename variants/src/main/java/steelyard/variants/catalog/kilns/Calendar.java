package steelyard.variants.catalog.kilns;

import java.util.stream.IntStream;

/** What of the crew and the gas main is taken on each day. */
final class Calendar {
  private final Campaign campaign;
  private final int[] loaded;
  private final long[] gas;

  Calendar(Campaign campaign) {
    this.campaign = campaign;
    this.loaded = new int[campaign.works().days()];
    this.gas = new long[campaign.works().days()];
  }

  /** Takes the crew and the gas of a firing. */
  void book(int start, int heat) {
    loaded[start]++;
    for (int day = start; day < start + campaign.heat(heat).fire(); day++) {
      gas[day] += campaign.heat(heat).gas();
    }
  }

  /**
   * The first day from {@code day} on on which {@code kiln} can be lit at {@code heat}; a day after
   * the campaign if there is none.
   */
  int earliest(Kiln kiln, int heat, int day) {
    int start = day;
    while (start < loaded.length && !isPossible(kiln, campaign.heat(heat), start)) {
      start++;
    }
    return start;
  }

  private boolean isPossible(Kiln kiln, Heat heat, int start) {
    int end = start + heat.days();
    return end <= loaded.length
        && loaded[start] < campaign.works().crew()
        && kiln.repairs().stream().allMatch(r -> end <= r.from() || r.until() <= start)
        && IntStream.range(start, start + heat.fire())
            .allMatch(at -> gas[at] + heat.gas() <= campaign.works().gas());
  }
}
