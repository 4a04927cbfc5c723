package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.SplittableRandom;
import steelyard.variants.model.Ints;

/**
 * Makes up campaigns. Each has a plan: what is made up is planned greedily, and gets days, firings
 * and sailing days that this plan keeps. What cannot be planned so is made up again.
 */
final class CampaignGenerator {
  private static final int ATTEMPTS = 1000;
  private static final int AMPLE = 40;
  private static final List<String> GLAZES =
      List.of(
          "clear", "copper", "white", "cobalt", "celadon", "ochre", "ivory", "iron", "slate",
          "rutile", "amber", "moss");

  private final Recipe recipe;
  private final SplittableRandom random;

  private CampaignGenerator(Recipe recipe, long seed) {
    this.recipe = recipe;
    this.random = new SplittableRandom(seed);
  }

  /**
   * A campaign by the recipe.
   *
   * @param seed equal seeds give equal campaigns
   */
  static Campaign of(Recipe recipe, long seed) {
    CampaignGenerator generator = new CampaignGenerator(recipe, seed);
    for (int i = 0; i < ATTEMPTS; i++) {
      Campaign open = generator.open();
      Optional<Plan> plan = GreedyPlan.of(open);
      if (plan.isPresent()) {
        return Tightening.of(open, plan.get(), recipe.slack(), generator.random);
      }
    }
    throw new IllegalStateException("no plan for any of " + ATTEMPTS + " campaigns by " + recipe);
  }

  /** A campaign with more days and firings than anyone needs. */
  private Campaign open() {
    List<Heat> heats = heats();
    List<Glaze> glazes = glazes();
    List<Kiln> kilns = kilns();
    int length = expectedDays(heats, kilns);
    List<Lot> lots = lots(heats, glazes.size(), length);
    Works works =
        new Works(
            100 + random.nextInt(200),
            10 * length + AMPLE,
            recipe.kilns() > 2 ? (recipe.kilns() + 1) / 2 : 1,
            gas(kilns, heats),
            recipe.heats() > 3 ? 2 : Math.max(1, recipe.heats() - 1));
    Campaign campaign =
        new Campaign(
            works, heats, changes(), glazes, spoilers(), kilns, lots, List.of(), List.of());
    return linked(campaign);
  }

  private List<Heat> heats() {
    List<Heat> heats = new ArrayList<>();
    for (int heat = 1; heat <= recipe.heats(); heat++) {
      heats.add(new Heat(heat > 3 ? 2 : 1, (heat + 1) / 2, heat + 1));
    }
    return heats;
  }

  /** Heating up costs more than cooling down, and more steps cost more. */
  private List<Ints> changes() {
    List<Ints> rows = new ArrayList<>();
    for (int from = 1; from <= recipe.heats(); from++) {
      int[] row = new int[recipe.heats()];
      for (int to = 1; to <= recipe.heats(); to++) {
        int steps = Math.abs(to - from);
        row[to - 1] = steps == 0 ? 0 : 1 + steps * (to > from ? 3 : 2) + random.nextInt(3);
      }
      rows.add(Ints.of(row));
    }
    return rows;
  }

  private List<Glaze> glazes() {
    List<Glaze> glazes = new ArrayList<>();
    for (int i = 0; i < recipe.glazes(); i++) {
      Glaze.Kind kind =
          i % 5 == 1 ? Glaze.Kind.FUMING : i % 5 == 2 ? Glaze.Kind.PALE : Glaze.Kind.PLAIN;
      glazes.add(new Glaze(GLAZES.get(i), kind));
    }
    return glazes;
  }

  private List<Pair> spoilers() {
    List<Pair> pairs = new ArrayList<>();
    for (int one = 0; one < recipe.glazes(); one++) {
      for (int other = one + 1; other < recipe.glazes(); other++) {
        if (happens(recipe.spoiling())) {
          pairs.add(new Pair(one, other));
        }
      }
    }
    return pairs;
  }

  private List<Kiln> kilns() {
    List<Kiln> kilns = new ArrayList<>();
    for (int k = 0; k < recipe.kilns(); k++) {
      String name = String.valueOf((char) ('A' + k));
      kilns.add(k > 0 && k < recipe.alike() ? kilns.get(0).named(name) : kiln(name, k == 0));
    }
    return kilns;
  }

