package steelyard.harness.sweep;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.function.Function;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.harness.sweep.text.Utf8;
import steelyard.results.ledger.Goal;
import steelyard.results.ledger.RunKey;

/**
 * One block, ready to be carried out with nothing else at hand, here or on another machine that
 * sees the same paths.
 *
 * @param form the form of the file, {@value #FORM}
 * @param sweep the sweep's id
 * @param sweepName the sweep's name
 * @param block the block's number within the sweep, from 0
 * @param seed the seed of all runs
 * @param into the folder that takes a folder for each run, absolute
 * @param runs in the order in which they are carried out
 */
public record BlockFile(
    int form, String sweep, String sweepName, int block, long seed, Path into, List<Run> runs) {

  /** The form that this version writes and reads. */
  public static final int FORM = 1;

  private static final int LARGEST = 16_000_000;

  /**
   * One run.
   *
   * @param candidate what is run, as people write it
   * @param inService whether it is the one in service
   * @param recipe how its model is made
   * @param setup on what, with what and under which limits
   * @param goal what is asked for
   * @param key what makes it the same experiment as another; empty until its model is known
   */
  public record Run(
      String candidate,
      boolean inService,
      Recipe recipe,
      Setup setup,
      Goal goal,
      Optional<RunKey> key) {
    public Run {
      Objects.requireNonNull(candidate, "candidate");
      Objects.requireNonNull(recipe, "recipe");
      Objects.requireNonNull(setup, "setup");
      Objects.requireNonNull(goal, "goal");
      Objects.requireNonNull(key, "key");
    }
  }

  public BlockFile {
    Objects.requireNonNull(sweep, "sweep");
    Objects.requireNonNull(sweepName, "sweepName");
    Objects.requireNonNull(into, "into");
    runs = List.copyOf(runs);
    if (form != FORM) {
      throw new IllegalArgumentException(
          "a block file of form " + form + "; this version reads form " + FORM);
    }
    if (block < 0 || seed < 0) {
      throw new IllegalArgumentException("block or seed below 0: " + block + ", " + seed);
    }
    if (!into.isAbsolute()) {
      throw new IllegalArgumentException("into must be absolute, was " + into);
    }
  }

  /**
   * The file of a planned block.
   *
   * @param sweep the sweep's id
   * @param sweepName the sweep's name
   * @param into the folder that takes a folder for each run, absolute
   * @param keys what is known of each candidate's key in this block
   */
  public static BlockFile of(
      Block block,
      String sweep,
      String sweepName,
      Path into,
      Function<Candidate, Optional<RunKey>> keys) {
    List<Run> runs = new ArrayList<>();
    for (Candidate candidate : block.order()) {
      runs.add(
          new Run(
              candidate.name(),
              candidate.equals(block.contest().inService()),
              new Recipe.OfVariant(block.contest().recipe(candidate, block.instance())),
              candidate.setup(),
              Goal.optimise(),
              keys.apply(candidate)));
    }
    return new BlockFile(FORM, sweep, sweepName, block.number(), block.seed(), into, runs);
  }

  /**
   * Reads a block file.
   *
   * @throws SweepProblem if it cannot be read or is not one
   */
  public static BlockFile read(Path file) {
    String shown = file.toString();
    return Json.read(Utf8.read(file, shown, LARGEST), BlockFile.class, shown);
  }

  /** Writes the file beside its place, to disk, and moves it there. */
  public void write(Path file) throws IOException {
    Path beside = file.resolveSibling(file.getFileName() + ".part");
    Files.writeString(beside, Json.write(this));
    try (FileChannel channel = FileChannel.open(beside, StandardOpenOption.WRITE)) {
      channel.force(true);
    }
    Files.move(beside, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
  }
}
