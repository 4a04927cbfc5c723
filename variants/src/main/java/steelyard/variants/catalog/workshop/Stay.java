package steelyard.variants.catalog.workshop;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import steelyard.variants.family.Answer;

/** A mould at a station from one minute to another, as a plan has it. */
record Stay(int mould, int from, int to) {

  /** The stays at {@code station} in order of time. */
  static List<Stay> at(int station, Workshop workshop, Answer answer) {
    List<Stay> stays = new ArrayList<>();
    for (Visit visit : workshop.visits(station)) {
      int from = answer.value(Names.start(visit.mould(), visit.step()));
      stays.add(new Stay(visit.mould(), from, from + visit.minutes()));
    }
    stays.sort(Comparator.comparingInt(Stay::from));
    return stays;
  }

  int minutes() {
    return to - from;
  }

  /** How many of its minutes lie in {@code start..end}. */
  int minutesWithin(long start, long end) {
    return (int) Math.max(0, Math.min(to, end) - Math.max(from, start));
  }
}
