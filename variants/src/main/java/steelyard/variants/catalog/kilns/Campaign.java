package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import steelyard.variants.model.Ints;

/**
 * An instance: what is to be fired and with what.
 *
 * @param heats from heat 1 on
 * @param changes what a change of temperature costs: row {@code a - 1}, entry {@code b - 1} for a
 *     change from heat a to heat b
 * @param spoilers pairs of glazes that spoil each other in one firing
 * @param together pairs of lots that must come out of one firing, so that their shade matches
 */
record Campaign(
    Works works,
    List<Heat> heats,
    List<Ints> changes,
    List<Glaze> glazes,
    List<Pair> spoilers,
    List<Kiln> kilns,
    List<Lot> lots,
    List<Pair> together,
    List<SecondFire> seconds) {
  Campaign {
    heats = List.copyOf(heats);
    changes = List.copyOf(changes);
    glazes = List.copyOf(glazes);
    spoilers = List.copyOf(spoilers);
    kilns = List.copyOf(kilns);
    lots = List.copyOf(lots);
    together = List.copyOf(together);
    seconds = List.copyOf(seconds);
  }

  Campaign with(Works other) {
    return new Campaign(other, heats, changes, glazes, spoilers, kilns, lots, together, seconds);
  }

  Campaign withSpoilers(List<Pair> others) {
    return new Campaign(works, heats, changes, glazes, others, kilns, lots, together, seconds);
  }

  Campaign withKilns(List<Kiln> others) {
    return new Campaign(works, heats, changes, glazes, spoilers, others, lots, together, seconds);
  }

  Campaign withLots(List<Lot> others) {
    return new Campaign(works, heats, changes, glazes, spoilers, kilns, others, together, seconds);
  }

  Campaign withTies(List<Pair> pairs, List<SecondFire> fires) {
    return new Campaign(works, heats, changes, glazes, spoilers, kilns, lots, pairs, fires);
  }

  Heat heat(int heat) {
    return heats.get(heat - 1);
  }

  Kiln kiln(Firing firing) {
    return kilns.get(firing.kiln());
  }

  Lot lot(int index) {
    return lots.get(index);
  }

  /** Every lot's index. */
  IntStream lotNumbers() {
    return IntStream.range(0, lots.size());
  }

  /** The heats that a kiln can be fired at. */
  static IntStream heatsOf(Kiln kiln) {
    return IntStream.rangeClosed(1, kiln.hottest());
  }

  /** What it costs {@code kiln} to be fired at {@code to} after {@code from}. */
  int change(Kiln kiln, int from, int to) {
    return kiln.mass() * changes.get(from - 1).get(to - 1);
  }

  /** All firings, by kiln and position. */
  List<Firing> firings() {
    List<Firing> firings = new ArrayList<>();
    for (int k = 0; k < kilns.size(); k++) {
      for (int position = 0; position < kilns.get(k).firings(); position++) {
        String name = kilns.get(k).name() + "." + (position + 1);
        firings.add(new Firing(firings.size(), k, position, name));
      }
    }
    return firings;
  }

  /** Whether the kiln is hot enough for the lot and has the shelves for it. */
  boolean takes(Kiln kiln, Lot lot) {
    int room = lot.large() ? Math.min(kiln.wide(), kiln.shelves()) : kiln.shelves();
    return lot.coolest() <= kiln.hottest() && lot.shelves() <= room;
  }

  boolean areSpoilers(Lot one, Lot other) {
    return areSpoilers(one.glaze(), other.glaze());
  }

  boolean areSpoilers(int glaze, int other) {
    return spoilers.stream().anyMatch(pair -> pair.isOf(glaze, other));
  }

  /** Pairs of lots, the lower first, whose glazes spoil each other. */
  List<Pair> spoilingLots() {
    List<Pair> pairs = new ArrayList<>();
    for (int one = 0; one < lots.size(); one++) {
      for (int other = one + 1; other < lots.size(); other++) {
        if (areSpoilers(lots.get(one), lots.get(other))) {
          pairs.add(new Pair(one, other));
        }
      }
    }
    return pairs;
  }

  /** The lots whose glaze is of that kind. */
  IntStream lotsOf(Glaze.Kind kind) {
    return lotNumbers().filter(lot -> kind(lots.get(lot)) == kind);
  }

  Glaze.Kind kind(Lot lot) {
    return glazes.get(lot.glaze()).kind();
  }

  /** Lots that no pair and no second fire ties to others. */
  boolean isTied(int lot) {
    return Stream.concat(
            together.stream().flatMap(pair -> Stream.of(pair.one(), pair.other())),
            seconds.stream().flatMap(pair -> Stream.of(pair.first(), pair.second())))
        .anyMatch(tied -> tied == lot);
  }

  /** Whether the crew is ever too small for all kilns on one day. */
  boolean isCrewScarce() {
    return works.crew() < kilns.size();
  }

  /** Whether the gas main is ever too small for all kilns on one day. */
  boolean isGasScarce() {
    return kilns.stream().mapToInt(this::mostGas).sum() > works.gas();
  }

  private int mostGas(Kiln kiln) {
    return heatsOf(kiln).map(heat -> heat(heat).gas()).max().orElseThrow();
  }
}
