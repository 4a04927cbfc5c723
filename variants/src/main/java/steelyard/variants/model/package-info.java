/**
 * The internal model as data: variables, views, atoms, relations, formulas, postings, objective,
 * branching. Building, normalising and judging live in packages of their own.
 */
package steelyard.variants.model;
