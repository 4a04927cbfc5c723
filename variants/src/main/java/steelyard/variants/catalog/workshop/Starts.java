package steelyard.variants.catalog.workshop;

import java.util.function.Function;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.View;

/** The start variables of a workshop's operations, and what is said with them. */
final class Starts {
  private final Workshop workshop;
  private final Function<String, IntVar> byName;

  Starts(Workshop workshop, Function<String, IntVar> byName) {
    this.workshop = workshop;
    this.byName = byName;
  }

  IntVar of(int mould, int step) {
    return byName.apply(Names.start(mould, step));
  }

  IntVar of(Visit visit) {
    return of(visit.mould(), visit.step());
  }

  View end(int mould, int step) {
    return of(mould, step).shifted(workshop.mould(mould).minutes(step));
  }

  View end(Visit visit) {
    return of(visit).shifted(visit.minutes());
  }

  /** One visit ends before the other starts. */
  Formula before(Visit one, Visit other) {
    return end(one).le(of(other));
  }

  /** All of them, by mould and step. */
  Stream<IntVar> all() {
    return IntStream.range(0, workshop.moulds().size())
        .boxed()
        .flatMap(
            m ->
                IntStream.rangeClosed(0, workshop.mould(m).lastStep())
                    .mapToObj(step -> of(m, step)));
  }
}
