/**
 * Charts as SVG fragments for a page: drawn by the chart library, then freed of everything that
 * belongs to a stand-alone picture. Colours are left to the page's style sheet, which knows whether
 * it is dark; text is text, so that no font is needed to draw it.
 */
package steelyard.results.brief.chart;
