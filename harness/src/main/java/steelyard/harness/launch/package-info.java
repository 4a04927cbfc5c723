/** How workers are launched: what is installed, which class path, what code they run. */
package steelyard.harness.launch;
