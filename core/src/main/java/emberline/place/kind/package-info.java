/**
 * What kind of object a spectrum shows: a late dwarf, or a giant, an earlier star, a carbon star, a
 * reddened star of the background, a galaxy or quasar, or nothing that is known here; and which
 * reference objects are nearest to it.
 */
package emberline.place.kind;
