/** What is compared: the internal model, families of problems, their instances and formats. */
package steelyard.variants;
