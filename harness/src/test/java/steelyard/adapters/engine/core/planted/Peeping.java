package steelyard.adapters.engine.core.planted;

import steelyard.variants.model.Model;

/** An engine class that sees the model. */
final class Peeping {
  static final Class<?> SEEN = Model.class;

  private Peeping() {}
}
