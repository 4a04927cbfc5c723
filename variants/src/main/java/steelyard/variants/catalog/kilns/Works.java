package steelyard.variants.catalog.kilns;

/**
 * What the kilns share.
 *
 * @param day the works' own number of the campaign's first day
 * @param days how many days the campaign has; every kiln is opened by then
 * @param crew how many kilns can be loaded and lit on a day
 * @param gas what the gas main gives on a day
 * @param step a kiln's heat rises by at most so many classes from one firing to the next
 */
record Works(int day, int days, int crew, int gas, int step) {
  Works withDays(int other) {
    return new Works(day, other, crew, gas, step);
  }
}
