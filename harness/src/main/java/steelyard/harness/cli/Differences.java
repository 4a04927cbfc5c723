package steelyard.harness.cli;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import steelyard.harness.worker.Event;

/**
 * What tells two models of one instance apart, group by group. A statement that stands in both
 * counts as the same, as often as it stands in both.
 */
final class Differences {
  private Differences() {}

  /**
   * One group.
   *
   * @param before how many statements the first model has in it
   * @param after how many the second has
   * @param withdrawn those of the first that the second has not
   * @param added those of the second that the first has not
   */
  record Group(String name, int before, int after, List<String> withdrawn, List<String> added) {
    Group {
      withdrawn = List.copyOf(withdrawn);
      added = List.copyOf(added);
    }

    boolean isSame() {
      return withdrawn.isEmpty() && added.isEmpty();
    }

    /** What became of the group, in a word or two. */
    String fate() {
      if (isSame()) {
        return "the same";
      }
      return before == 0 ? "added" : after == 0 ? "withdrawn" : "changed";
    }
  }

  /** Every group of either model, in the order of their first statements. */
  static List<Group> between(List<Event.Stated> before, List<Event.Stated> after) {
    Map<String, Map<String, Integer>> first = byGroup(before);
    Map<String, Map<String, Integer>> second = byGroup(after);
    Set<String> names = new LinkedHashSet<>(first.keySet());
    names.addAll(second.keySet());
    List<Group> groups = new ArrayList<>();
    for (String name : names) {
      Map<String, Integer> here = first.getOrDefault(name, Map.of());
      Map<String, Integer> there = second.getOrDefault(name, Map.of());
      groups.add(
          new Group(name, size(here), size(there), beyond(there, here), beyond(here, there)));
    }
    return groups;
  }

  private static Map<String, Map<String, Integer>> byGroup(List<Event.Stated> statements) {
    Map<String, Map<String, Integer>> groups = new LinkedHashMap<>();
    for (Event.Stated stated : statements) {
      groups
          .computeIfAbsent(stated.group(), group -> new LinkedHashMap<>())
          .merge(stated.text(), 1, Integer::sum);
    }
    return groups;
  }

  private static int size(Map<String, Integer> statements) {
    return statements.values().stream().mapToInt(Integer::intValue).sum();
  }

  /** What {@code these} have beyond {@code those}. */
  private static List<String> beyond(Map<String, Integer> those, Map<String, Integer> these) {
    List<String> lines = new ArrayList<>();
    these.forEach(
        (text, count) -> {
          for (int i = those.getOrDefault(text, 0); i < count; i++) {
            lines.add(text);
          }
        });
    return lines;
  }
}
