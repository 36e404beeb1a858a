/**
 * An observation becomes a prepared spectrum: vacuum, known noise, known resolving power, with a
 * finding for every assumption made on the way. It knows no catalogue.
 */
package emberline.prepare;
