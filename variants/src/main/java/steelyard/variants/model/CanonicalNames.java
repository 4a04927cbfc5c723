package steelyard.variants.model;

import java.nio.ByteBuffer;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.IntBinaryOperator;
import java.util.stream.IntStream;

/**
 * Variable identities that do not depend on any order: a named variable is its name, an auxiliary
 * one is what defines it. Doubles as the rewriting that sorts the rows that commute by them.
 */
final class CanonicalNames implements Rewriting {
  /** While a definition is digested, the variable that it defines. */
  private static final int SELF = 0;

  /** Stands in for each variable: the head of its identity, moved on where two heads collide. */
  private final int[] stands;

  private final Map<Integer, byte[]> identities = new HashMap<>();

  private CanonicalNames(int variables) {
    stands = new int[variables];
    identities.put(SELF, new byte[0]);
  }

  static CanonicalNames of(Model model) {
    Variables variables = model.variables();
    CanonicalNames names = new CanonicalNames(variables.size());
    for (int v = 0; v < variables.size(); v++) {
      if (variables.get(v).kind() != Variables.Kind.AUXILIARY) {
        names.identify(v, new Digester().add("named").add(variables.name(v)).bytes());
      }
    }
    for (Posting posting : model.postings()) {
      for (Definition definition : posting.definitions()) {
        if (variables.get(definition.variable()).kind() == Variables.Kind.AUXILIARY) {
          names.identify(definition.variable(), names.digest("defined", definition.constraint()));
        }
      }
    }
    return names;
  }

  private void identify(int variable, byte[] identity) {
    int stand = ByteBuffer.wrap(identity).getInt() & Integer.MAX_VALUE;
    while (identities.containsKey(stand) && !Arrays.equals(identities.get(stand), identity)) {
      stand = (stand + 1) & Integer.MAX_VALUE;
    }
    identities.put(stand, identity);
    stands[variable] = stand;
  }

  /** One digest for each constraint that the posting asserts or names a variable by. */
  List<byte[]> items(Posting posting) {
    List<byte[]> items = new ArrayList<>();
    if (posting.duty() == Posting.Duty.DEFINITION) {
      List<Definition> all = posting.definitions();
      items.add(digest("definition", all.get(all.size() - 1).constraint()));
    }
    posting.asserted().forEach(constraint -> items.add(digest("asserted", constraint)));
    return items;
  }

  private byte[] digest(String what, Constraint constraint) {
    Digester out = new Digester().add(what);
    writing(out).constraint(constraint.rewrite(this));
    return out.bytes();
  }

  ConstraintWriting writing(Digester out) {
    return new ConstraintWriting(out, stand -> out.add(identities.get(stand)));
  }

  @Override
  public int variable(int old) {
    return stands[old];
  }

  @Override
  public int[] rows(int size, IntBinaryOperator byContent) {
    Comparator<Integer> order = byContent::applyAsInt;
    return IntStream.range(0, size).boxed().sorted(order).mapToInt(Integer::intValue).toArray();
  }
}
