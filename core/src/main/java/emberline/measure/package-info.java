/**
 * A prepared spectrum and the catalogue become measurements: window means by fractional pixels,
 * indices with one-sigma and covariance, or the reason why a feature was not measured.
 */
package emberline.measure;
