package steelyard.adapters.cpsat;

import com.google.ortools.sat.LinearExpressionProto;
import java.util.Arrays;
import java.util.List;
import steelyard.adapters.spi.Fresh;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Model;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * Where variables stand in the message, those of the model and those of decompositions; and views
 * as affine expressions over them.
 */
final class Places {
  private static final int NOWHERE = -1;

  private final Fresh fresh;
  private final ModelProto proto;
  private int[] places;

  private Places(Fresh fresh, ModelProto proto, int[] places) {
    this.fresh = fresh;
    this.proto = proto;
    this.places = places;
  }

  /** Declares in {@code proto} every variable that a backend gets. */
  static Places declare(Model model, ModelProto proto) {
    int[] places = new int[model.variables().size()];
    for (int v = 0; v < places.length; v++) {
      places[v] = model.isNeeded(v) ? proto.variable(model.variables().domain(v)) : NOWHERE;
    }
    return new Places(Fresh.beside(model.variables()), proto, places);
  }

  /** Where decompositions make their variables; {@link #declareFresh} is to follow. */
  Fresh fresh() {
    return fresh;
  }

  /** Declares what decompositions have made since. */
  void declareFresh() {
    int known = places.length;
    places = Arrays.copyOf(places, fresh.size());
    for (int v = known; v < places.length; v++) {
      places[v] = proto.variable(fresh.domain(v));
    }
  }

  boolean has(int variable) {
    return places[variable] != NOWHERE;
  }

  int of(int variable) {
    int place = places[variable];
    if (place == NOWHERE) {
      throw new IllegalStateException("variable " + variable + " is used and not needed");
    }
    return place;
  }

  Domain domain(int variable) {
    return fresh.domain(variable);
  }

  /** The largest value of {@code view}. */
  int max(View view) {
    return -min(view.negated());
  }

  /** The smallest value of {@code view}. */
  int min(View view) {
    return switch (view.sign()) {
      case 1 -> domain(view.variable()).min() + view.offset();
      case -1 -> view.offset() - domain(view.variable()).max();
      default -> view.offset();
    };
  }

  LinearExpressionProto expression(View view) {
    LinearExpressionProto.Builder affine =
        LinearExpressionProto.newBuilder().setOffset(view.offset());
    if (!view.isConstant()) {
      affine.addVars(of(view.variable())).addCoeffs(view.sign());
    }
    return affine.build();
  }

  List<LinearExpressionProto> expressions(Views views) {
    return views.stream().map(this::expression).toList();
  }
}
