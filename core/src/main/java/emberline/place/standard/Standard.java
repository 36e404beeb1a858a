package emberline.place.standard;

import emberline.prepare.PreparedSpectrum;

/**
 * A spectrum of known type to compare with.
 *
 * @param name its name
 * @param typeNumber its type (M0 = 0, L0 = 10, T0 = 20, Y0 = 30)
 * @param group the name that all spectra of the same object share; an object is never compared with
 *     itself
 * @param sha256 checksum of its file, hexadecimal; empty where there is no file
 * @param prepared the spectrum
 */
public record Standard(
        String name, double typeNumber, String group, String sha256, PreparedSpectrum prepared) {}
