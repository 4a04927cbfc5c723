package steelyard.adapters.cpsat;

import com.google.ortools.sat.CpModelProto;
import com.google.ortools.sat.SatParameters;
import java.util.Optional;
import java.util.function.IntUnaryOperator;
import steelyard.adapters.spi.Sizes;
import steelyard.variants.model.Model;

/**
 * What a solve works on.
 *
 * @param message without objective
 * @param maker by index of a constraint in the message, the id of the posting that made it
 * @param parameters of every call of the library, limits left out
 */
record Instance(
    Model model,
    Places places,
    CpModelProto message,
    IntUnaryOperator maker,
    SatParameters parameters,
    Sizes sizes) {

  /** The objective, if it is more than a constant. */
  Optional<InnerObjective> objective() {
    return model.objective().filter(o -> o.sum().size() > 0).map(InnerObjective::new);
  }

  /** The objective's value, if that is the same everywhere. */
  Optional<Long> constantObjective() {
    return model.objective().filter(o -> o.sum().size() == 0).map(o -> o.sum().constant());
  }

  /** The message with the objective. */
  CpModelProto optimising(InnerObjective objective) {
    return message.toBuilder().setObjective(objective.message(places)).build();
  }
}
