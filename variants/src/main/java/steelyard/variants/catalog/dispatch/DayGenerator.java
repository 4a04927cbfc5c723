package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import steelyard.variants.model.Ints;

/**
 * Makes up days. Yards lie around the works on a square of hilly country: uphill takes longer, a
 * toll bridge is dear and saves no time, so that neither times nor costs are the same both ways or
 * follow from each other.
 */
final class DayGenerator {
  private static final int SIDE = 60;
  private static final int PER_QUARTER = 9;
  private static final int SHIFT = 36;
  private static final int SIZES = 3;

  private final DayRecipe recipe;
  private final SplittableRandom random;
  private final List<Place> places = new ArrayList<>();

  private DayGenerator(DayRecipe recipe, long seed) {
    this.recipe = recipe;
    this.random = new SplittableRandom(seed);
  }

  /** Where a stop is, in kilometres, and how high in metres. */
  private record Place(int east, int north, int height) {
    double kilometres(Place other) {
      return Math.sqrt(
          (double) (east - other.east) * (east - other.east)
              + (double) (north - other.north) * (north - other.north));
    }

    boolean isAcrossTheRiver(Place other) {
      return north < SIDE / 3 != other.north < SIDE / 3;
    }
  }

  /**
   * A day by the recipe.
   *
   * @param seed equal seeds give equal days
   */
  static Dispatch of(DayRecipe recipe, long seed) {
    return new DayGenerator(recipe, seed).day();
  }

  private Dispatch day() {
    List<Integer> like = places();
    Legs times = legs(this::quarters).shortest();
    Legs costs = legs(this::cost).shortest();
    List<Truck> trucks = trucks();
    List<Order> orders = new ArrayList<>();
    for (int stop = 1; stop < places.size(); stop++) {
      int twin = like.get(stop);
      orders.add(twin < stop ? orders.get(twin - 1) : order(stop, trucks, times, costs));
    }
    return new Dispatch(trucks, orders, times, costs);
  }

  /** The works in the middle, then the yards; gives each stop the one that it is like. */
  private List<Integer> places() {
    places.add(new Place(SIDE / 2, SIDE / 2, 120));
    List<Integer> like = new ArrayList<>(List.of(0));
    while (places.size() <= recipe.orders()) {
      int stop = places.size();
      boolean isTwin = stop > 1 && happens(recipe.twins());
      like.add(isTwin ? stop - 1 : stop);
      places.add(isTwin ? places.get(stop - 1) : place());
    }
    return like;
  }

  private Place place() {
    return new Place(random.nextInt(SIDE + 1), random.nextInt(SIDE + 1), random.nextInt(400));
  }

  private interface Way {
    int measure(Place from, Place to);
  }

  private Legs legs(Way way) {
    List<Ints> rows = new ArrayList<>();
    for (int from = 0; from < places.size(); from++) {
      Place here = places.get(from);
      int stop = from;
      rows.add(
          Ints.of(
              IntStream.range(0, places.size())
                  .map(to -> to == stop ? 0 : way.measure(here, places.get(to)))
                  .toArray()));
    }
    return new Legs(rows);
  }

  private int quarters(Place from, Place to) {
    double climb = Math.max(0, to.height - from.height) / 100.0;
    return (int) Math.round(from.kilometres(to) / PER_QUARTER + climb / 2);
  }

  private int cost(Place from, Place to) {
    int toll = from.isAcrossTheRiver(to) ? 12 : 0;
    return (int) Math.round(from.kilometres(to)) + toll;
  }

  private List<Truck> trucks() {
    List<Truck> trucks = new ArrayList<>();
    for (int t = 0; t < recipe.trucks(); t++) {
      trucks.add(t > 0 && t < recipe.alike() ? trucks.get(0) : truck());
    }
    return trucks;
  }

  private Truck truck() {
    int size = 1 + random.nextInt(SIZES);
    return new Truck(8 * size + random.nextInt(4), size, SHIFT + random.nextInt(5), 30 + 15 * size);
  }

  private Order order(int stop, List<Truck> trucks, Legs times, Legs costs) {
    int room = trucks.stream().mapToInt(Truck::pallets).sum();
    int average = Math.max(1, room * recipe.load() / 100 / recipe.orders());
    int pallets = Math.min(1 + random.nextInt(2 * average), trucks.get(0).pallets());
    int gate = happens(30) ? 1 + random.nextInt(SIZES) : SIZES;
    int unloading = 1 + pallets / 5;
    int latest = SHIFT - unloading - times.get(stop, 0);
    int open = Math.min(recipe.open() + random.nextInt(recipe.open() + 1), latest);
    int opens = random.nextInt(Math.max(1, latest - open + 1));
    int closes = Math.max(opens + open, times.get(0, stop));
    int alone = costs.get(0, stop) + costs.get(stop, 0) + 60;
    int fee = Math.max(1, alone * recipe.fee() / 100 + random.nextInt(11) - 5);
    boolean isOurs = happens(recipe.ours()) && gate >= trucks.get(0).size();
    return new Order(pallets, gate, opens, closes, unloading, isOurs ? 0 : fee);
  }

  private boolean happens(int ofHundred) {
    return random.nextInt(100) < ofHundred;
  }
}
