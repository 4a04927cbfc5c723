package steelyard.variants.catalog.workshop;

import java.util.ArrayList;
import java.util.List;
import steelyard.variants.model.Domain;

/**
 * Moulds to renew and how many stations there are.
 *
 * @param stations at least 1
 * @param moulds at least 1; all minutes together are at most {@link Domain#LIMIT}
 */
record Workshop(int stations, List<Mould> moulds) {
  Workshop {
    moulds = List.copyOf(moulds);
    if (stations < 1 || moulds.isEmpty()) {
      throw new IllegalArgumentException(
          moulds.size() + " moulds and " + stations + " stations; at least one of each is needed");
    }
    long total = 0;
    for (Mould mould : moulds) {
      for (Operation operation : mould.route()) {
        total += operation.minutes();
        if (operation.station() >= stations) {
          throw new IllegalArgumentException(
              "station " + operation.station() + " of stations 0.." + (stations - 1));
        }
      }
    }
    if (total > Domain.LIMIT) {
      throw new IllegalArgumentException(
          "all minutes together are "
              + total
              + ", more than 10^9; give the minutes in a larger unit");
    }
  }

  Mould mould(int index) {
    return moulds.get(index);
  }

  /** The operations that hold {@code station}, by mould and step. */
  List<Visit> visits(int station) {
    List<Visit> visits = new ArrayList<>();
    for (int m = 0; m < moulds.size(); m++) {
      Mould mould = moulds.get(m);
      for (int step = 0; step <= mould.lastStep(); step++) {
        Operation operation = mould.route().get(step);
        if (operation.station() == station && operation.minutes() > 0) {
          visits.add(new Visit(m, step, mould.head(step), operation.minutes(), mould.tail(step)));
        }
      }
    }
    return visits;
  }
}
