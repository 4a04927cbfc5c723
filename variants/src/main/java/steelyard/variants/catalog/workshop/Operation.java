package steelyard.variants.catalog.workshop;

/**
 * One step of a mould's route.
 *
 * @param station from 0
 * @param minutes at least 0; an operation of no minutes holds no station
 */
record Operation(int station, int minutes) {
  Operation {
    if (station < 0 || minutes < 0) {
      throw new IllegalArgumentException("station " + station + " for " + minutes + " minutes");
    }
  }
}
