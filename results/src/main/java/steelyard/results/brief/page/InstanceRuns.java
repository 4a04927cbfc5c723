package steelyard.results.brief.page;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.stream.Collectors;
import steelyard.results.brief.Facts;
import steelyard.results.brief.Facts.Run;

/** The runs of one instance, as the table of runs groups them. */
public record InstanceRuns(String family, String instance, List<Run> runs) {

  private record Key(String family, String instance) {}

  public InstanceRuns {
    runs = List.copyOf(runs);
  }

  /** All runs, grouped in their order. */
  public static List<InstanceRuns> of(Facts facts) {
    return facts.runs().stream()
        .collect(
            Collectors.groupingBy(
                run -> new Key(run.family(), run.instance()),
                LinkedHashMap::new,
                Collectors.toList()))
        .entrySet()
        .stream()
        .map(e -> new InstanceRuns(e.getKey().family(), e.getKey().instance(), e.getValue()))
        .toList();
  }

  /** The instance's class. */
  public String instanceClass() {
    return runs.get(0).instanceClass();
  }
}
