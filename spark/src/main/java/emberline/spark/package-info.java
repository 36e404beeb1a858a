/**
 * The chain over a table of spectra in Parquet, on Apache Spark: the same call of the core on every
 * row, in the workers of a cluster or in one process. In a profile of its own; nothing else uses
 * it.
 */
package emberline.spark;
