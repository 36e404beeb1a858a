/** Type and extinction fitted together, for objects seen through dust. */
package emberline.place.reddening;
