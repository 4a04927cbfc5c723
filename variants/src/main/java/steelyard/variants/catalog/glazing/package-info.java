/**
 * The glazing line of the Marrowdale Tileworks. Tiles of many kinds pass one after the other; some
 * get a brush line, a stamp, a second glaze, a trip to the hand painters. Whoever does that keeps
 * up with at most so many of any so many tiles in a row. In which order do the tiles come? This is
 * car sequencing (Parrello, Kabat &amp; Wos 1986), problem 1 of CSPLib: tiles are cars, treatments
 * are options. The line can also have glazes to change between, which costs, and treatments that
 * may be overrun at a price, as in Solnon, Cung, Nguyen &amp; Artigues (2008), "The car sequencing
 * problem: overview of state-of-the-art methods and industrial case-study of the ROADEF'2005
 * challenge problem", European Journal of Operational Research 191(3):912-927.
 */
package steelyard.variants.catalog.glazing;
