/**
 * Random small models for checking that everything agrees on them: drawn from a seed, small enough
 * to try every assignment, and made smaller for as long as a fault stays.
 */
package steelyard.variants.model.sample;