  private Kiln kiln(String name, boolean isHottest) {
    int shelves = recipe.shelves() + (isHottest ? 0 : 2 * random.nextInt(3));
    int hottest = recipe.heats() - (isHottest || recipe.heats() < 3 ? 0 : random.nextInt(2));
    int[] fuel = new int[hottest];
    for (int heat = 1; heat <= hottest; heat++) {
      fuel[heat - 1] = shelves + 3 * heat + random.nextInt(4);
    }
    return new Kiln(
        name,
        shelves,
        Math.max(1, shelves * recipe.wide() / 100),
        hottest,
        1 + random.nextInt(hottest),
        1 + random.nextInt(2),
        AMPLE,
        AMPLE,
        Ints.of(fuel),
        isHottest || !happens(40) ? List.of() : List.of(repair()));
  }

  private Kiln.Repair repair() {
    int from = 2 + random.nextInt(4);
    return new Kiln.Repair(from, from + 1 + random.nextInt(2));
  }

  /** How long the campaign should take with kilns four fifths full. */
  private int expectedDays(List<Heat> heats, List<Kiln> kilns) {
    int supply = kilns.stream().mapToInt(Kiln::shelves).sum() * 4;
    int demand = recipe.lots() * (recipe.largest() + 1) / 2 * 5;
    int days = heats.stream().mapToInt(Heat::days).sum();
    return Math.max(4, demand * days / (supply * heats.size()));
  }

  /** Enough for all but one of the kilns at their hottest, and for any firing alone. */
  private int gas(List<Kiln> kilns, List<Heat> heats) {
    int all = kilns.stream().mapToInt(kiln -> heats.get(kiln.hottest() - 1).gas()).sum();
    int most = heats.get(heats.size() - 1).gas();
    return Math.max(most, all - most);
  }

  private List<Lot> lots(List<Heat> heats, int glazes, int length) {
    List<Lot> lots = new ArrayList<>();
    for (int i = 1; i <= recipe.lots(); i++) {
      String name = (i < 10 ? "L0" : "L") + i;
      boolean isTwin = i > 1 && happens(recipe.twins());
      lots.add(
          isTwin ? lots.get(i - 2).named(name) : lot(name, heats, random.nextInt(glazes), length));
    }
    return lots;
  }

  private Lot lot(String name, List<Heat> heats, int glaze, int length) {
    int coolest = 1 + random.nextInt(heats.size());
    int hottest = Math.min(heats.size(), coolest + (happens(30) ? 1 : 0));
    boolean isLarge = happens(recipe.large());
    int room = isLarge ? recipe.shelves() * recipe.wide() / 100 : recipe.shelves();
    int shelves = 1 + random.nextInt(Math.max(1, Math.min(recipe.largest(), room)));
    int dry = happens(50) ? 0 : random.nextInt(Math.max(1, length / 3));
    int due =
        dry + heats.get(coolest - 1).days() + random.nextInt(1 + length * recipe.haste() / 100);
    return new Lot(
        name,
        shelves,
        isLarge,
        coolest,
        hottest,
        glaze,
        dry,
        due,
        1 + random.nextInt(4),
        OptionalInt.empty());
  }

  /** Ties lots that can be fired together, and lots that can be fired one after the other. */
  private Campaign linked(Campaign campaign) {
    List<Pair> together = new ArrayList<>();
    List<SecondFire> seconds = new ArrayList<>();
    for (int lot = 1; lot < campaign.lots().size(); lot++) {
      int other = random.nextInt(lot);
      Lot one = campaign.lot(other);
      Lot two = campaign.lot(lot);
      if (happens(recipe.linked())) {
        boolean isSameHeat = one.coolest() <= two.hottest() && two.coolest() <= one.hottest();
        boolean isLight = one.shelves() + two.shelves() <= recipe.shelves() * recipe.wide() / 100;
        if (random.nextInt(2) == 0 && two.coolest() <= one.coolest()) {
          seconds.add(new SecondFire(other, lot, 1 + random.nextInt(2)));
        } else if (isSameHeat && isLight && !campaign.areSpoilers(one, two)) {
          together.add(new Pair(other, lot));
        }
      }
    }
    return campaign.withTies(together, seconds);
  }

  private boolean happens(int percent) {
    return random.nextInt(100) < percent;
  }
}
