package steelyard.variants.catalog.dispatch;

/** What the plain model calls its variables and groups. */
final class Names {
  static final String TOURS = "one tour for each truck";
  static final String FROM_WORKS = "a tour begins at the works";
  static final String DELIVERED = "an order is delivered once";
  static final String LOADS = "no truck takes too much";
  static final String TIMES = "a truck is there in time";
  static final String IDLE = "no time where no truck goes";

  private Names() {}

  /** Where the truck goes from the stop; the stop itself where it does not call there. */
  static String next(int truck, int stop) {
    return "next[" + truck + "." + stop + "]";
  }

  /** When unloading begins at the stop; when it opens where no truck goes. */
  static String begin(int stop) {
    return "begin[" + stop + "]";
  }

  /** Whether the truck calls at the stop; at the works: whether it goes out. */
  static String calls(int truck, int stop) {
    return "calls[" + truck + "." + stop + "]";
  }

  /** Whether no truck calls at the stop, and a carrier goes. */
  static String left(int stop) {
    return "left[" + stop + "]";
  }

  /** What the truck's way from the stop costs. */
  static String cost(int truck, int stop) {
    return "cost[" + truck + "." + stop + "]";
  }
}
