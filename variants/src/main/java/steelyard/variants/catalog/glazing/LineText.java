package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/** Writes a line as {@link GlazeLineReader} reads it. */
final class LineText {
  private LineText() {}

  /** The text of the file, a comment first. */
  static String of(GlazeLine line, String comment) {
    List<Treatment> treatments = line.treatments();
    List<String> text = new ArrayList<>();
    text.add("# " + comment);
    text.add(line.slots() + " " + treatments.size() + " " + line.kinds().size());
    text.add(words(treatments.stream().mapToInt(Treatment::most)));
    text.add(words(treatments.stream().mapToInt(Treatment::window)));
    for (int k = 0; k < line.kinds().size(); k++) {
      Kind kind = line.kinds().get(k);
      IntStream bits = IntStream.range(0, treatments.size()).map(t -> kind.needs(t) ? 1 : 0);
      text.add(k + " " + kind.tiles() + " " + words(bits));
    }
    if (line.hasGlazes()) {
      text.add("glaze " + words(line.glazes().stream()));
      text.add("change " + line.changeCost());
      text.add("run " + line.longestRun());
    }
    if (!line.pricedTreatments().isEmpty()) {
      text.add("excess " + words(treatments.stream().mapToInt(Treatment::excess)));
    }
    return String.join("\n", text) + "\n";
  }

  private static String words(IntStream numbers) {
    return numbers.mapToObj(Integer::toString).collect(Collectors.joining(" "));
  }
}
