/** Whether a spectrum may be the blend of two dwarfs: published spectral-blend criteria. */
package emberline.place.pair;
