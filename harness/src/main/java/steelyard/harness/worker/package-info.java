/**
 * The main class of child processes, and what the harness and they say to each other. The only
 * place that loads families and solvers; starts fast: streaming JSON only, no command line, YAML or
 * SQL on its path.
 */
package steelyard.harness.worker;
