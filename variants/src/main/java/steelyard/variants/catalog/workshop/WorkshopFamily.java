package steelyard.variants.catalog.workshop;

import java.io.IOException;
import java.util.List;
import steelyard.variants.family.Amendment;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;
import steelyard.variants.family.Family;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.build.Draft;

/** Job-shop scheduling in the mould shop: moulds go from station to station. */
public final class WorkshopFamily implements Family<Workshop> {
  @Override
  public String name() {
    return "workshop";
  }

  @Override
  public String summary() {
    return "when each mould is at each station of the mould shop, so that all are done early";
  }

  @Override
  public Workshop read(InstanceSource source) throws IOException {
    return WorkshopReader.read(source);
  }

  @Override
  public void plain(Workshop workshop, Draft draft) {
    PlainWorkshop.write(workshop, draft);
  }

  @Override
  public List<Amendment<Workshop>> amendments() {
    return WorkshopAmendments.all();
  }

  @Override
  public Check check(Workshop workshop, Answer answer) {
    return WorkshopChecker.check(workshop, answer);
  }

  @Override
  public String show(Workshop workshop, Answer answer) {
    return PlanSheet.of(workshop, answer);
  }
}
