/**
 * The reference table: what the product measured on spectra of known type, gravity and kind. The
 * calibrated witnesses learn from it. It holds index values with errors and the source of each
 * label, never pixels.
 */
package emberline.place.reference;
