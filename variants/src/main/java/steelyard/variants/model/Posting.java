package steelyard.variants.model;

import java.util.List;
import java.util.Objects;

/**
 * One statement of a model: as written, and as adapters see it.
 *
 * @param id dense, from 0, in order of posting; blame and sizes are counted by it
 * @param source the formula as written, which the judge judges; of a definition, {@code variable =
 *     term}
 * @param definitions total definitions of auxiliary variables, in an order in which each needs only
 *     earlier ones; of a {@link Duty#DEFINITION} the last one defines its variable
 * @param asserted what must hold; empty for a {@link Duty#DEFINITION}
 */
public record Posting(
    int id,
    Origin origin,
    Duty duty,
    Formula source,
    List<Definition> definitions,
    List<Constraint> asserted) {

  /** What a posting is for. */
  public enum Duty {
    /** It must hold. */
    ASSERTED,
    /** It gives a variable its value; not lowered where nothing uses it. */
    DEFINITION,
    /** A reformulation took it out; kept for the audit. */
    WITHDRAWN
  }

  public Posting {
    Objects.requireNonNull(origin, "origin");
    Objects.requireNonNull(duty, "duty");
    Objects.requireNonNull(source, "source");
    definitions = List.copyOf(definitions);
    asserted = List.copyOf(asserted);
    if (duty == Duty.DEFINITION && (definitions.isEmpty() || !asserted.isEmpty())) {
      throw new IllegalArgumentException("a definition defines and asserts nothing: " + origin);
    }
  }

  /** The variable that a posting of duty {@link Duty#DEFINITION} defines. */
  public int defined() {
    if (duty != Duty.DEFINITION) {
      throw new IllegalStateException(origin + " defines no variable");
    }
    return definitions.get(definitions.size() - 1).variable();
  }

  /** The same statement taken out of the model. */
  public Posting withdrawn() {
    return new Posting(id, origin, Duty.WITHDRAWN, source, definitions, asserted);
  }

  /** What adapters see under other names; the source stays as written. */
  public Posting rewrite(Rewriting rewriting) {
    return new Posting(
        id,
        origin,
        duty,
        source,
        definitions.stream().map(d -> d.rewrite(rewriting)).toList(),
        asserted.stream().map(c -> c.rewrite(rewriting)).toList());
  }
}
