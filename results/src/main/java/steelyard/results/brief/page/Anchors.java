package steelyard.results.brief.page;

import java.util.HashMap;
import java.util.Map;
import steelyard.results.brief.Facts;
import steelyard.results.brief.Facts.Run;
import steelyard.results.brief.Words;

/**
 * Where in the page is a run? Gives each run an anchor that is the same whenever the page is made
 * again: its id, if it can stand in an address as it is.
 */
public final class Anchors {

  private final Map<String, String> anchors = new HashMap<>();
  private final Map<String, Run> runs = new HashMap<>();
  private final boolean manyFamilies;
  private final boolean manySeeds;

  Anchors(Facts facts) {
    manyFamilies = facts.scope().families().size() > 1;
    manySeeds = facts.scope().seeds().size() > 1;
    for (Run run : facts.runs()) {
      if (runs.putIfAbsent(run.run(), run) != null) {
        continue;
      }
      String plain = run.run().replaceAll("[^A-Za-z0-9._-]", "_");
      String cut = plain.length() > 60 ? plain.substring(0, 60) : plain;
      String unique = cut.equals(run.run()) ? cut : cut + "-" + anchors.size();
      anchors.put(run.run(), "run-" + unique);
    }
  }

  /** The anchor of a run; that of the whole table for one that is not in the page. */
  public String of(String run) {
    return anchors.getOrDefault(run, "runs");
  }

  /**
   * The anchor that a row of the table of runs carries; {@code null}, which leaves the attribute
   * out, for a run that stands for several candidates and has a row already.
   */
  public String own(Run run) {
    return run.equals(runs.get(run.run())) ? of(run.run()) : null;
  }

  /** An instance as it is told apart from the others of this brief. */
  public String instance(String family, String instance) {
    return manyFamilies ? Words.name(family) + " " + Words.name(instance) : Words.name(instance);
  }

  /**
   * A run in a few words, beside its candidate's name: its instance, and its seed if it matters.
   */
  public String place(String run) {
    Run found = runs.get(run);
    if (found == null) {
      return Words.name(run);
    }
    String instance = instance(found.family(), found.instance());
    return manySeeds ? instance + " seed " + found.seed() : instance;
  }

  /** Whether runs differ by seed. */
  public boolean manySeeds() {
    return manySeeds;
  }
}
