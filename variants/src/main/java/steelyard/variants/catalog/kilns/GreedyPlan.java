package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import steelyard.variants.model.Ints;

/**
 * A plan made without looking ahead: matching lots are taken as one; the one that is due first of
 * those whose first fires are planned goes where it adds least to the cost, be it into a firing
 * that is planned already or into a new one at the end of a kiln's (a list schedule by earliest due
 * date; common practice).
 */
final class GreedyPlan {
  private final Campaign campaign;
  private final Calendar calendar;

  /** By kiln, in order. */
  private final List<List<Batch>> batches = new ArrayList<>();

  /** By lot, where it is. */
  private final Map<Integer, Batch> batchOf = new TreeMap<>();

  private GreedyPlan(Campaign campaign) {
    this.campaign = campaign;
    this.calendar = new Calendar(campaign);
    campaign.kilns().forEach(kiln -> batches.add(new ArrayList<>()));
  }

  /** A firing that is planned. */
  private record Batch(int kiln, int position, int heat, int start, int end) {}

  /** Somewhere for lots to go, and what that adds to the cost. */
  private record Way(Batch batch, boolean isNew, long cost) {}

  /** The plan; empty where this way of planning ends in a dead end. */
  static Optional<Plan> of(Campaign campaign) {
    GreedyPlan plan = new GreedyPlan(campaign);
    List<List<Integer>> open = new ArrayList<>(matching(campaign));
    open.sort(
        Comparator.comparingInt(
            lots -> lots.stream().mapToInt(lot -> campaign.lot(lot).due()).min().orElseThrow()));
    while (!open.isEmpty()) {
      if (!plan.placeFirstOf(open)) {
        return Optional.empty();
      }
    }
    return Optional.of(plan.made());
  }

  /** The lots, matching ones together. */
  private static List<List<Integer>> matching(Campaign campaign) {
    int[] label = campaign.lotNumbers().toArray();
    for (int round = 0; round < label.length; round++) {
      for (Pair pair : campaign.together()) {
        int lower = Math.min(label[pair.one()], label[pair.other()]);
        label[pair.one()] = lower;
        label[pair.other()] = lower;
      }
    }
    return campaign
        .lotNumbers()
        .mapToObj(i -> campaign.lotNumbers().filter(lot -> label[lot] == i).boxed().toList())
        .filter(lots -> !lots.isEmpty())
        .toList();
  }

  private boolean placeFirstOf(List<List<Integer>> open) {
    for (List<Integer> lots : open) {
      Optional<Way> best =
          isReady(lots, open)
              ? ways(lots)
                  .min(
                      Comparator.comparingLong(Way::cost)
                          .thenComparingInt(way -> way.batch.end)
                          .thenComparingInt(way -> way.batch.kiln))
              : Optional.empty();
      if (best.isPresent()) {
        place(lots, best.get());
        open.remove(lots);
        return true;
      }
    }
    return false;
  }

  /** Whether no first fire of these lots is still open. */
  private boolean isReady(List<Integer> lots, List<List<Integer>> open) {
    return campaign.seconds().stream()
        .filter(pair -> lots.contains(pair.second()))
        .noneMatch(pair -> open.stream().anyMatch(other -> other.contains(pair.first())));
  }

  private void place(List<Integer> lots, Way way) {
    Batch batch = way.batch;
    if (way.isNew) {
      batches.get(batch.kiln).add(batch);
      calendar.book(batch.start, batch.heat);
    }
    lots.forEach(lot -> batchOf.put(lot, batch));
  }

  private Stream<Way> ways(List<Integer> lots) {
    return IntStream.range(0, batches.size())
        .boxed()
        .flatMap(kiln -> Stream.concat(planned(kiln, lots), additional(kiln, lots)));
  }

  private Stream<Way> planned(int kiln, List<Integer> lots) {
    return batches.get(kiln).stream()
        .filter(batch -> fits(lots, batch))
        .map(batch -> new Way(batch, false, lateness(lots, batch.end)));
  }

