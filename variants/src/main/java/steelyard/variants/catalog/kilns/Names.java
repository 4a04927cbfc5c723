package steelyard.variants.catalog.kilns;

/** What the plain model calls its variables. */
final class Names {
  private Names() {}

  static String in(Lot lot, Firing firing) {
    return "in[" + lot.name() + "," + firing.name() + "]";
  }

  static String heat(Firing firing) {
    return "heat[" + firing.name() + "]";
  }

  static String start(Firing firing) {
    return "start[" + firing.name() + "]";
  }

  static String end(Firing firing) {
    return "end[" + firing.name() + "]";
  }

  static String change(Firing firing) {
    return "change[" + firing.name() + "]";
  }

  static String lit(Firing firing, int heat) {
    return "lit[" + firing.name() + "," + heat + "]";
  }

  static String out(Lot lot) {
    return "out[" + lot.name() + "]";
  }

  static String late(Lot lot) {
    return "late[" + lot.name() + "]";
  }
}
