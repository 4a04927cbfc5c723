package steelyard.variants.catalog.dispatch;

/**
 * A truck of the works. Two trucks that are equal are alike.
 *
 * @param pallets how many it takes
 * @param size in classes; a yard's gate lets trucks up to a size in
 * @param shift in quarters of an hour: it leaves at 0 and is back by then
 * @param cost of sending it at all
 */
record Truck(int pallets, int size, int shift, int cost) {}
