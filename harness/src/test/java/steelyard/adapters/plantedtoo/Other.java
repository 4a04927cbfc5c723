package steelyard.adapters.plantedtoo;

import com.google.ortools.sat.CpModel;
import java.util.List;
import steelyard.adapters.planted.One;

/** Knows another adapter, and is known by it: a cycle. */
public final class Other {
  static final List<Class<?>> KNOWN = List.of(One.class, CpModel.class);

  private Other() {}
}
