/**
 * The dispatch yard of the Marrowdale Tileworks. Trucks take pallets of tiles to builders' yards:
 * each leaves the works once, calls at some yards while these are open, and is back before its
 * shift ends. An order that no truck takes goes by a hired carrier, for a fee. Who takes what, in
 * which order, at least cost? This is vehicle routing with time windows and optional stops (Solomon
 * 1987, "Algorithms for the vehicle routing and scheduling problems with time window constraints",
 * Operations Research 35(2):254-265; the stops that may be left out after Balas 1989, "The prize
 * collecting traveling salesman problem", Networks 19:621-636).
 */
package steelyard.variants.catalog.dispatch;
