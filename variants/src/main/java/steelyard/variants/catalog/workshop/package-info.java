/**
 * The mould shop of the Marrowdale Tileworks. Tiles are pressed in steel moulds, and worn moulds
 * come back to be renewed: each goes from station to station (cutting, boring, lining, hardening,
 * polishing, ...) in an order of its own, and a station takes one mould at a time. When is
 * everything done, at the earliest? This is job-shop scheduling: moulds are jobs, stations are
 * machines.
 */
package steelyard.variants.catalog.workshop;
