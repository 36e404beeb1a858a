/**
 * Measurements become a placement: the spectral type by published relations, the gravity class by
 * published scores, the activity by H alpha, with probabilities where noise is carried through.
 */
package emberline.place;
