package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalLong;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;

/**
 * Checks a firing plan against the campaign: follows every kiln from firing to firing, then every
 * lot, then the crew and the gas main from day to day, and adds up what it costs.
 */
final class CampaignChecker {
  private final Campaign campaign;
  private final Answer answer;
  private final List<String> problems = new ArrayList<>();
  private final List<Lit> lit = new ArrayList<>();

  /** By lot, the firing that it is in. */
  private final List<List<Lit>> firingsOf = new ArrayList<>();

  private long cost;

  private CampaignChecker(Campaign campaign, Answer answer) {
    this.campaign = campaign;
    this.answer = answer;
    campaign.lots().forEach(lot -> firingsOf.add(new ArrayList<>()));
  }

  /** A firing that takes place. */
  private record Lit(
      String name, Kiln kiln, int position, int heat, long start, long end, List<Lot> lots) {}

  static Check check(Campaign campaign, Answer answer) {
    CampaignChecker checker = new CampaignChecker(campaign, answer);
    if (!checker.hasEveryDay()) {
      return new Check(checker.problems, OptionalLong.empty());
    }
    for (int kiln = 0; kiln < campaign.kilns().size(); kiln++) {
      checker.followKiln(kiln);
    }
    checker.followLots();
    checker.checkPairs();
    checker.checkDays();
    return new Check(checker.problems, OptionalLong.of(checker.cost));
  }

  private boolean hasEveryDay() {
    for (Firing firing : campaign.firings()) {
      for (String name :
          List.of(
              Names.heat(firing), Names.change(firing), Names.start(firing), Names.end(firing))) {
        requireValue(name);
      }
    }
    campaign.lots().forEach(lot -> requireValue(Names.out(lot)));
    return problems.isEmpty();
  }

  private void requireValue(String name) {
    if (!answer.values().containsKey(name)) {
      problems.add("the plan does not say what " + name + " is");
    }
  }

  private void followKiln(int index) {
    Kiln kiln = campaign.kilns().get(index);
    int heat = kiln.set();
    long free = 0;
    int hot = 0;
    boolean isOver = false;
    List<Lot> before = List.of();
    for (Firing firing : campaign.firings()) {
      if (firing.kiln() == index) {
        Lit it = read(kiln, firing);
        if (it.heat == 0) {
          isOver = true;
          checkUnlit(it, free);
        } else if (it.heat < 0 || it.heat > kiln.hottest()) {
          require(false, it, "has no heat that the lining bears");
        } else {
          require(!isOver, it, "is lit after one that is not");
          checkLit(it, free, heat);
          checkGlazes(it.lots, before, it);
          heat = it.heat;
          hot += heat == kiln.hottest() ? 1 : 0;
          before = it.lots;
        }
        free = it.end;
      }
    }
    if (hot > kiln.hot()) {
      problems.add("kiln " + kiln.name() + " has " + hot + " hottest firings before relining");
    }
  }

  private Lit read(Kiln kiln, Firing firing) {
    List<Lot> lots = new ArrayList<>();
    Lit it =
        new Lit(
            firing.name(),
            kiln,
            firing.position(),
            answer.value(Names.heat(firing)),
            answer.value(Names.start(firing)),
            answer.value(Names.end(firing)),
            lots);
    for (int i = 0; i < campaign.lots().size(); i++) {
      if (answer.values().getOrDefault(Names.in(campaign.lots().get(i), firing), 0) != 0) {
        lots.add(campaign.lots().get(i));
        firingsOf.get(i).add(it);
      }
    }
    return it;
  }

  private void checkUnlit(Lit it, long free) {
    require(it.lots.isEmpty(), it, "is not lit but holds lots");
    require(it.start == free && it.end == free, it, "is not lit but takes its time");
    require(changeOf(it) == 0, it, "is not lit but changes the temperature");
  }

