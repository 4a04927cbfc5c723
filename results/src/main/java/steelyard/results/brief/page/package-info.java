/** The brief as files: one HTML page, one JSON object, one plain text, all from the same facts. */
package steelyard.results.brief.page;
