package steelyard.variants.catalog.kilns;

/** What the plain model calls its groups. */
final class Groups {
  static final String EACH_LOT_ONCE = "each lot in one firing";
  static final String AT_ITS_HEAT = "lots at their temperature";
  static final String NO_EMPTY_FIRING = "no firing without a lot";
  static final String IN_ORDER = "firings in order, none left out";
  static final String SHELVES = "shelves of a firing";
  static final String WIDE_SHELVES = "wide shelves for large tiles";
  static final String SPOILERS_APART = "glazes that spoil each other apart";
  static final String PALE_AFTER_FUMING = "no pale glaze right after a fuming one";
  static final String TOGETHER = "matching lots out of one firing";
  static final String CYCLE = "firing and cooling take their days";
  static final String OPENED_FIRST = "a kiln is opened before it is loaded again";
  static final String UNLIT = "an unlit firing waits at the end";
  static final String DRY = "not before the glaze is dry";
  static final String OUT = "a lot comes out when its kiln is opened";
  static final String SECOND_FIRE = "second fire after the first";
  static final String LATEST = "out by the day the ship sails";
  static final String REPAIRS = "no firing during repairs";
  static final String CREW = "no more kilns loaded a day than the crew can";
  static final String GAS = "gas main";
  static final String CHANGES = "cost of changing the temperature";
  static final String STEPS = "no hotter step than the lining bears";
  static final String RELINING = "hottest firings before relining";

  private Groups() {}
}
