package steelyard.results.brief;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalLong;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.simple.RandomSource;
import steelyard.results.brief.BriefContext.Plan;
import steelyard.results.brief.BriefContext.Site;
import steelyard.results.brief.BriefContext.Version;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Claim;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Observation;
import steelyard.results.ledger.Status;

/** Invented sweeps of the tileworks' mould shop: plausible, seeded, of any size. */
public final class Sample {

  public static final String SERVICE = "plain on cpsat";
  private static final double LIMIT = 60;
  private static final List<String> CLASSES = List.of("glaze", "mosaic", "ridge", "roof");
  private static final List<String> VARIANTS =
      List.of(
          "plain", "plain+no-overlap", "plain+no-overlap+heads", "plain+heads", "plain+due-order");
  private static final List<String> BACKENDS = List.of("cpsat", "sat", "engine");

  private Sample() {}

  public static BriefContext context(int planned, int finished) {
    return new BriefContext(
        new Plan(
            "mould-shop-nightly",
            SERVICE,
            planned,
            finished,
            Instant.parse("2026-03-02T19:00:12Z"),
            Optional.of(Instant.parse("2026-03-03T04:41:50Z")),
            "family: workshop\ninstances: [glaze/*, roof/*]\nin-service: plain on cpsat\n"),
        new Site(
            "2 cores at 2.6 GHz, 24 GiB, Linux 6.1",
            "1.02 s at the median, 0.99 to 1.09 s over 212 calibrations",
            List.of(new Version("cpsat", "9.15"), new Version("sat", "2.3.6"))),
        Rules.STANDARD,
        List.of(),
        List.of(),
        "steelyard rerun {run}");
  }

  /** Candidates by name, the one in service first. */
  public static List<String[]> candidates(int count) {
    List<String[]> all = new ArrayList<>();
    for (String variant : VARIANTS) {
      for (String backend : BACKENDS) {
        all.add(new String[] {variant, backend});
      }
    }
    return all.subList(0, count);
  }

  /** Every candidate on every instance and seed, in one block each. */
  public static List<Observation> runs(int instances, int candidates, int seeds) {
    UniformRandomProvider random = RandomSource.XO_SHI_RO_256_PP.create(20260302L);
    List<Observation> runs = new ArrayList<>();
    for (int i = 0; i < instances; i++) {
      double hardness = Math.exp(-3 + 7.5 * random.nextDouble());
      for (int seed = 0; seed < seeds; seed++) {
        for (int c = 0; c < candidates; c++) {
          String[] candidate = candidates(candidates).get(c);
          double speed = Math.exp((c % 3 == 0 ? -0.15 * c : 0.35 * c) + 0.7 * normal(random));
          runs.add(run(i, candidate, seed, runs.size(), hardness * speed));
        }
      }
    }
    return runs;
  }

  private static double normal(UniformRandomProvider random) {
    double sum = 0;
    for (int i = 0; i < 12; i++) {
      sum += random.nextDouble();
    }
    return sum - 6;
  }

  private static Observation run(int i, String[] candidate, int seed, int id, double seconds) {
    boolean open = seconds >= LIMIT;
    boolean found = seconds < 6 * LIMIT;
    long best = 900 + 7L * i;
    boolean sameModel = candidate[0].equals("plain+heads") && i % 4 == 0;
    return new Observation(
        String.format(Locale.ROOT, "r%05d", id),
        "workshop",
        String.format(Locale.ROOT, "%s%d", CLASSES.get(i % 4).charAt(0) + "s", i + 1),
        CLASSES.get(i % 4),
        1,
        candidate[0],
        candidate[1],
        Observation.DEFAULT_SETTING,
        seed,
        i,
        (sameModel ? "plain" : candidate[0]) + i,
        Math.min(seconds, LIMIT),
        new Limits(LIMIT, Optional.empty(), 2L << 30),
        open ? (found ? Status.FEASIBLE : Status.UNKNOWN) : Status.OPTIMAL,
        open ? Ending.TIME_LIMIT : Ending.COMPLETED,
        found ? Check.VALID : Check.UNCHECKED,
        open ? Claim.NONE : Claim.AGREED,
        true,
        found
            ? OptionalLong.of(open ? best + Math.round(seconds / 40) : best)
            : OptionalLong.empty(),
        OptionalLong.of(open ? best - 12 : best),
        (180L + id % 97) << 20,
        false);
  }
}
