/**
 * What the lines of one spectrum say: equivalent widths that were seen, or limits where nothing was
 * seen, and the radial velocity from the centres of the lines.
 */
package emberline.measure.line;
