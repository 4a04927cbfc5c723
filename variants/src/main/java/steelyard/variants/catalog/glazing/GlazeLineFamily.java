package steelyard.variants.catalog.glazing;

import java.io.IOException;
import java.util.List;
import steelyard.variants.family.Amendment;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;
import steelyard.variants.family.Family;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.build.Draft;

/** Car sequencing on the glazing line: in which order do the tiles of a day come? */
public final class GlazeLineFamily implements Family<GlazeLine> {
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
}
