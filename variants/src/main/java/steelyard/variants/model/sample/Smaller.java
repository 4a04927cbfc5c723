package steelyard.variants.model.sample;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Term;

/** Makes a sketch smaller for as long as something stays true of it. */
public final class Smaller {
  private Smaller() {}

  /**
   * A sketch of which {@code faulty} is true, and of no step smaller than it.
   *
   * @param sketch one of which it is true
   */
  public static Sketch smallest(Sketch sketch, Predicate<Sketch> faulty) {
    Sketch small = sketch;
    Optional<Sketch> next = Optional.of(sketch);
    while (next.isPresent()) {
      small = next.get();
      next = steps(small).filter(RandomSketches::isAdmitted).filter(faulty).findFirst();
    }
    return small;
  }

  /** Boldest first. */
  private static Stream<Sketch> steps(Sketch s) {
    Stream<Sketch> without =
        IntStream.range(0, s.postings().size()).mapToObj(i -> with(s, replaced(s.postings(), i)));
    Stream<Sketch> aimless =
        s.objective().stream()
            .map(o -> new Sketch(s.decisions(), s.definitions(), s.postings(), Optional.empty()));
    Stream<Sketch> undefined =
        s.definitions().isEmpty() ? Stream.empty() : Stream.of(withoutLastDefinition(s));
    Stream<Sketch> parts =
        IntStream.range(0, s.postings().size())
            .boxed()
            .flatMap(
                i ->
                    parts(s.postings().get(i))
                        .map(part -> with(s, replaced(s.postings(), i, part))));
    Stream<Sketch> plainer =
        IntStream.range(0, s.definitions().size())
            .filter(i -> !s.definitions().get(i).equals(ZERO))
            .mapToObj(
                i ->
                    new Sketch(
                        s.decisions(),
                        replaced(s.definitions(), i, ZERO),
                        s.postings(),
                        s.objective()));
    Stream<Sketch> narrower =
        IntStream.range(0, s.decisions().size())
            .boxed()
            .flatMap(
                i ->
                    narrower(s.decisions().get(i))
                        .map(
                            domain ->
                                new Sketch(
                                    replaced(s.decisions(), i, domain),
                                    s.definitions(),
                                    s.postings(),
                                    s.objective())));
    return Stream.of(without, aimless, undefined, parts, plainer, narrower).flatMap(all -> all);
  }

  private static final Sketch.Defining ZERO = new Sketch.Defining.ByTerm(new Term.Constant(0));

  private static Sketch with(Sketch s, List<Formula> postings) {
    return new Sketch(s.decisions(), s.definitions(), postings, s.objective());
  }

  /** Refused where something still mentions it. */
  private static Sketch withoutLastDefinition(Sketch s) {
    List<Sketch.Defining> fewer = s.definitions().subList(0, s.definitions().size() - 1);
    return new Sketch(s.decisions(), fewer, s.postings(), s.objective());
  }

  private static Stream<Formula> parts(Formula formula) {
    if (formula instanceof Formula.All it) {
      return parts(it.parts(), Formula::all);
    } else if (formula instanceof Formula.Any it) {
      return parts(it.parts(), Formula::any);
    } else if (formula instanceof Formula.Not it) {
      return Stream.concat(Stream.of(it.part()), parts(it.part()).map(Formula::not));
    } else if (formula instanceof Formula.Iff it) {
      Stream<Formula> sides = Stream.of(it.left(), it.right());
      Stream<Formula> left = parts(it.left()).map(part -> part.iff(it.right()));
      Stream<Formula> right = parts(it.right()).map(part -> it.left().iff(part));
      return Stream.of(sides, left, right).flatMap(all -> all);
    }
    return Stream.empty();
  }

  private static Stream<Formula> parts(
      List<Formula> parts, java.util.function.Function<List<Formula>, Formula> join) {
    Stream<Formula> fewer =
        IntStream.range(0, parts.size()).mapToObj(i -> join.apply(replaced(parts, i)));
    Stream<Formula> deeper =
        IntStream.range(0, parts.size())
            .boxed()
            .flatMap(i -> parts(parts.get(i)).map(part -> join.apply(replaced(parts, i, part))));
    return Stream.of(parts.stream(), fewer, deeper).flatMap(all -> all);
  }

  private static Stream<Domain> narrower(Domain domain) {
    if (domain.size() == 1) {
      return Stream.empty();
    }
    return domain.stream()
        .mapToObj(left -> Domain.of(domain.stream().filter(value -> value != left)));
  }

  private static <T> List<T> replaced(List<T> list, int index, T by) {
    List<T> copy = new ArrayList<>(list);
    copy.set(index, by);
    return copy;
  }

  private static <T> List<T> replaced(List<T> list, int index) {
    List<T> copy = new ArrayList<>(list);
    copy.remove(index);
    return copy;
  }
}
