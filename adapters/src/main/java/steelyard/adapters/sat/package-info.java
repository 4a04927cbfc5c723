/** Models as clauses, solved by Sat4j in this process. */
package steelyard.adapters.sat;
