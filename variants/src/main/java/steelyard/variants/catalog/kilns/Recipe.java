package steelyard.variants.catalog.kilns;

import java.util.SplittableRandom;

/**
 * What kind of campaign is made up.
 *
 * @param lots how many, at least 2
 * @param kilns how many, at least 1
 * @param alike how many of the kilns are like the first, itself included
 * @param heats how many temperature classes
 * @param glazes how many glaze families, at least 1
 * @param spoiling percent of the pairs of glazes that spoil each other
 * @param shelves of the smallest kiln
 * @param largest most shelves that a lot fills, at most {@code shelves}
 * @param large percent of the lots that need wide shelves
 * @param wide percent of the shelves that are wide
 * @param twins percent of the lots that are like the one before
 * @param linked percent of the lots that match another or are its second fire
 * @param haste how soon lots are due, in percent of how long the campaign should take: less is
 *     sooner
 * @param slack firings and days beyond those of the plan that shows that there is one
 */
record Recipe(
    int lots,
    int kilns,
    int alike,
    int heats,
    int glazes,
    int spoiling,
    int shelves,
    int largest,
    int large,
    int wide,
    int twins,
    int linked,
    int haste,
    int slack) {
  /** A recipe for two to four lots, a different one for most seeds. */
  static Recipe smallest(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    int kilns = random.nextInt(1, 3);
    return new Recipe(
        random.nextInt(2, 5),
        kilns,
        kilns == 2 ? random.nextInt(1, 3) : 1,
        random.nextInt(1, 3),
        random.nextInt(1, 5),
        50,
        random.nextInt(3, 7),
        3,
        30,
        50,
        40,
        30,
        random.nextInt(20, 100),
        0);
  }
}
