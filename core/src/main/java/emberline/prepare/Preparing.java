package emberline.prepare;

import emberline.spectrum.Medium;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What the observer states about a spectrum; it goes before what the file says.
 *
 * @param medium medium of the wavelengths; empty to trust the file
 * @param resolvingPower resolving power, positive; empty to trust the file
 * @param radialVelocityKms radial velocity to take out (km/s, positive away from us); empty for
 *     none
 * @param extinction interstellar extinction to take out; empty for none
 */
public record Preparing(
        Optional<Medium> medium,
        OptionalDouble resolvingPower,
        OptionalDouble radialVelocityKms,
        Optional<Extinction> extinction) {

    private static final Preparing NOTHING_STATED =
            new Preparing(
                    Optional.empty(),
                    OptionalDouble.empty(),
                    OptionalDouble.empty(),
                    Optional.empty());

    /**
     * Interstellar extinction in front of an object, by the law of Fitzpatrick (1999).
     *
     * @param avMag extinction in V (mag), 0 to 100
     * @param rv ratio of total to selective extinction, 2 to 6
     */
    public record Extinction(double avMag, double rv) {

        /** Checks the ranges. */
        public Extinction {
            if (!(avMag >= 0 && avMag <= 100) || !(rv >= 2 && rv <= 6)) {
                throw new IllegalArgumentException(
                        "extinction A_V = "
                                + avMag
                                + " mag with R_V = "
                                + rv
                                + ": expected 0 to 100 and 2 to 6. Give A_V in magnitudes, and R_V = 3.1"
                                + " where it is not known.");
            }
        }
    }

    /** Checks the numbers. */
    public Preparing {
        if (resolvingPower.isPresent()
                && (!(resolvingPower.getAsDouble() > 0)
                        || Double.isInfinite(resolvingPower.getAsDouble()))) {
            throw new IllegalArgumentException(
                    "resolving power "
                            + resolvingPower.getAsDouble()
                            + ": expected a positive, finite number. Give wavelength over the width"
                            + " of a resolution element, e.g. 2000, or leave it out.");
        }
        if (radialVelocityKms.isPresent()
                && !(Math.abs(radialVelocityKms.getAsDouble()) < 30_000)) {
            throw new IllegalArgumentException(
                    "radial velocity "
                            + radialVelocityKms.getAsDouble()
                            + " km/s: expected a number between -30000 and 30000. Give it in km/s,"
                            + " or leave it out.");
        }
    }

    /**
     * Nothing is stated; the file is trusted.
     *
     * @return the settings
     */
    public static Preparing withDefaults() {
        return NOTHING_STATED;
    }

    /**
     * These settings with a medium.
     *
     * @param stated medium of the wavelengths
     * @return new settings
     */
    public Preparing withMedium(Medium stated) {
        return new Preparing(Optional.of(stated), resolvingPower, radialVelocityKms, extinction);
    }

    /**
     * These settings with a resolving power.
     *
     * @param stated resolving power, positive
     * @return new settings
     */
    public Preparing withResolvingPower(double stated) {
        return new Preparing(medium, OptionalDouble.of(stated), radialVelocityKms, extinction);
    }

    /**
     * These settings with a radial velocity.
     *
     * @param stated velocity (km/s, positive away from us)
     * @return new settings
     */
    public Preparing withRadialVelocityKms(double stated) {
        return new Preparing(medium, resolvingPower, OptionalDouble.of(stated), extinction);
    }

    /**
     * These settings with an extinction.
     *
     * @param stated extinction to take out
     * @return new settings
     */
    public Preparing withExtinction(Extinction stated) {
        return new Preparing(medium, resolvingPower, radialVelocityKms, Optional.of(stated));
    }
}
