package emberline.prepare;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * How much worse than observed a spectrum is made before it is prepared, to see what a result is
 * worth on poorer data.
 *
 * @param signalToNoise median signal-to-noise per pixel to which noise is added, positive; empty to
 *     add none
 * @param resolvingPower resolving power to which is smoothed, positive; empty to leave it
 * @param band the only band that is kept; empty to keep all wavelengths
 */
public record Degrading(
        OptionalDouble signalToNoise, OptionalDouble resolvingPower, Optional<ObservedBand> band) {

    private static final Degrading NONE =
            new Degrading(OptionalDouble.empty(), OptionalDouble.empty(), Optional.empty());

    /** Checks the numbers. */
    public Degrading {
        check("signal-to-noise", signalToNoise);
        check("resolving power", resolvingPower);
    }

    private static void check(String what, OptionalDouble number) {
        if (number.isPresent()
                && (!(number.getAsDouble() > 0) || Double.isInfinite(number.getAsDouble()))) {
            throw new IllegalArgumentException(
                    what
                            + " "
                            + number.getAsDouble()
                            + ": expected a positive, finite number. Give one, or leave it out.");
        }
    }

    /**
     * Spectra stay as they are.
     *
     * @return settings that change nothing
     */
    public static Degrading none() {
        return NONE;
    }

    /**
     * These settings with noise added.
     *
     * @param median median signal-to-noise per pixel, positive
     * @return new settings
     */
    public Degrading toSignalToNoise(double median) {
        return new Degrading(OptionalDouble.of(median), resolvingPower, band);
    }

    /**
     * These settings with smoothing.
     *
     * @param power resolving power, positive
     * @return new settings
     */
    public Degrading toResolvingPower(double power) {
        return new Degrading(signalToNoise, OptionalDouble.of(power), band);
    }

    /**
     * These settings with one band kept.
     *
     * @param kept the band
     * @return new settings
     */
    public Degrading toBand(ObservedBand kept) {
        return new Degrading(signalToNoise, resolvingPower, Optional.of(kept));
    }
}
