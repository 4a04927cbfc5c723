/** Carries blocks out on this machine. */
package steelyard.harness.local;
