/**
 * The survey page: all objects of a run in one HTML file that works from disk without a network.
 */
package emberline.reports.survey;
