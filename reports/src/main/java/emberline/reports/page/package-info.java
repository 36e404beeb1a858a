/**
 * The report of an object as a PDF of two pages, sometimes three: the first says what the object
 * is, how sure that is and why; the others let it be checked.
 */
package emberline.reports.page;
