/**
 * Reading files that people write: every value knows its line and column, and every mistake is said
 * with its place, what was found and what is allowed.
 */
package steelyard.harness.sweep.text;
