package steelyard.harness.sweep;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import java.io.ByteArrayOutputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.lang.reflect.RecordComponent;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import steelyard.harness.sweep.KeyParts.Platform;
import steelyard.harness.sweep.KeyParts.Surroundings;
import steelyard.results.ledger.Conditions.Mode;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Goal;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.RunKey;

class KeyPartsTests {

  private static final Digest A = Samples.digest("a");
  private static final Digest B = Samples.digest("b");
  private static final Limits LIMITS = new Limits(10, Optional.empty(), 1000_000);

  private static final KeyParts BASE =
      new KeyParts(
          A,
          Optional.empty(),
          A,
          new TreeMap<>(Map.of("restarts", "luby")),
          0,
          1,
          Goal.optimise(),
          LIMITS,
          new TreeSet<>());

  private static final Optional<Platform> PLATFORM = Optional.of(new Platform("m", "17"));

  private static final Surroundings COLD =
      new Surroundings("m", new TreeMap<>(Map.of("jdk", "17")), Mode.COLD, Optional.empty(), 1);

  /** The base with one part changed, each part in turn. */
  private static List<KeyParts> changed() {
    List<KeyParts> all = new ArrayList<>();
    all.add(with(B, Optional.empty(), A, Map.of("restarts", "luby"), 0, 1));
    all.add(with(A, Optional.of(A), A, Map.of("restarts", "luby"), 0, 1));
    all.add(with(A, Optional.of(B), A, Map.of("restarts", "luby"), 0, 1));
    all.add(with(A, Optional.empty(), B, Map.of("restarts", "luby"), 0, 1));
    all.add(with(A, Optional.empty(), A, Map.of("restarts", "none"), 0, 1));
    all.add(with(A, Optional.empty(), A, Map.of("restart", "sluby"), 0, 1));
    all.add(with(A, Optional.empty(), A, Map.of("restarts", "luby", "x", "1"), 0, 1));
    all.add(with(A, Optional.empty(), A, Map.of("restarts", "luby"), 1, 1));
    all.add(with(A, Optional.empty(), A, Map.of("restarts", "luby"), 0, 2));
    for (Goal goal :
        List.of(
            Goal.satisfy(),
            Goal.enumerate(List.of(), 5),
            Goal.enumerate(List.of("x"), 5),
            Goal.enumerate(List.of("x"), 6))) {
      all.add(with(goal, LIMITS, Set.of()));
    }
    for (Limits limits :
        List.of(
            new Limits(11, Optional.empty(), 1000_000),
            new Limits(10, Optional.empty(), 2000_000),
            new Limits(10, Optional.of(new Limits.Work("seconds", 10)), 1000_000),
            new Limits(10, Optional.of(new Limits.Work("nodes", 10)), 1000_000),
            new Limits(10, Optional.of(new Limits.Work("nodes", 11)), 1000_000))) {
      all.add(with(Goal.optimise(), limits, Set.of()));
    }
    all.add(with(Goal.optimise(), LIMITS, Set.of("proof")));
    return all;
  }

  private static KeyParts with(
      Digest model,
      Optional<Digest> search,
      Digest backend,
      Map<String, String> options,
      long seed,
      int threads) {
    return new KeyParts(
        model,
        search,
        backend,
        new TreeMap<>(options),
        seed,
        threads,
        Goal.optimise(),
        LIMITS,
        new TreeSet<>());
  }

  private static KeyParts with(Goal goal, Limits limits, Set<String> evidence) {
    return new KeyParts(
        A,
        Optional.empty(),
        A,
        new TreeMap<>(Map.of("restarts", "luby")),
        0,
        1,
        goal,
        limits,
        new TreeSet<>(evidence));
  }

  @Test
  void differs_whereAnyPartDiffers() {
    Set<RunKey> keys = new HashSet<>(Set.of(BASE.workKey(PLATFORM), BASE.wallKey(COLD)));
    for (KeyParts parts : changed()) {
      assertThat(keys.add(parts.workKey(PLATFORM))).as("work key of %s", parts).isTrue();
      assertThat(keys.add(parts.wallKey(COLD))).as("wall key of %s", parts).isTrue();
    }
  }

