package steelyard.variants.model;

import java.util.Objects;

/** At least one of the atoms holds; false when there is none. */
public record Clause(Atoms atoms) implements Relation {

  public Clause {
    Objects.requireNonNull(atoms, "atoms");
  }

  public static Clause of(Atom... atoms) {
    return new Clause(Atoms.of(atoms));
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.clause(this);
  }

  @Override
  public Clause rewrite(Rewriting rewriting) {
    Atoms mapped = atoms.mapped(rewriting);
    return new Clause(mapped.permuted(rewriting.rows(mapped.size(), mapped::compareRows)));
  }

  @Override
  public String kind() {
    return "clause";
  }
}
