package steelyard.variants.catalog.kilns;

/**
 * A place in the order of a kiln's firings; whether it is used is decided.
 *
 * @param index among all firings of all kilns
 * @param kiln index of the kiln
 * @param position in the kiln's order, from 0
 * @param name {@code KILN.NUMBER}, counted from 1
 */
record Firing(int index, int kiln, int position, String name) {
  boolean isFirst() {
    return position == 0;
  }
}
