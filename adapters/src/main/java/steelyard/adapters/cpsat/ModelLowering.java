package steelyard.adapters.cpsat;

import com.google.ortools.sat.CpModelProto;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.adapters.cpsat.RelationLowering.Parts;
import steelyard.adapters.spi.Sizes;
import steelyard.adapters.spi.SolveRequest;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;

/** Makes the library's message of a model: variables, postings in order, branching, hint. */
final class ModelLowering {
  private static final String CONSTRAINTS = "constraints";

  private final Model model;
  private final SolveRequest request;
  private final ModelProto proto;
  private final Places places;
  private final Literals literals;
  private final ConstraintLowering constraints;

  ModelLowering(Model model, SolveRequest request) {
    this.model = model;
    this.request = request;
    this.proto = new ModelProto(model.postings().size());
    this.places = Places.declare(model, proto);
    this.literals = new Literals(proto, places);
    Intervals intervals = new Intervals(proto, places, literals);
    this.constraints = new ConstraintLowering(new Parts(proto, places, literals, intervals));
  }

  Instance lower() {
    for (Posting posting : model.lowered()) {
      proto.madeBy(posting.id());
      posting.definitions().forEach(definition -> constraints.lower(definition.constraint()));
      posting.asserted().forEach(constraints::lower);
    }
    SearchGuide guide = new SearchGuide(places);
    guide.hint(model.hint(), literals, proto.message());
    int phases = model.branching().phases().size();
    int followed =
        Parameters.follows(request.settings())
            ? guide.follow(model.branching(), proto.message())
            : 0;
    SortedMap<String, String> how = new TreeMap<>(constraints.how());
    if (phases > 0) {
      how.put("branching", followed + " of " + phases + " phases followed, the rest automatic");
    }
    CpModelProto message = proto.message().build();
    return new Instance(
        model,
        places,
        message,
        proto::maker,
        Parameters.of(request, followed > 0),
        sizes(message.getSerializedSize(), how));
  }

  private Sizes sizes(long bytes, SortedMap<String, String> how) {
    SortedMap<String, Long> totals =
        new TreeMap<>(
            Map.of(
                "variables",
                proto.variables(),
                CONSTRAINTS,
                proto.constraints(),
                "terms",
                proto.terms(),
                "bytes",
                bytes));
    return new Sizes(totals, CONSTRAINTS, proto.constraintsByPosting(), how);
  }
}
