package steelyard.variants.catalog.workshop;

import java.util.ArrayList;
import java.util.List;

/** Visits of two moulds to one station; {@code one} is of the lower mould number. */
record Pair(Visit one, Visit other) {

  /** Every pair, by station. Two visits of the same mould are in order by its route. */
  static List<Pair> all(Workshop workshop) {
    List<Pair> pairs = new ArrayList<>();
    for (int station = 0; station < workshop.stations(); station++) {
      List<Visit> visits = workshop.visits(station);
      for (int i = 0; i < visits.size(); i++) {
        for (int j = i + 1; j < visits.size(); j++) {
          if (visits.get(i).mould() != visits.get(j).mould()) {
            pairs.add(new Pair(visits.get(i), visits.get(j)));
          }
        }
      }
    }
    return pairs;
  }
}
