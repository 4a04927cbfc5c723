/** Plain text files of numbers, as the families' readers share them. */
package steelyard.variants.catalog.text;
