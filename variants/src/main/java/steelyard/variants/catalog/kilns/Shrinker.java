package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/**
 * Smaller campaigns. Each has fewer lots, kilns, firings, days, repairs, ships, or ties between
 * lots or glazes than the one that it is made from, and no more of anything.
 */
final class Shrinker {
  private final Campaign campaign;

  private Shrinker(Campaign campaign) {
    this.campaign = campaign;
  }

  /** The boldest step first. */
  static Stream<Campaign> of(Campaign campaign) {
    Shrinker it = new Shrinker(campaign);
    return Stream.of(
            it.fewerLots(),
            it.fewerKilns(),
            it.fewerFirings(),
            it.fewerDays(),
            it.fewerTies(),
            it.fewerShips())
        .flatMap(smaller -> smaller)
        .filter(Shrinker::isPossible);
  }

  private static boolean isPossible(Campaign campaign) {
    return !campaign.lots().isEmpty()
        && campaign.lots().stream()
            .allMatch(lot -> campaign.kilns().stream().anyMatch(k -> campaign.takes(k, lot)));
  }

  /** Without half of the lots, a quarter of them and so on, down to one. */
  private Stream<Campaign> fewerLots() {
    int size = campaign.lots().size();
    return IntStream.iterate((size + 1) / 2, block -> block > 0, block -> block / 2)
        .boxed()
        .flatMap(
            block ->
                IntStream.iterate(0, from -> from < size, from -> from + block)
                    .mapToObj(from -> withoutLots(from, from + block)));
  }

  private Campaign withoutLots(int from, int until) {
    List<Integer> kept =
        campaign.lotNumbers().filter(lot -> lot < from || lot >= until).boxed().toList();
    List<Pair> together =
        campaign.together().stream()
            .map(pair -> new Pair(kept.indexOf(pair.one()), kept.indexOf(pair.other())))
            .filter(pair -> pair.one() >= 0 && pair.other() >= 0)
            .toList();
    List<SecondFire> seconds =
        campaign.seconds().stream()
            .map(
                pair ->
                    new SecondFire(
                        kept.indexOf(pair.first()), kept.indexOf(pair.second()), pair.days()))
            .filter(pair -> pair.first() >= 0 && pair.second() >= 0)
            .toList();
    return campaign.withLots(kept.stream().map(campaign::lot).toList()).withTies(together, seconds);
  }

  private Stream<Campaign> fewerKilns() {
    return withoutEach(campaign.kilns()).map(campaign::withKilns);
  }

  private Stream<Campaign> fewerFirings() {
    return IntStream.range(0, campaign.kilns().size())
        .filter(index -> campaign.kilns().get(index).firings() > 1)
        .mapToObj(
            index -> {
              Kiln kiln = campaign.kilns().get(index);
              return withKiln(index, kiln.withFirings(kiln.firings() - 1, kiln.hot()));
            });
  }

  private Campaign withKiln(int index, Kiln kiln) {
    List<Kiln> kilns = new ArrayList<>(campaign.kilns());
    kilns.set(index, kiln);
    return campaign.withKilns(kilns);
  }

  /** A day less, where nothing is said of the last one. */
  private Stream<Campaign> fewerDays() {
    int last = campaign.works().days() - 1;
    boolean isFree =
        last > 0
            && campaign.lots().stream()
                .allMatch(lot -> lot.dry() <= last && lot.latest().orElse(0) <= last)
            && campaign.kilns().stream()
                .flatMap(kiln -> kiln.repairs().stream())
                .allMatch(repair -> repair.until() <= last)
            && campaign.seconds().stream().allMatch(pair -> pair.days() <= last);
    return isFree ? Stream.of(campaign.with(campaign.works().withDays(last))) : Stream.empty();
  }

  private Stream<Campaign> fewerTies() {
    Stream<Campaign> repairs =
        IntStream.range(0, campaign.kilns().size())
            .filter(index -> !campaign.kilns().get(index).repairs().isEmpty())
            .mapToObj(index -> withKiln(index, campaign.kilns().get(index).withRepairs(List.of())));
    return Stream.of(
            withoutEach(campaign.spoilers()).map(campaign::withSpoilers),
            withoutEach(campaign.together())
                .map(pairs -> campaign.withTies(pairs, campaign.seconds())),
            withoutEach(campaign.seconds())
                .map(fires -> campaign.withTies(campaign.together(), fires)),
            repairs)
        .flatMap(smaller -> smaller);
  }

  private Stream<Campaign> fewerShips() {
    return campaign
        .lotNumbers()
        .filter(lot -> campaign.lot(lot).latest().isPresent())
        .mapToObj(
            lot -> {
              List<Lot> lots = new ArrayList<>(campaign.lots());
              lots.set(lot, lots.get(lot).withLatest(OptionalInt.empty()));
              return campaign.withLots(lots);
            });
  }

  /** The list without its first, without its second and so on. */
  private static <T> Stream<List<T>> withoutEach(List<T> list) {
    return IntStream.range(0, list.size())
        .mapToObj(
            out ->
                IntStream.range(0, list.size())
                    .filter(index -> index != out)
                    .mapToObj(list::get)
                    .toList());
  }
}
