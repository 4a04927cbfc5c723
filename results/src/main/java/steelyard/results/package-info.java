/** What runs say: the ledger, statistics over it, decisions and the brief. */
package steelyard.results;
