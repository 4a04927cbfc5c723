package pallets;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;

/** One day's delivery: how many trucks there are, what one may carry, what each pallet weighs. */
record Delivery(int trucks, int capacity, List<Integer> weights) {
  Delivery {
    weights = List.copyOf(weights);
  }

  int pallets() {
    return weights.size();
  }

  long totalWeight() {
    return weights.stream().mapToLong(Integer::longValue).sum();
  }

  /** Reads {@code trucks N}, {@code capacity KG} and a line {@code pallet KG} for each pallet. */
  static Delivery read(InstanceSource source) throws IOException {
    int trucks = 0;
    int capacity = 0;
    List<Integer> weights = new ArrayList<>();
    int line = 0;
    for (String text : source.lines()) {
      line++;
      String[] words = text.strip().split("\\s+", -1);
      if (words[0].isEmpty() || words[0].startsWith("#")) {
        continue;
      }
      switch (words[0]) {
        case "trucks" -> trucks = number(source, line, words, 100);
        case "capacity" -> capacity = number(source, line, words, 100_000);
        case "pallet" -> weights.add(number(source, line, words, 100_000));
        default ->
            throw InstanceException.at(
                source, line, "'" + words[0] + "' is none of trucks, capacity, pallet");
      }
    }
    if (trucks == 0 || capacity == 0 || weights.isEmpty()) {
      throw InstanceException.at(source, line, "needs trucks, capacity and a pallet at least");
    }
    return new Delivery(trucks, capacity, weights);
  }

  private static int number(InstanceSource source, int line, String[] words, int most) {
    try {
      int number = words.length == 2 ? Integer.parseInt(words[1]) : 0;
      if (number >= 1 && number <= most) {
        return number;
      }
    } catch (NumberFormatException e) {
      // said below
    }
    throw InstanceException.at(
        source, line, "expected '" + words[0] + " N' with N in 1.." + most);
  }
}
