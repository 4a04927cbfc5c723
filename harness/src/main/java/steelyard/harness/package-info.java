/** How runs are made: sweeps, processes, workers, audits and commands. */
package steelyard.harness;
