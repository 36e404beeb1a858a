/**
 * An invented survey of cool dwarfs: a band-and-line model of their spectra, a model of the
 * observation, and the files that come of both. Nothing here is used by the product; it makes the
 * demonstration data and serves the tests.
 */
package emberline.demo;
