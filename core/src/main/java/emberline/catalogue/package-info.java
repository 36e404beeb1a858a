/**
 * The definitions as data: features with their windows, published relations, gravity thresholds and
 * the papers they come from. It reads the product's own tables (and a user's, in the same format),
 * checks them on load, and converts printed units and media to micron in vacuum once, here. It
 * measures nothing.
 */
package emberline.catalogue;
