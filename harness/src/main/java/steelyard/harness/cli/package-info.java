/** Commands: what a person types, what they read. */
package steelyard.harness.cli;
