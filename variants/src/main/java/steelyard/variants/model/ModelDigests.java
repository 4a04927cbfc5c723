package steelyard.variants.model;

import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;

/** The digests of a model; what each leaves out is its use. */
final class ModelDigests {
  private ModelDigests() {}

  static Digest asBuilt(Model model) {
    Digester out = new Digester();
    ConstraintWriting writing = new ConstraintWriting(out, out::add);
    Variables variables = model.variables();
    for (int v = 0; v < variables.size(); v++) {
      if (model.isNeeded(v)) {
        out.add(v);
        domain(out, variables.domain(v));
      }
    }
    for (Posting posting : model.lowered()) {
      posting.definitions().forEach(d -> writing.constraint(d.constraint()));
      posting.asserted().forEach(writing::constraint);
    }
    objective(model, out, writing);
    return out.digest();
  }

  static Digest search(Model model) {
    Digester out = new Digester();
    ConstraintWriting writing = new ConstraintWriting(out, out::add);
    for (Branching.Phase phase : model.branching().phases()) {
      out.add(phase.by().name()).add(phase.pick().name());
      writing.views(phase.views());
    }
    Hint hint = model.hint();
    out.add(hint.size());
    for (int i = 0; i < hint.size(); i++) {
      out.add(hint.variables().get(i)).add(hint.values().get(i));
    }
    return out.digest();
  }

  static Digest canonical(Model model) {
    CanonicalNames names = CanonicalNames.of(model);
    List<byte[]> items = new ArrayList<>();
    Variables variables = model.variables();
    for (int v : variables.decisions().toArray()) {
      Digester item = new Digester().add("decision").add(variables.name(v));
      domain(item, variables.domain(v));
      items.add(item.bytes());
    }
    model.lowered().forEach(posting -> items.addAll(names.items(posting)));
    Digester out = new Digester().addSorted(items);
    model
        .objective()
        .ifPresent(
            o -> {
              out.add(o.sense().name());
              names.writing(out).sum(o.sum().rewrite(names));
            });
    return out.digest();
  }

  static SortedMap<String, Digest> groups(Model model) {
    CanonicalNames names = CanonicalNames.of(model);
    SortedMap<String, List<byte[]>> items = new TreeMap<>();
    for (Posting posting : model.lowered()) {
      items
          .computeIfAbsent(posting.origin().qualifiedGroup(), group -> new ArrayList<>())
          .addAll(names.items(posting));
    }
    SortedMap<String, Digest> digests = new TreeMap<>();
    items.forEach((group, list) -> digests.put(group, new Digester().addSorted(list).digest()));
    return digests;
  }

  private static void objective(Model model, Digester out, ConstraintWriting writing) {
    out.add(model.objective().isPresent() ? 1 : 0);
    model
        .objective()
        .ifPresent(
            o -> {
              out.add(o.sense().name());
              writing.sum(o.sum());
            });
  }

  static void domain(Digester out, Domain domain) {
    out.add(domain.ranges());
    for (int r = 0; r < domain.ranges(); r++) {
      out.add(domain.from(r)).add(domain.to(r));
    }
  }
}
