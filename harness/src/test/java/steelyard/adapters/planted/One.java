package steelyard.adapters.planted;

import java.util.List;
import org.sat4j.specs.ISolver;
import steelyard.adapters.plantedtoo.Other;

/** Knows another adapter, and is known by it: a cycle. */
public final class One {
  static final List<Class<?>> KNOWN = List.of(Other.class, ISolver.class);

  private One() {}
}
