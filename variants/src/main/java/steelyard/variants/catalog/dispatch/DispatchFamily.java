package steelyard.variants.catalog.dispatch;

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

/**
 * Vehicle routing with optional stops: which truck takes which pallets to which yards, and when?
 */
public final class DispatchFamily
    implements Featured<Dispatch>,
        Generating<Dispatch>,
        Shrinking<Dispatch>,
        Hinting<Dispatch>,
        Recalling<Dispatch> {
  @Override
  public String name() {
    return "dispatch";
  }

  @Override
  public String summary() {
    return "which truck takes which pallets to which yards and when, so that it costs least";
  }

  @Override
  public Dispatch read(InstanceSource source) throws IOException {
    return DispatchReader.read(source);
  }

  @Override
  public void plain(Dispatch day, Draft draft) {
    PlainDispatch.write(day, draft);
  }

  @Override
  public List<Amendment<Dispatch>> amendments() {
    return DispatchAmendments.all();
  }

  @Override
  public Check check(Dispatch day, Answer answer) {
    return DispatchChecker.check(day, answer);
  }

  @Override
  public String show(Dispatch day, Answer answer) {
    return TourSheet.of(day, answer);
  }

  @Override
  public SortedMap<String, Double> features(Dispatch day) {
    return DayFeatures.of(day);
  }

  @Override
  public String generate(long seed) {
    return DispatchText.of(
        DayGenerator.of(DayRecipe.smallest(seed), seed), "Made up from seed " + seed);
  }

  @Override
  public Stream<String> shrink(Dispatch day) {
    return DayShrinker.of(day).map(smaller -> DispatchText.of(smaller, "Made smaller"));
  }

  @Override
  public SortedMap<String, Integer> hint(Dispatch before, Answer plan, Dispatch now) {
    return EarlierTours.hint(before, plan, now);
  }

  @Override
  public KnownSolution recall(Dispatch day, InstanceSource file) throws IOException {
    return BookedTours.read(day, file);
  }
}
