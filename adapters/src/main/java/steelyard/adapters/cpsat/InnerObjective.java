package steelyard.adapters.cpsat;

import com.google.ortools.sat.CpObjectiveProto;
import java.util.function.IntToLongFunction;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Objective;

/**
 * The objective as the library sees it: minimised, of integers, and without the constant, which it
 * would keep as a double. Its bounds are then exact integers too.
 */
record InnerObjective(Objective objective) {

  private long sign() {
    return objective.sense() == Objective.Sense.MINIMIZE ? 1 : -1;
  }

  CpObjectiveProto message(Places places) {
    CpObjectiveProto.Builder message = CpObjectiveProto.newBuilder();
    LinearSum sum = objective.sum();
    for (int i = 0; i < sum.size(); i++) {
      message.addVars(places.of(sum.variable(i))).addCoeffs(sign() * sum.coefficient(i));
    }
    return message.build();
  }

  /** The library's objective in a solution. */
  long inner(IntToLongFunction byPlace, Places places) {
    LinearSum sum = objective.sum();
    long value = 0;
    for (int i = 0; i < sum.size(); i++) {
      value += sum.coefficient(i) * byPlace.applyAsLong(places.of(sum.variable(i)));
    }
    return sign() * value;
  }

  /** The model's objective where the library's is {@code inner}. */
  long outer(long inner) {
    return sign() * inner + objective.sum().constant();
  }
}
