/** Run records and the store that keeps them: append-only, durable, read by the reports. */
package steelyard.results.ledger;
