package emberline.read;

import java.util.OptionalLong;

/**
 * Spectra of a packed file.
 *
 * @param hdu the HDU in which they stand
 * @param rows number of its rows, each a spectrum; empty where the HDU is one spectrum
 */
record PackedRange(int hdu, OptionalLong rows) {}
