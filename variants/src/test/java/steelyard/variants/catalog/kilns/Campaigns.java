package steelyard.variants.catalog.kilns;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalInt;
import java.util.OptionalLong;
import steelyard.variants.family.Answer;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.Ints;

/** Campaigns from text, from the instances that are shipped, and one made by hand. */
final class Campaigns {
  static final Path SHIPPED = Path.of("src/main/share/instances/kiln-campaigns");

  private Campaigns() {}

  static Campaign read(Path folder, String... lines) {
    try {
      Path file = Files.write(folder.resolve("text"), List.of(lines));
      return CampaignReader.read(new InstanceSource("text", file));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static Campaign shipped(String name) {
    try {
      return CampaignReader.read(new InstanceSource(name, SHIPPED.resolve(name)));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Three lots and two kilns that are easily followed by hand. */
  static Campaign byHand() {
    return new Campaign(
        new Works(100, 9, 1, 3, 1),
        List.of(new Heat(1, 1, 2), new Heat(2, 1, 3)),
        List.of(Ints.of(0, 4), Ints.of(3, 0)),
        List.of(
            new Glaze("clear", Glaze.Kind.PLAIN),
            new Glaze("copper", Glaze.Kind.FUMING),
            new Glaze("white", Glaze.Kind.PALE)),
        List.of(new Pair(1, 2)),
        List.of(
            new Kiln("A", 4, 2, 2, 1, 2, 2, 1, Ints.of(5, 7), List.of()),
            new Kiln("B", 3, 3, 1, 1, 1, 2, 2, Ints.of(4), List.of(new Kiln.Repair(2, 3)))),
        List.of(
            new Lot("L1", 2, true, 1, 1, 1, 0, 2, 3, OptionalInt.of(6)),
            new Lot("L2", 2, false, 1, 2, 0, 1, 4, 2, OptionalInt.empty()),
            new Lot("L3", 1, false, 1, 1, 2, 0, 3, 1, OptionalInt.empty())),
        List.of(),
        List.of(new SecondFire(0, 1, 1)));
  }

  /**
   * L1 and then, hot, L2 in kiln A; L3 in kiln B, after its repair and when there is gas. Fuel 5 +
   * 7 + 4, a change for 2 * 4, L2 two days late at 2 and L3 four days late at 1: 32.
   */
  static Plan planByHand() {
    return new Plan(Ints.of(0, 1, 2), Ints.of(1, 2, 1, 0), Ints.of(0, 3, 5, 0));
  }

  /** The plan as an answer of the plain model. */
  static Answer answer(Campaign campaign, Plan plan) {
    Answer decisions = new Answer(plan.decisions(campaign), OptionalLong.empty());
    return new Answer(decisions.values(), CampaignChecker.check(campaign, decisions).objective());
  }
}
