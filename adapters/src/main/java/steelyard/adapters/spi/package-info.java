/** The contract between the harness and every backend, and what backends share. */
package steelyard.adapters.spi;
