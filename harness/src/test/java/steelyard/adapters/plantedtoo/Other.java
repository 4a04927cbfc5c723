package steelyard.adapters.plantedtoo;

import com.google.ortools.sat.CpModel;
import steelyard.adapters.planted.One;

/** Knows another adapter, and is known by it: a cycle. */
public final class Other {
  public static final Class<?>[] KNOWN = {One.class, CpModel.class};

  private Other() {}
}
