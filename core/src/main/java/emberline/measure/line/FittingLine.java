package emberline.measure.line;

import emberline.prepare.Preparer;

/**
 * A line whose centre can be fitted on a spectrum of some resolving power.
 *
 * @param species the atom, e.g. {@code K I}
 * @param restMicron wavelength at rest (micron, vacuum)
 * @param emits whether the line is looked for in emission: late dwarfs show lines of activity so,
 *     and what looks like their absorption is molecular; all others in absorption
 * @param elementKms one resolution element as a velocity (km/s)
 * @param halfWindowKms half of the interval on which it is fitted (km/s): free of other lines of
 *     the list
 */
record FittingLine(
        String species, double restMicron, boolean emits, double elementKms, double halfWindowKms) {

    /** Full width at half maximum of a Gaussian in units of its sigma. */
    private static final double WIDTH_TO_SIGMA = 2 * Math.sqrt(2 * Math.log(2));

    /** Sigma of an unresolved line (km/s). */
    double instrumentSigmaKms() {
        return elementKms / WIDTH_TO_SIGMA;
    }

    /** The velocity at which light of the line is received at a wavelength (relativistic). */
    double velocityKms(double micron) {
        double square = Math.pow(micron / restMicron, 2);
        return Preparer.SPEED_OF_LIGHT_KMS * (square - 1) / (square + 1);
    }

    /** The wavelength at which the line is received at a velocity (micron). */
    double receivedMicron(double kms) {
        double beta = kms / Preparer.SPEED_OF_LIGHT_KMS;
        return restMicron * Math.sqrt((1 + beta) / (1 - beta));
    }

    /** One resolution element as a velocity. */
    static double elementKms(double resolvingPower) {
        return Preparer.SPEED_OF_LIGHT_KMS / resolvingPower;
    }

    LineSetAside setAside(String reason) {
        return new LineSetAside(species, restMicron, reason);
    }
}
