/**
 * Solver programs that read and write open formats, run as child processes through {@link
 * steelyard.adapters.spi.Programs}.
 */
package steelyard.adapters.program;
