package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import steelyard.variants.model.Ints;

/**
 * Campaigns by seed that are small enough to try every plan: two or three lots, one or two kilns,
 * up to three firings, and with luck something of everything that a campaign can have.
 */
final class RandomCampaign {
  private final SplittableRandom random;

  private RandomCampaign(long seed) {
    this.random = new SplittableRandom(seed);
  }

  /**
   * A campaign; it may have no plan.
   *
   * @param seed equal seeds give equal campaigns
   */
  static Campaign of(long seed) {
    return new RandomCampaign(seed).campaign();
  }

  private Campaign campaign() {
    int heats = random.nextInt(1, 3);
    int kilns = random.nextInt(1, 3);
    int days = kilns == 1 ? random.nextInt(5, 10) : random.nextInt(4, 7);
    List<Lot> lots = new ArrayList<>();
    int count = random.nextInt(2, 4);
    for (int i = 1; i <= count; i++) {
      Lot made = lot("L" + i, heats, days);
      lots.add(i > 1 && random.nextInt(2) == 0 ? like(lots.get(i - 2), made) : made);
    }
    return new Campaign(
        new Works(0, days, random.nextInt(1, 3), random.nextInt(2, 4), 1),
        IntStream.range(0, heats).mapToObj(h -> heat(h)).toList(),
        IntStream.range(0, heats).mapToObj(h -> costs(heats)).toList(),
        List.of(
            new Glaze("clear", Glaze.Kind.PLAIN),
            new Glaze("copper", Glaze.Kind.FUMING),
            new Glaze("white", Glaze.Kind.PALE)),
        IntStream.range(0, random.nextInt(2))
            .mapToObj(i -> new Pair(random.nextInt(2), 2))
            .toList(),
        kilns(kilns, heats, days),
        lots,
        random.nextInt(5) == 0 ? List.of(new Pair(0, 1)) : List.of(),
        random.nextInt(4) == 0
            ? List.of(new SecondFire(0, count - 1, random.nextInt(2)))
            : List.of());
  }

  /** The lot again under another's name; every other time with its days and rate. */
  private Lot like(Lot lot, Lot other) {
    boolean isTwin = random.nextInt(2) == 0;
    return new Lot(
        other.name(),
        lot.shelves(),
        lot.large(),
        lot.coolest(),
        lot.hottest(),
        lot.glaze(),
        lot.dry(),
        isTwin ? lot.due() : other.due(),
        isTwin ? lot.rate() : other.rate(),
        isTwin ? lot.latest() : other.latest());
  }

  private Heat heat(int index) {
    return new Heat(1 + (index > 0 ? random.nextInt(2) : 0), random.nextInt(2), 1 + index);
  }

  private Ints costs(int heats) {
    return Ints.of(IntStream.range(0, heats).map(h -> random.nextInt(4)).toArray());
  }

  private List<Kiln> kilns(int count, int heats, int days) {
    List<Kiln> kilns = new ArrayList<>();
    for (int k = 0; k < count; k++) {
      boolean isTwin = k > 0 && random.nextInt(2) == 0;
      String name = String.valueOf((char) ('A' + k));
      kilns.add(isTwin ? kilns.get(0).named(name) : kiln(name, count, heats, days));
    }
    return kilns;
  }

  private Kiln kiln(String name, int kilns, int heats, int days) {
    int shelves = random.nextInt(2, 5);
    int repair = random.nextInt(1, days);
    return new Kiln(
        name,
        shelves,
        random.nextInt(1, shelves + 1),
        heats,
        random.nextInt(1, heats + 1),
        random.nextInt(1, 3),
        kilns == 1 ? random.nextInt(2, 4) : random.nextInt(1, 3),
        random.nextInt(1, 4),
        Ints.of(IntStream.range(0, heats).map(h -> random.nextInt(1, 6)).toArray()),
        random.nextInt(3) == 0 ? List.of(new Kiln.Repair(repair - 1, repair)) : List.of());
  }

  private Lot lot(String name, int heats, int days) {
    int coolest = random.nextInt(1, heats + 1);
    int dry = random.nextInt(2) * random.nextInt(3);
    return new Lot(
        name,
        random.nextInt(1, 3),
        random.nextInt(4) == 0,
        coolest,
        random.nextInt(coolest, heats + 1),
        random.nextInt(3),
        dry,
        dry + random.nextInt(1, 4),
        random.nextInt(4),
        random.nextInt(5) == 0 ? OptionalInt.of(random.nextInt(3, days + 1)) : OptionalInt.empty());
  }
}
