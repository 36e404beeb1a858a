/**
 * Charts as values: what is shown, not how it is drawn. A builder per chart takes the result of an
 * object and returns a {@link emberline.reports.chart.Chart}; a painter draws it.
 */
package emberline.reports.chart;
