package steelyard.harness.worker;

import java.util.Collections;
import java.util.List;
import java.util.Objects;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * What judging a run's solutions found.
 *
 * @param judged how many solutions were judged
 * @param problems what is wrong with them; empty if nothing is
 * @param shown the last solution in the family's own terms; empty without one or if it is wrong
 * @param answer the last solution's named values
 */
public record Verdict(
    long judged, List<String> problems, String shown, SortedMap<String, Integer> answer) {
  public Verdict {
    problems = List.copyOf(problems);
    Objects.requireNonNull(shown, "shown");
    answer = Collections.unmodifiableSortedMap(new TreeMap<>(answer));
  }
}
