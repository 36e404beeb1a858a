/**
 * What goes into a discovery note beside the reports: the table of results as ECSV, as VOTable, as
 * a machine-readable journal table and as LaTeX; the papers behind it as BibTeX; a paragraph on the
 * methods. All cells are those of {@code results.csv}, to the printed digit.
 */
package emberline.reports.note;
