package steelyard.variants.planted;

import java.util.Random;
import java.util.concurrent.ThreadLocalRandom;
import steelyard.results.planted.Clocks;

/** Breaks the layers, and rolls dice without a seed. */
final class Offender {
  private Offender() {}

  static long roll() {
    return new Random().nextLong() + ThreadLocalRandom.current().nextInt() + Clocks.millis();
  }
}
