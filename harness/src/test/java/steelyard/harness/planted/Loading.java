package steelyard.harness.planted;

import steelyard.adapters.planted.One;

/** A harness class outside the workers that loads an adapter. */
final class Loading {
  static final Class<?> LOADED = One.class;

  private Loading() {}
}
