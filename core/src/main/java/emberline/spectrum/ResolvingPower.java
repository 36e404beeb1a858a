package emberline.spectrum;

/**
 * The resolving power of a spectrum.
 *
 * @param value wavelength over full width at half maximum of an unresolved line, positive, finite
 * @param basis how it is known
 */
public record ResolvingPower(double value, Basis basis) {

    /** How a resolving power is known, the best first. */
    public enum Basis {
        /** Given by the observer: in the candidate list or as an option. */
        GIVEN,
        /** Stated in the header of the file. */
        HEADER,
        /** Estimated from the pixel sampling: an upper limit in kind. */
        SAMPLING
    }

    /** Checks the value. */
    public ResolvingPower {
        if (!(value > 0) || Double.isInfinite(value)) {
            throw new IllegalArgumentException(
                    "resolving power " + value + ": expected a positive, finite number");
        }
    }
}
