/**
 * A file becomes an {@code Observation}: one class per format, chosen by content. It converts units
 * and orders pixels, but does not touch the medium, the rest frame or the noise, and it knows no
 * catalogue. A candidate list becomes candidates.
 */
package emberline.read;
