package steelyard.adapters.planted;

import org.sat4j.specs.ISolver;
import steelyard.adapters.plantedtoo.Other;

/** Knows another adapter, and is known by it: a cycle. */
public final class One {
  public static final Class<?>[] KNOWN = {Other.class, ISolver.class};

  private One() {}
}
