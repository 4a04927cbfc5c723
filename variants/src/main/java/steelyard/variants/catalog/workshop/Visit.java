package steelyard.variants.catalog.workshop;

/**
 * An operation as its station sees it.
 *
 * @param head minutes of the mould's work before it
 * @param minutes positive
 * @param tail minutes of the mould's work after it
 */
record Visit(int mould, int step, int head, int minutes, int tail) {}
