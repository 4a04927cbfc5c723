package steelyard.variants.catalog.dispatch;

/**
 * What a day that is made up is like.
 *
 * @param orders how many
 * @param trucks how many
 * @param alike how many of the trucks are alike, the first ones
 * @param open for how long yards take deliveries, in quarters of an hour; more for some
 * @param fee the carrier's fee in per cent of what a truck for this order alone costs
 * @param load the orders' pallets in per cent of what the trucks take
 * @param ours for how many of a hundred orders no carrier can be had
 * @param twins for how many of a hundred orders there is a second one like it
 */
record DayRecipe(
    int orders, int trucks, int alike, int open, int fee, int load, int ours, int twins) {

  /** Yards that take deliveries for a short while, and trucks that all differ. */
  static DayRecipe windows(int orders) {
    return new DayRecipe(orders, Math.max(2, orders / 4), 1, 3, 120, 80, 30, 0);
  }

  /** Yards that are open for most of the day, and two trucks with long tours. */
  static DayRecipe county(int orders) {
    return new DayRecipe(orders, 2, 1, 16, 130, 100, 20, 0);
  }

  /** Trucks that are alike, and many yards with two orders that are. */
  static DayRecipe fleet(int orders) {
    int trucks = Math.max(2, orders / 3);
    return new DayRecipe(orders, trucks, trucks, 8, 110, 85, 20, 35);
  }

  /** Carriers so cheap that it is the question whom to deliver to at all. */
  static DayRecipe carriers(int orders) {
    return new DayRecipe(orders, Math.max(2, orders / 5), 2, 8, 70, 100, 0, 0);
  }

  /** So few orders that every plan can be tried. */
  static DayRecipe tiny(int orders) {
    return new DayRecipe(orders, 2, 2, 3, 100, 90, 30, 30);
  }

  /** As few orders, of each sort on some seed. */
  static DayRecipe smallest(long seed) {
    int orders = 1 + Math.floorMod(seed, 4);
    return switch (Math.floorMod(seed, 3)) {
      case 0 -> new DayRecipe(orders, 2, 2, 3, 100, 90, 30, 30);
      case 1 -> new DayRecipe(orders, 1, 1, 6, 120, 110, 60, 0);
      default -> new DayRecipe(orders, 2, 1, 8, 60, 70, 10, 50);
    };
  }
}
