package emberline.judge;

import java.util.OptionalDouble;

/**
 * Position and motion on the sky, as far as known.
 *
 * @param raDeg right ascension (degree, ICRS)
 * @param decDeg declination (degree, ICRS)
 * @param parallaxMas parallax (mas); may be negative
 * @param parallaxSigmaMas its one-sigma error (mas), positive; empty where no parallax is given
 * @param pmRaMasYr proper motion in right ascension, with the cosine of the declination (mas/yr)
 * @param pmDecMasYr proper motion in declination (mas/yr)
 * @param rvKms radial velocity (km/s)
 */
public record Astrometry(
        OptionalDouble raDeg,
        OptionalDouble decDeg,
        OptionalDouble parallaxMas,
        OptionalDouble parallaxSigmaMas,
        OptionalDouble pmRaMasYr,
        OptionalDouble pmDecMasYr,
        OptionalDouble rvKms) {

    /** Checks that a parallax comes with its error. */
    public Astrometry {
        if (parallaxMas.isPresent()
                && !(parallaxSigmaMas.isPresent() && parallaxSigmaMas.getAsDouble() > 0)) {
            throw new IllegalArgumentException(
                    "parallax " + parallaxMas.getAsDouble() + " mas: expected its error beside it");
        }
    }

    /**
     * Nothing is known.
     *
     * @return the empty astrometry
     */
    public static Astrometry none() {
        OptionalDouble no = OptionalDouble.empty();
        return new Astrometry(no, no, no, no, no, no, no);
    }

    /**
     * A parallax alone.
     *
     * @param parallaxMas parallax (mas)
     * @param sigmaMas its error (mas), positive
     * @return astrometry with nothing else
     */
    public static Astrometry ofParallax(double parallaxMas, double sigmaMas) {
        OptionalDouble no = OptionalDouble.empty();
        return new Astrometry(
                no, no, OptionalDouble.of(parallaxMas), OptionalDouble.of(sigmaMas), no, no, no);
    }

    /** Total proper motion (mas/yr). */
    OptionalDouble properMotionMasYr() {
        return pmRaMasYr.isPresent() && pmDecMasYr.isPresent()
                ? OptionalDouble.of(Math.hypot(pmRaMasYr.getAsDouble(), pmDecMasYr.getAsDouble()))
                : OptionalDouble.empty();
    }
}
