package steelyard.harness.sweep;

import java.time.Duration;
import java.util.List;
import java.util.Objects;
import steelyard.results.statistics.TieMargin;

/**
 * A sweep as its file describes it, with every name resolved and every default filled in.
 *
 * @param file the text of the file
 * @param name the sweep's name
 * @param notes the person's own words; may be empty
 * @param contests one for each family; at least one
 * @param seeds each once, in order; at least one
 * @param tieMargin within what distance two times are the same
 * @param penalty what a run without an answer counts as, in limits; at least 1
 * @param build what reading an instance and building its model may take
 * @param cores how many cores the runs may hold at a time
 * @param blockSize how many runs a block has at most, the one in service among them
 * @param remarks what the file left open and how it was taken, and what to be aware of; a line each
 */
public record Sweep(
    String file,
    String name,
    String notes,
    List<Contest> contests,
    List<Long> seeds,
    TieMargin tieMargin,
    double penalty,
    Duration build,
    int cores,
    int blockSize,
    List<String> remarks) {

  public Sweep {
    Objects.requireNonNull(file, "file");
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(notes, "notes");
    Objects.requireNonNull(tieMargin, "tieMargin");
    Objects.requireNonNull(build, "build");
    contests = List.copyOf(contests);
    seeds = List.copyOf(seeds);
    remarks = List.copyOf(remarks);
    if (contests.isEmpty() || seeds.isEmpty()) {
      throw new IllegalArgumentException("a sweep has a contest and a seed at least");
    }
    if (seeds.stream().distinct().count() < seeds.size()) {
      throw new IllegalArgumentException("a seed comes twice: " + seeds);
    }
    if (!(penalty >= 1) || build.isZero() || cores < 1 || blockSize < 2) {
      throw new IllegalArgumentException(
          "penalty, build limit, cores or block size too small: "
              + List.of(penalty, build, cores, blockSize));
    }
  }
}