  private void checkLit(Lit it, long free, int before) {
    Kiln kiln = it.kiln;
    lit.add(it);
    require(!it.lots.isEmpty(), it, "holds nothing");
    require(it.heat - before <= campaign.works().step(), it, "is too big a step in heat");
    Heat heat = campaign.heats().get(it.heat - 1);
    require(it.end == it.start + heat.fire() + heat.cool(), it, "takes the wrong time");
    require(it.start >= free, it, "is lit before the kiln was opened");
    require(it.end <= campaign.works().days(), it, "is not over when the campaign is");
    for (Kiln.Repair repair : kiln.repairs()) {
      require(it.end <= repair.from() || repair.until() <= it.start, it, "is during repairs");
    }
    int shelves = it.lots.stream().mapToInt(Lot::shelves).sum();
    int wide = it.lots.stream().filter(Lot::large).mapToInt(Lot::shelves).sum();
    require(shelves <= kiln.shelves(), it, "has more lots than shelves");
    require(wide <= kiln.wide(), it, "has more large lots than wide shelves");
    int change = kiln.mass() * campaign.changes().get(before - 1).get(it.heat - 1);
    require(changeOf(it) == change, it, "changes the temperature for " + change);
    cost += change + kiln.fuel().get(it.heat - 1);
  }

  private int changeOf(Lit it) {
    return answer.value("change[" + it.name + "]");
  }

  private void checkGlazes(List<Lot> lots, List<Lot> before, Lit it) {
    for (Pair pair : campaign.spoilers()) {
      require(
          lots.stream().noneMatch(lot -> lot.glaze() == pair.one())
              || lots.stream().noneMatch(lot -> lot.glaze() == pair.other()),
          it,
          "holds glazes that spoil each other");
    }
    require(
        before.stream().noneMatch(lot -> kindOf(lot) == Glaze.Kind.FUMING)
            || lots.stream().noneMatch(lot -> kindOf(lot) == Glaze.Kind.PALE),
        it,
        "holds a pale glaze right after a fuming one");
  }

  private Glaze.Kind kindOf(Lot lot) {
    return campaign.glazes().get(lot.glaze()).kind();
  }

  private void followLots() {
    for (int i = 0; i < campaign.lots().size(); i++) {
      Lot lot = campaign.lots().get(i);
      long out = answer.value(Names.out(lot));
      if (firingsOf.get(i).size() != 1) {
        problems.add("lot " + lot.name() + " is in " + firingsOf.get(i).size() + " firings");
        continue;
      }
      Lit it = firingsOf.get(i).get(0);
      String where = "lot " + lot.name() + " in firing " + it.name;
      if (it.heat < lot.coolest() || it.heat > lot.hottest()) {
        problems.add(where + " does not mature");
      }
      if (it.start < lot.dry()) {
        problems.add(where + " is not dry yet");
      }
      if (it.end != out) {
        problems.add(where + " comes out on day " + it.end + ", not " + out);
      }
      if (lot.latest().isPresent() && out > lot.latest().getAsInt()) {
        problems.add(where + " misses its ship");
      }
      cost += lot.rate() * Math.max(0, out - lot.due());
    }
  }

  private void checkPairs() {
    for (Pair pair : campaign.together()) {
      if (!firingsOf.get(pair.one()).equals(firingsOf.get(pair.other()))) {
        problems.add(names(pair.one(), pair.other()) + " are not fired together");
      }
    }
    for (SecondFire pair : campaign.seconds()) {
      long ready = (long) answer.value(Names.out(campaign.lots().get(pair.first()))) + pair.days();
      if (firingsOf.get(pair.second()).stream().anyMatch(it -> it.start < ready)) {
        problems.add(names(pair.first(), pair.second()) + " are fired out of order");
      }
    }
  }

  private String names(int one, int other) {
    return "lots " + campaign.lots().get(one).name() + " and " + campaign.lots().get(other).name();
  }

  private void checkDays() {
    int[] loaded = new int[campaign.works().days()];
    long[] gas = new long[campaign.works().days()];
    for (Lit it : lit) {
      Heat heat = campaign.heats().get(it.heat - 1);
      for (long day = Math.max(0, it.start);
          day < it.start + heat.fire() && day < gas.length;
          day++) {
        gas[(int) day] += heat.gas();
        loaded[(int) day] += day == it.start ? 1 : 0;
      }
    }
    for (int day = 0; day < gas.length; day++) {
      if (loaded[day] > campaign.works().crew()) {
        problems.add("on day " + day + " the crew cannot load " + loaded[day] + " kilns");
      }
      if (gas[day] > campaign.works().gas()) {
        problems.add("on day " + day + " the gas main does not give " + gas[day]);
      }
    }
  }

  private void require(boolean isRight, Lit it, String what) {
    if (!isRight) {
      problems.add("firing " + it.name + " of day " + it.start + " " + what);
    }
  }
}
