package steelyard.results.ledger;

import java.util.List;
import java.util.OptionalLong;

/**
 * What a run was asked for.
 *
 * @param kind the question
 * @param projection the variables whose assignments are enumerated; empty unless enumerating
 * @param atMost how many solutions are wanted at most; empty unless enumerating
 */
public record Goal(Kind kind, List<String> projection, OptionalLong atMost) {

  /** The question. */
  public enum Kind {
    /** Any solution. */
    SATISFY,
    /** A best solution. */
    OPTIMISE,
    /** All solutions. */
    ENUMERATE
  }

  public Goal {
    Text.require("goal kind", kind);
    projection = List.copyOf(Text.require("projection", projection));
    Text.require("atMost", atMost);
    if (kind != Kind.ENUMERATE && (!projection.isEmpty() || atMost.isPresent())) {
      throw new IllegalArgumentException("only ENUMERATE has a projection or atMost, not " + kind);
    }
  }

  /** Asks for any solution. */
  public static Goal satisfy() {
    return new Goal(Kind.SATISFY, List.of(), OptionalLong.empty());
  }

  /** Asks for a best solution. */
  public static Goal optimise() {
    return new Goal(Kind.OPTIMISE, List.of(), OptionalLong.empty());
  }

  /** Asks for all different assignments of some variables, up to a number. */
  public static Goal enumerate(List<String> projection, long atMost) {
    return new Goal(Kind.ENUMERATE, projection, OptionalLong.of(atMost));
  }
}
