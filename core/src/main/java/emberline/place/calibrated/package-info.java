/**
 * The second witness: what spectra of known type look like to this program. Every feature has a
 * locus, its mean against type with a shift for low gravity and a scatter; the loci and the
 * correlation of their residuals are the calibration, which is learned from the reference table and
 * turns measurements into a posterior over type and gravity class.
 */
package emberline.place.calibrated;
