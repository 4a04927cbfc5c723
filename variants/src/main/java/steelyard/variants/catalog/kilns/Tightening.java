package steelyard.variants.catalog.kilns;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalInt;
import java.util.SplittableRandom;
import java.util.stream.IntStream;

/** Gives a campaign no more days and firings than a plan of it needs, and a little slack. */
final class Tightening {
  private static final int SAILING = 25;

  private final Campaign open;
  private final Plan plan;
  private final int slack;
  private final SplittableRandom random;

  private Tightening(Campaign open, Plan plan, int slack, SplittableRandom random) {
    this.open = open;
    this.plan = plan;
    this.slack = slack;
    this.random = random;
  }

  /** A campaign that {@code plan} keeps, its firings numbered anew. */
  static Campaign of(Campaign open, Plan plan, int slack, SplittableRandom random) {
    Tightening it = new Tightening(open, plan, slack, random);
    return open.with(open.works().withDays(it.lastDay() + slack))
        .withKilns(it.kilns())
        .withLots(it.lots());
  }

  private int lastDay() {
    return open.firings().stream().mapToInt(f -> plan.end(f, open)).max().orElseThrow();
  }

  private List<Kiln> kilns() {
    Map<Kiln, Kiln> made = new HashMap<>();
    return open.kilns().stream()
        .map(kiln -> made.computeIfAbsent(kiln.named(""), like -> kiln(kiln)).named(kiln.name()))
        .toList();
  }

  private Kiln kiln(Kiln kiln) {
    int firings = Math.max(1, most(kiln, 1)) + slack;
    boolean isWorn = random.nextInt(2) == 0;
    return kiln.withFirings(firings, isWorn ? Math.max(1, most(kiln, kiln.hottest())) : firings);
  }

  /** The most firings of at least that heat that the plan has in a kiln like this one. */
  private int most(Kiln like, int heat) {
    return IntStream.range(0, open.kilns().size())
        .filter(kiln -> open.kilns().get(kiln).isLike(like))
        .map(
            kiln ->
                (int)
                    open.firings().stream()
                        .filter(f -> f.kiln() == kiln && plan.heat(f) >= heat)
                        .count())
        .max()
        .orElseThrow();
  }

  /** Some ships sail soon after the plan has their lots out; lots that are alike stay alike. */
  private List<Lot> lots() {
    Map<Lot, OptionalInt> made = new HashMap<>();
    return open.lots().stream()
        .map(lot -> lot.withLatest(made.computeIfAbsent(lot.named(""), like -> sailing(lot))))
        .toList();
  }

  private OptionalInt sailing(Lot like) {
    int out =
        open.lotNumbers()
            .filter(lot -> open.lot(lot).isLike(like))
            .map(lot -> plan.end(open.firings().get(plan.firingOf().get(lot)), open))
            .max()
            .orElseThrow();
    int latest = Math.max(like.due(), out) + random.nextInt(2 + slack);
    return random.nextInt(100) < SAILING
        ? OptionalInt.of(Math.min(latest, lastDay() + slack))
        : OptionalInt.empty();
  }
}
