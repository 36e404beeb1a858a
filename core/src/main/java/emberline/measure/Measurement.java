package emberline.measure;

import java.util.function.Function;

/** A measured value with its error, or the reason why there is none; there is no third case. */
public sealed interface Measurement {

    /**
     * A value that was measured.
     *
     * @param value finite, in the unit of the feature
     * @param oneSigma one-sigma error from the pixel noise, same unit, finite and not negative; a
     *     {@link Measurer} gives none without an error
     */
    record Measured(double value, double oneSigma) implements Measurement {

        /** Checks that both numbers are finite. */
        public Measured {
            if (!Double.isFinite(value) || !(oneSigma >= 0) || Double.isInfinite(oneSigma)) {
                throw new IllegalArgumentException(
                        "measured "
                                + value
                                + " +- "
                                + oneSigma
                                + ": expected a finite value and a finite error of at least 0");
            }
        }
    }

    /**
     * A value that could not be measured.
     *
     * @param why the kind of reason
     * @param detail the reason in words with its figures
     */
    record NotMeasured(Why why, String detail) implements Measurement {}

    /** Why a feature was not measured. */
    enum Why {
        /** The good pixels cover too little of a window. */
        NOT_COVERED("not covered"),
        /** The spectrum does not resolve what the definition needs. */
        TOO_COARSE("too coarse"),
        /** The continuum is zero or negative, so that the definition has no meaning. */
        NEGATIVE_CONTINUUM("continuum not positive"),
        /** The continuum is lost in the noise. */
        TOO_NOISY("too noisy"),
        /** The pixels have no noise, so that a value would have no error. */
        NOISE_UNKNOWN("noise not known"),
        /** The atmosphere lets hardly any light through there. */
        TELLURIC("saturated by tellurics"),
        /** A part of a composite feature was not measured. */
        PART_MISSING("part missing"),
        /** The value lies outside the range for which the definition holds. */
        OUTSIDE_VALID_RANGE("outside valid range");

        private final String words;

        Why(String words) {
            this.words = words;
        }

        /**
         * The reason in a few words.
         *
         * @return for instance {@code not covered}
         */
        public String words() {
            return words;
        }
    }

    /**
     * Takes both cases to one result.
     *
     * @param <R> type of the result
     * @param measured what to do with a value
     * @param notMeasured what to do with a reason
     * @return what the function of the case at hand returns
     */
    default <R> R fold(
            Function<? super Measured, ? extends R> measured,
            Function<? super NotMeasured, ? extends R> notMeasured) {
        if (this instanceof Measured value) {
            return measured.apply(value);
        }
        return notMeasured.apply((NotMeasured) this);
    }
}
