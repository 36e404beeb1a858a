/** Comparison with standard spectra: the nearest single one, and the best sum of two. */
package emberline.place.standard;
