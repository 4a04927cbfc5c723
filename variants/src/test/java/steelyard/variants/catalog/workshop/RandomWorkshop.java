package steelyard.variants.catalog.workshop;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/** Small workshops by seed: some visit a station twice, skip one, or hold twins. */
final class RandomWorkshop {
  private RandomWorkshop() {}

  /**
   * A workshop of two or three moulds at two or three stations, few enough to try every plan.
   *
   * @param seed equal seeds give equal workshops
   */
  static Workshop of(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int stations = random.nextInt(2, 4);
    int moulds = stations == 2 ? random.nextInt(2, 4) : 2;
    List<Mould> made = new ArrayList<>();
    for (int m = 0; m < moulds; m++) {
      boolean isTwin = m > 0 && random.nextInt(3) == 0;
      made.add(isTwin ? made.get(m - 1) : mould(stations, random));
    }
    return new Workshop(stations, made);
  }

  private static Mould mould(int stations, SplittableRandom random) {
    List<Operation> route = new ArrayList<>();
    for (int step = 0; step < stations; step++) {
      int minutes = random.nextInt(6) == 0 ? 0 : random.nextInt(1, 4);
      route.add(new Operation(random.nextInt(stations), minutes));
    }
    return new Mould(route);
  }
}
