package steelyard.variants.catalog.glazing;

import java.io.IOException;
import java.util.List;
import java.util.SortedMap;
import java.util.stream.Stream;
import steelyard.variants.family.Amendment;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;
import steelyard.variants.family.Featured;
import steelyard.variants.family.Generating;
import steelyard.variants.family.Hinting;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.KnownSolution;
import steelyard.variants.family.Recalling;
import steelyard.variants.family.Shrinking;
import steelyard.variants.model.build.Draft;

/** Car sequencing on the glazing line: in which order do the tiles of a day come? */
public final class GlazeLineFamily
    implements Featured<GlazeLine>,
        Generating<GlazeLine>,
        Shrinking<GlazeLine>,
        Hinting<GlazeLine>,
        Recalling<GlazeLine> {
  @Override
  public String name() {
    return "glaze-line";
  }

  @Override
  public String summary() {
    return "in which order tiles pass the glazing line, so that every treatment keeps up";
  }

  @Override
  public GlazeLine read(InstanceSource source) throws IOException {
    return GlazeLineReader.read(source);
  }

  @Override
  public void plain(GlazeLine line, Draft draft) {
    PlainGlazeLine.write(line, draft);
  }

  @Override
  public List<Amendment<GlazeLine>> amendments() {
    return GlazeLineAmendments.all();
  }

  @Override
  public Check check(GlazeLine line, Answer answer) {
    return GlazeLineChecker.check(line, answer);
  }

  @Override
  public String show(GlazeLine line, Answer answer) {
    return LineSheet.of(line, answer);
  }

  @Override
  public SortedMap<String, Double> features(GlazeLine line) {
    return LineFeatures.of(line);
  }

  @Override
  public String generate(long seed) {
    return LineText.of(LineGenerator.smallest(seed), "Made up from seed " + seed);
  }

  @Override
  public Stream<String> shrink(GlazeLine line) {
    return LineShrinker.of(line).map(smaller -> LineText.of(smaller, "Made smaller"));
  }

  @Override
  public SortedMap<String, Integer> hint(GlazeLine before, Answer plan, GlazeLine now) {
    return EarlierOrder.hint(before, plan, now);
  }

  @Override
  public KnownSolution recall(GlazeLine line, InstanceSource file) throws IOException {
    return BookedOrder.read(line, file);
  }
}