  private Stream<Way> additional(int index, List<Integer> lots) {
    Kiln kiln = campaign.kilns().get(index);
    List<Batch> before = batches.get(index);
    int position = before.size();
    int from = position == 0 ? kiln.set() : before.get(position - 1).heat;
    int free = position == 0 ? 0 : before.get(position - 1).end;
    if (position >= kiln.firings()) {
      return Stream.empty();
    }
    return Campaign.heatsOf(kiln)
        .filter(heat -> heat <= from + campaign.works().step())
        .filter(heat -> heat < kiln.hottest() || hottest(before, heat) < kiln.hot())
        .boxed()
        .flatMap(
            heat -> {
              int start = calendar.earliest(kiln, heat, Math.max(free, ready(lots)));
              int end = start + campaign.heat(heat).days();
              Batch batch = new Batch(index, position, heat, start, end);
              long cost =
                  kiln.fuelAt(heat) + campaign.change(kiln, from, heat) + lateness(lots, end);
              return end <= campaign.works().days() && fits(lots, batch)
                  ? Stream.of(new Way(batch, true, cost))
                  : Stream.empty();
            });
  }

  private static long hottest(List<Batch> batches, int heat) {
    return batches.stream().filter(batch -> batch.heat == heat).count();
  }

  /** The first day on which all are dry and decorated. */
  private int ready(List<Integer> lots) {
    int dry = lots.stream().mapToInt(lot -> campaign.lot(lot).dry()).max().orElseThrow();
    int decorated =
        campaign.seconds().stream()
            .filter(pair -> lots.contains(pair.second()))
            .mapToInt(pair -> batchOf.get(pair.first()).end + pair.days())
            .max()
            .orElse(0);
    return Math.max(dry, decorated);
  }

  private long lateness(List<Integer> lots, int end) {
    return lots.stream()
        .map(campaign::lot)
        .mapToLong(lot -> (long) lot.rate() * Math.max(0, end - lot.due()))
        .sum();
  }

  private boolean fits(List<Integer> lots, Batch batch) {
    Kiln kiln = campaign.kilns().get(batch.kiln);
    List<Lot> all = Stream.concat(lotsIn(batch), lots.stream().map(campaign::lot)).toList();
    return batch.start >= ready(lots)
        && lots.stream().map(campaign::lot).allMatch(lot -> isInTime(lot, batch))
        && all.stream().mapToInt(Lot::shelves).sum() <= kiln.shelves()
        && all.stream().filter(Lot::large).mapToInt(Lot::shelves).sum() <= kiln.wide()
        && all.stream().noneMatch(a -> all.stream().anyMatch(b -> campaign.areSpoilers(a, b)))
        && !(holds(all, Glaze.Kind.PALE) && holds(neighbour(batch, -1), Glaze.Kind.FUMING))
        && !(holds(all, Glaze.Kind.FUMING) && holds(neighbour(batch, 1), Glaze.Kind.PALE));
  }

  private static boolean isInTime(Lot lot, Batch batch) {
    return lot.maturesAt(batch.heat) && batch.end <= lot.latest().orElse(Integer.MAX_VALUE);
  }

  private boolean holds(List<Lot> lots, Glaze.Kind kind) {
    return lots.stream().anyMatch(lot -> campaign.kind(lot) == kind);
  }

  /** The lots of the firing that is {@code step} after this one, or before it. */
  private List<Lot> neighbour(Batch batch, int step) {
    int position = batch.position + step;
    return position < 0 || position >= batches.get(batch.kiln).size()
        ? List.of()
        : lotsIn(batches.get(batch.kiln).get(position)).toList();
  }

  private Stream<Lot> lotsIn(Batch batch) {
    return batchOf.entrySet().stream()
        .filter(entry -> entry.getValue().equals(batch))
        .map(entry -> campaign.lot(entry.getKey()));
  }

  private Plan made() {
    List<Firing> firings = campaign.firings();
    int[] firingOf = new int[campaign.lots().size()];
    int[] heats = new int[firings.size()];
    int[] starts = new int[firings.size()];
    for (Firing firing : firings) {
      if (firing.position() < batches.get(firing.kiln()).size()) {
        Batch batch = batches.get(firing.kiln()).get(firing.position());
        heats[firing.index()] = batch.heat;
        starts[firing.index()] = batch.start;
        campaign
            .lotNumbers()
            .filter(lot -> batchOf.get(lot).equals(batch))
            .forEach(lot -> firingOf[lot] = firing.index());
      }
    }
    return new Plan(Ints.of(firingOf), Ints.of(heats), Ints.of(starts));
  }
}
