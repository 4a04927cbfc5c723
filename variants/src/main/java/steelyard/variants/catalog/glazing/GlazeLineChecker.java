package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalLong;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;

/** Checks an order of tiles by walking along it: reads the kinds and nothing else of the answer. */
final class GlazeLineChecker {
  private final GlazeLine line;
  private final int[] kinds;
  private final List<String> problems = new ArrayList<>();
  private long cost;

  private GlazeLineChecker(GlazeLine line) {
    this.line = line;
    this.kinds = new int[line.slots()];
  }

  static Check check(GlazeLine line, Answer answer) {
    GlazeLineChecker checker = new GlazeLineChecker(line);
    checker.read(answer);
    if (!checker.problems.isEmpty()) {
      return new Check(checker.problems, OptionalLong.empty());
    }
    checker.count();
    for (int t = 0; t < line.treatments().size(); t++) {
      checker.walk(t);
    }
    checker.followGlazes();
    OptionalLong objective = line.hasCost() ? OptionalLong.of(checker.cost) : OptionalLong.empty();
    return new Check(checker.problems, objective);
  }

  private void read(Answer answer) {
    for (int slot = 0; slot < kinds.length; slot++) {
      Integer kind = answer.values().get(Names.kind(slot));
      if (kind == null) {
        problems.add("the plan does not say which kind of tile comes in slot " + slot);
      } else if (kind < 0 || kind >= line.kinds().size()) {
        problems.add("slot " + slot + " has kind " + kind + ", which is none");
      } else {
        kinds[slot] = kind;
      }
    }
  }

  private void count() {
    int[] found = new int[line.kinds().size()];
    for (int kind : kinds) {
      found[kind]++;
    }
    for (int k = 0; k < found.length; k++) {
      int ordered = line.kinds().get(k).tiles();
      if (found[k] != ordered) {
        problems.add("of kind " + k + " come " + found[k] + " tiles; " + ordered + " are ordered");
      }
    }
  }

  /** Keeps the number of tiles in the window that ends with the slot. */
  private void walk(int number) {
    Treatment treatment = line.treatments().get(number);
    int window = Math.min(treatment.window(), kinds.length);
    int inWindow = 0;
    for (int slot = 0; slot < kinds.length; slot++) {
      inWindow += needs(slot, number);
      if (slot >= window) {
        inWindow -= needs(slot - window, number);
      }
      if (slot >= window - 1 && inWindow > treatment.most()) {
        cost += treatment.excess();
        if (treatment.excess() == 0) {
          problems.add(
              inWindow
                  + " tiles with treatment "
                  + number
                  + " in slots "
                  + (slot - window + 1)
                  + "-"
                  + slot
                  + "; at most "
                  + treatment.most()
                  + " may be");
        }
      }
    }
  }

  private int needs(int slot, int treatment) {
    return line.kinds().get(kinds[slot]).needs(treatment) ? 1 : 0;
  }

  private void followGlazes() {
    int run = 0;
    for (int slot = 0; slot < kinds.length; slot++) {
      boolean same = slot > 0 && glaze(slot) == glaze(slot - 1);
      run = same ? run + 1 : 1;
      cost += slot > 0 && !same ? line.changeCost() : 0;
      if (run > line.longestRun()) {
        problems.add(
            "slot "
                + slot
                + " is tile "
                + run
                + " in a row of glaze "
                + glaze(slot)
                + "; at most "
                + line.longestRun()
                + " may be");
      }
    }
  }

  private int glaze(int slot) {
    return line.kinds().get(kinds[slot]).glaze();
  }
}
