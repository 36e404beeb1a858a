/**
 * The values that all steps share: a spectrum, its medium and resolving power, a spectral type, a
 * candidate of a list, a finding; and a keeper of what was made for them lately. Nothing here
 * reads, measures or decides; nothing here depends on another package of the product.
 */
package emberline.spectrum;
