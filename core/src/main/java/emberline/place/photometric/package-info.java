/**
 * Types from colours, for candidates without a spectrum: colours of late dwarfs by type and gravity
 * class, with their scatter, against the magnitudes of an object; giants, earlier stars and
 * interstellar dust as alternatives.
 */
package emberline.place.photometric;
