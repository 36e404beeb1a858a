package emberline.place.standard;

import emberline.prepare.PreparedSpectrum;

/**
 * A spectrum of known type to compare with.
 *
 * @param name its name
 * @param typeNumber its type (M0 = 0, L0 = 10, T0 = 20, Y0 = 30)
 * @param prepared the spectrum
 */
public record Standard(String name, double typeNumber, PreparedSpectrum prepared) {}
