package steelyard.variants.catalog.kilns;

/**
 * A lot that is a second fire of another.
 *
 * @param first index of the lot that is fired, then decorated
 * @param second index of the lot that the decorated tiles are
 * @param days of decorating between opening the kiln and lighting the next
 */
record SecondFire(int first, int second, int days) {}
