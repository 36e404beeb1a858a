/**
 * Metallicity classes of M dwarfs by the published recalibrations of zeta, side by side: the
 * strength of TiO for that of CaH, in the optical.
 */
package emberline.place.metallicity;
