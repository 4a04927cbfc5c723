package steelyard.harness.worker;

import java.util.List;

/** The phases of a run, in order; the limit's clock runs from {@link #LOWER} on. */
public final class Phases {
  public static final String LOAD = "load";
  public static final String BUILD = "build";
  public static final String SHUFFLE = "shuffle";
  public static final String LOWER = "lower";
  public static final String SOLVE = "solve";
  public static final String ANSWER = "answer";
  public static final String DONE = "done";

  /** Those of the limit's clock. */
  public static final List<String> LIMITED = List.of(LOWER, SOLVE, ANSWER);

  /** All of them. */
  public static final List<String> ALL = List.of(LOAD, BUILD, SHUFFLE, LOWER, SOLVE, ANSWER, DONE);

  private Phases() {}

  /** Reading and building one of several models. */
  public static String build(int model) {
    return BUILD + " " + model;
  }
}
