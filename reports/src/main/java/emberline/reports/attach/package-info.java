/**
 * Results as files that other programs read: the columns of the results table, JSON of an object
 * and of a run, tables for a terminal, and safe file names. One definition of each column serves
 * all formats, so that numbers agree to the printed digit.
 */
package emberline.reports.attach;
