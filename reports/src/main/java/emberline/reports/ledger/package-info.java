/**
 * The ledger of a run: one database file in the folder of a run with one record for each object,
 * from which the files of the run are written. It goes in and out as texts of the results table;
 * how a run goes on after a stop is decided elsewhere. It stands beside the tables, and not in the
 * computation, because the database engine brings native code.
 */
package emberline.reports.ledger;
