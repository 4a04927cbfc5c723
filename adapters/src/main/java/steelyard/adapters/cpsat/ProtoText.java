package steelyard.adapters.cpsat;

import com.google.ortools.sat.CpModelProto;
import com.google.protobuf.TextFormat;
import java.io.IOException;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.SortedSet;
import java.util.TreeSet;
import steelyard.adapters.spi.Printable;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;

/** The message as protobuf text, with the names that the solver does not get. */
final class ProtoText implements Printable {
  private static final String FORMAT = "cpsat-proto-text";

  private final Instance instance;

  ProtoText(Instance instance) {
    this.instance = instance;
  }

  @Override
  public SortedSet<String> formats() {
    return new TreeSet<>(List.of(FORMAT));
  }

  @Override
  public void print(String format, Appendable to) throws IOException {
    if (!format.equals(FORMAT)) {
      throw new IllegalArgumentException("no format is called '" + format + "' but " + FORMAT);
    }
    TextFormat.printer().print(named(), to);
  }

  private CpModelProto named() {
    CpModelProto.Builder named =
        instance.objective().map(instance::optimising).orElse(instance.message()).toBuilder();
    nameVariables(named);
    nameConstraints(named);
    return named.build();
  }

  private void nameVariables(CpModelProto.Builder named) {
    Model model = instance.model();
    for (int v = 0; v < model.variables().size(); v++) {
      if (instance.places().has(v)) {
        named.getVariablesBuilder(instance.places().of(v)).setName(model.variables().name(v));
      }
    }
  }

  private void nameConstraints(CpModelProto.Builder named) {
    Map<Integer, String> origins = new HashMap<>();
    for (Posting posting : instance.model().postings()) {
      origins.put(posting.id(), posting.origin().toString());
    }
    for (int c = 0; c < named.getConstraintsCount(); c++) {
      named
          .getConstraintsBuilder(c)
          .setName(origins.getOrDefault(instance.maker().applyAsInt(c), ""));
    }
  }
}
