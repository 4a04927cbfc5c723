/** The interface that users implement: a family of problems, its instances and its amendments. */
package steelyard.variants.family;