  @Test
  void differs_byPlatform_unlessPortable() {
    assertThat(
            List.of(
                BASE.workKey(PLATFORM),
                BASE.workKey(Optional.empty()),
                BASE.workKey(Optional.of(new Platform("n", "17"))),
                BASE.workKey(Optional.of(new Platform("m", "25")))))
        .doesNotHaveDuplicates();
  }

  @Test
  void differs_bySurroundings_ofAWallTime() {
    TreeMap<String, String> launch = new TreeMap<>(Map.of("jdk", "17"));
    TreeMap<String, String> other = new TreeMap<>(Map.of("jdk", "25"));
    assertThat(
            List.of(
                BASE.wallKey(COLD),
                BASE.wallKey(new Surroundings("n", launch, Mode.COLD, Optional.empty(), 1)),
                BASE.wallKey(new Surroundings("m", other, Mode.COLD, Optional.empty(), 1)),
                BASE.wallKey(new Surroundings("m", launch, Mode.WARM, Optional.of(A), 1)),
                BASE.wallKey(new Surroundings("m", launch, Mode.WARM, Optional.of(B), 1)),
                BASE.wallKey(new Surroundings("m", launch, Mode.COLD, Optional.empty(), 2))))
        .doesNotHaveDuplicates();
  }

  @Test
  void leavesOut_theSafetyNetOfAWorkLimit() {
    Optional<Limits.Work> work = Optional.of(new Limits.Work("nodes", 10));

    assertThat(with(Goal.optimise(), new Limits(10, work, 1000_000), Set.of()).workKey(PLATFORM))
        .isEqualTo(
            with(Goal.optimise(), new Limits(99, work, 1000_000), Set.of()).workKey(PLATFORM));
  }

  /** A name in a key would void runs whenever something is renamed; there is no place for one. */
  @Test
  void hasNoPlace_forNamesOfPeoplesMaking() {
    assertThat(KeyParts.class.getRecordComponents())
        .extracting(RecordComponent::getName)
        .containsExactly(
            "model",
            "search",
            "backend",
            "options",
            "seed",
            "threads",
            "goal",
            "limits",
            "evidence");
    assertThat(Surroundings.class.getRecordComponents())
        .extracting(RecordComponent::getName)
        .containsExactly("machineClass", "launch", "mode", "warmUp", "runsAtATime");
  }

  /** The bytes as documented, digested by SHA-256 (FIPS 180-4) and cut to 16 bytes. */
  @Test
  void isTheDigest_ofThePartsInOrder() throws IOException, NoSuchAlgorithmException {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    DataOutputStream out = new DataOutputStream(bytes);
    out.writeInt(1);
    text(out, "work");
    text(out, A.hex());
    out.writeInt(0);
    text(out, A.hex());
    out.writeInt(1);
    text(out, "restarts");
    text(out, "luby");
    out.writeLong(0);
    out.writeInt(1);
    text(out, "OPTIMISE");
    out.writeInt(0);
    out.writeInt(0);
    out.writeLong(0);
    text(out, "wall");
    text(out, "seconds");
    out.writeLong(Double.doubleToLongBits(10));
    out.writeLong(1000_000);
    out.writeInt(0);
    out.writeInt(1);
    text(out, "m");
    text(out, "17");
    byte[] digest = MessageDigest.getInstance("SHA-256").digest(bytes.toByteArray());

    assertThat(BASE.workKey(PLATFORM).hex())
        .isEqualTo(HexFormat.of().formatHex(digest).substring(0, 32));
  }

  private static void text(DataOutputStream out, String text) throws IOException {
    byte[] utf8 = text.getBytes(StandardCharsets.UTF_8);
    out.writeInt(utf8.length);
    out.write(utf8);
  }

  @Test
  void refuses_aWarmProcessWithoutAWarmUp() {
    assertThatIllegalArgumentException()
        .isThrownBy(() -> new Surroundings("m", new TreeMap<>(), Mode.WARM, Optional.empty(), 1))
        .withMessage("a warm process, and no other, has a warm-up instance");
  }
}
