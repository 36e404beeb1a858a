package emberline.measure.line;

/**
 * The velocity of one line.
 *
 * @param species the atom, e.g. {@code K I}
 * @param restMicron wavelength at rest (micron, vacuum)
 * @param kms velocity (km/s, positive away from us)
 * @param sigmaKms one-sigma error (km/s) from the noise, widened where the fit is worse than the
 *     noise
 * @param signal depth of the line in units of its error
 */
public record LineVelocity(
        String species, double restMicron, double kms, double sigmaKms, double signal) {}
