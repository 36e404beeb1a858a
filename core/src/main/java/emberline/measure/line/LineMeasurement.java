package emberline.measure.line;

import emberline.catalogue.Feature;
import emberline.catalogue.Purpose;
import emberline.measure.Measurement;
import emberline.measure.Measurement.Measured;
import java.util.OptionalDouble;

/**
 * The equivalent width of one line with a verdict on whether the line was seen. Equivalent widths
 * are positive in absorption and negative in emission throughout; many papers print the emission of
 * H alpha as positive.
 *
 * <p>The verdict weighs the width against the noise of the pixels alone. Molecular bands under a
 * line give a false width of their own, which the note of the feature states where it is known.
 *
 * @param feature the definition, an equivalent width
 * @param ew the width (angstrom, positive in absorption), or the reason why there is none
 * @param detection whether the line was seen
 * @param limit3SigmaAngstrom three times the error of the width (angstrom, positive): the greatest
 *     strength that could hide in the noise; present only where the line was not seen
 */
public record LineMeasurement(
        Feature feature, Measurement ew, Detection detection, OptionalDouble limit3SigmaAngstrom) {

    /** Least width of a line that was seen, in units of its error. */
    static final double SEEN = 3;

    /** Whether a line was seen. */
    public enum Detection {
        /** Seen in absorption at 3 sigma or more. */
        ABSORPTION,
        /** Seen in emission at 3 sigma or more; given for lines of activity alone. */
        EMISSION,
        /** Not seen; the limit says how strong it can be. */
        NOT_SEEN,
        /** The width could not be measured. */
        NOT_MEASURED
    }

    /**
     * Weighs a width against its error. A line is seen where it reaches 3 sigma in the expected
     * sense: lines of activity in absorption or emission, all others in absorption, because a
     * negative width of those says that the continuum is not where the definition takes it.
     *
     * @param feature the definition, an equivalent width
     * @param ew what came of it
     * @return the width with its verdict
     */
    public static LineMeasurement of(Feature feature, Measurement ew) {
        return ew.fold(
                width -> weighed(feature, width),
                why ->
                        new LineMeasurement(
                                feature, ew, Detection.NOT_MEASURED, OptionalDouble.empty()));
    }

    private static LineMeasurement weighed(Feature feature, Measured ew) {
        double least = SEEN * ew.oneSigma();
        boolean mayEmit = feature.purpose() == Purpose.ACTIVITY;
        if (ew.value() > 0 && ew.value() >= least) {
            return new LineMeasurement(feature, ew, Detection.ABSORPTION, OptionalDouble.empty());
        }
        if (mayEmit && ew.value() < 0 && -ew.value() >= least) {
            return new LineMeasurement(feature, ew, Detection.EMISSION, OptionalDouble.empty());
        }
        return new LineMeasurement(feature, ew, Detection.NOT_SEEN, OptionalDouble.of(least));
    }
}
