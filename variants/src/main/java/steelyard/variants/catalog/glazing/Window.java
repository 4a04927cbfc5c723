package steelyard.variants.catalog.glazing;

/** Slots in a row, {@code end} excluded. */
record Window(int start, int end) {}
