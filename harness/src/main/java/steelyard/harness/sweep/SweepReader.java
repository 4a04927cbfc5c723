package steelyard.harness.sweep;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.stream.LongStream;
import steelyard.harness.sweep.text.Field;
import steelyard.harness.sweep.text.Keys;
import steelyard.harness.sweep.text.Mistakes;
import steelyard.harness.sweep.text.Phrases;
import steelyard.harness.sweep.text.Quantities;
import steelyard.results.statistics.TieMargin;

/** Reads the tree of a sweep file against a catalogue; every default of the format stands here. */
final class SweepReader {

  static final String FAMILY_JARS = "family-jars";

  private static final List<String> SHARED =
      List.of(
          "name",
          "notes",
          FAMILY_JARS,
          "families",
          "backends",
          "seeds",
          "limits",
          "tie-margin",
          "penalty",
          "cores",
          "block-size");

  private static final TieMargin TIE_MARGIN = new TieMargin(0.05, 0.05);
  private static final double PENALTY = 2;
  private static final int BLOCK_SIZE = 8;
  private static final int LARGEST_BLOCK = 64;
  private static final int MOST_SEEDS = 1000;
  private static final long MOST_RUNS = 2_000_000;
  private static final int FEW_SEEDS = 5;

  private final Catalogue catalogue;
  private final Builds builds;
  private final Path base;
  private final String text;
  private final Mistakes mistakes;
  private final List<String> remarks = new ArrayList<>();

  /**
   * A reader.
   *
   * @param builds which build of a backend runs
   * @param base the folder that relative paths start from
   * @param text the text of the file
   */
  SweepReader(Catalogue catalogue, Builds builds, Path base, String text, Mistakes mistakes) {
    this.catalogue = catalogue;
    this.builds = builds;
    this.base = base;
    this.text = text;
    this.mistakes = mistakes;
  }

  Sweep read(Field root) {
    Collection<String> known = new LinkedHashSet<>(SHARED);
    known.addAll(ContestReader.KEYS);
    Keys keys = Keys.of(root, known);
    if (!root.hasKeys()) {
      throw mistakes.problem();
    }
    Optional<String> name =
        keys.required("name", "name: mould-shop-formulations").flatMap(Field::name);
    Allowances allowances = Allowances.read(keys.optional("limits"));
    List<Setup> setups = setups(keys, allowances);
    List<Contest> contests = contests(root, keys, setups);
    List<Long> seeds = keys.optional("seeds").map(this::seeds).orElse(List.of(0L));
    TieMargin margin = keys.optional("tie-margin").map(this::tieMargin).orElse(TIE_MARGIN);
    double penalty = keys.optional("penalty").map(this::penalty).orElse(PENALTY);
    int blockSize = count(keys, "block-size", 2, LARGEST_BLOCK, BLOCK_SIZE);
    String notes = keys.optional("notes").flatMap(Field::text).orElse("");
    int cores = cores(keys, setups);
    refuseTooMany(root, contests, seeds);
    remarkOnThreads(setups, seeds);
    mistakes.throwIfAny();
    return new Sweep(
        text,
        name.orElseThrow(),
        notes,
        contests,
        seeds,
        margin,
        penalty,
        allowances.build(),
        cores,
        blockSize,
        remarks);
  }

  /** All settings of all backends; none if any of them is wrong. */
  private List<Setup> setups(Keys keys, Allowances allowances) {
    Optional<Field> backends = keys.required("backends", "backends: [sat, cpsat]");
    int before = mistakes.count();
    List<Setup> setups =
        backends.map(new BackendsReader(catalogue, allowances, builds)::read).orElse(List.of());
    if (mistakes.count() > before || backends.isEmpty()) {
      return List.of();
    }
    allowances.noteUnused(setups.stream().map(s -> s.backend().name()).distinct().toList());
    return setups;
  }

  private List<Contest> contests(Field root, Keys keys, List<Setup> setups) {
    ContestReader reader = new ContestReader(catalogue, base, setups, mistakes);
    List<Contest> contests = new ArrayList<>();
    Optional<Field> families = keys.optional("families");
    if (families.isEmpty()) {
      reader.read(root, keys).ifPresent(contests::add);
    } else {
      refuseOutside(keys);
      Set<String> names = new LinkedHashSet<>();
      for (Field entry : families.get().items()) {
        reader.read(entry, Keys.of(entry, ContestReader.KEYS)).ifPresent(contests::add);
        if (contests.size() > names.size() && !names.add(contests.get(names.size()).family())) {
          entry.mistake("a family comes twice");
        }
      }
    }
    remarks.addAll(reader.remarks());
    return contests;
  }

  private void refuseOutside(Keys keys) {
    for (String key : ContestReader.KEYS) {
      keys.optional(key)
          .ifPresent(field -> field.mistakeInKey("belongs into the entries of families here"));
    }
  }

  private List<Long> seeds(Field field) {
    if (field.isSingle()) {
      long count = field.whole(1, MOST_SEEDS).orElse(1);
      return LongStream.range(0, count).boxed().toList();
    }
    Set<Long> seeds = new LinkedHashSet<>();
    for (Field item : field.items()) {
      OptionalLong seed = item.whole(0, Long.MAX_VALUE);
      if (seed.isPresent() && !seeds.add(seed.getAsLong())) {
        item.mistake("seed " + seed.getAsLong() + " comes twice");
      }
    }
    return List.copyOf(seeds);
  }

  private TieMargin tieMargin(Field field) {
    if (field.isSingle()) {
      return new TieMargin(
          field.parsed(Quantities::share).orElse(0.0), TIE_MARGIN.absoluteSeconds());
    }
    Keys keys = Keys.of(field, List.of("share", "time"));
    double share =
        keys.optional("share")
            .flatMap(f -> f.parsed(Quantities::share))
            .orElse(TIE_MARGIN.relative());
    double seconds =
        keys.optional("time")
            .flatMap(f -> f.parsed(Quantities::seconds))
            .orElse(TIE_MARGIN.absoluteSeconds());
    return new TieMargin(share, seconds);
  }

  private double penalty(Field field) {
    return field.atLeast(1).orElse(PENALTY);
  }

  private int cores(Keys keys, List<Setup> setups) {
    int most = setups.stream().mapToInt(Setup::threads).max().orElse(1);
    Optional<Field> field = keys.optional("cores");
    int cores = count(keys, "cores", 1, Allowances.MOST_THREADS, most);
    if (field.isPresent() && cores < most) {
      field.get().mistake(cores + " is fewer than the " + most + " threads of one run");
    }
    return cores;
  }

  private static int count(Keys keys, String key, int low, int high, int byDefault) {
    return keys.optional(key)
        .map(field -> field.count(low, high).orElse(byDefault))
        .orElse(byDefault);
  }

  private static void refuseTooMany(Field root, List<Contest> contests, List<Long> seeds) {
    long runs =
        contests.stream()
            .mapToLong(c -> (long) c.candidates().size() * c.instances().size() * seeds.size())
            .sum();
    if (runs > MOST_RUNS) {
      root.mistake("makes " + runs + " runs; at most " + MOST_RUNS + " in one sweep");
    }
  }

  private void remarkOnThreads(List<Setup> setups, List<Long> seeds) {
    for (Setup setup : setups) {
      if (setup.threads() > 1 && seeds.size() < FEW_SEEDS) {
        remarks.add(
            setup.name()
                + " has "
                + setup.threads()
                + " threads, so its runs differ from one time to the next; "
                + Phrases.count(seeds.size(), "seed")
                + " cannot tell a gain from that, "
                + FEW_SEEDS
                + " may");
      }
    }
  }
}
