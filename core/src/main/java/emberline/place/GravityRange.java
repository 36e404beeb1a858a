package emberline.place;

import emberline.spectrum.SpectralType;

/** The types for which gravity classes are calibrated: M5 to L7. */
public final class GravityRange {

    private static final double EARLIEST = 5;
    private static final double LATEST = 17.5;

    private GravityRange() {}

    /**
     * Whether gravity can be judged at a type.
     *
     * @param typeNumber type (M0 = 0)
     * @return false outside M5 to L7.5
     */
    public static boolean contains(double typeNumber) {
        return typeNumber >= EARLIEST && typeNumber <= LATEST;
    }

    /**
     * The range in words.
     *
     * @return {@code M5 to L7}
     */
    public static String words() {
        return new SpectralType(EARLIEST).code()
                + " to "
                + new SpectralType(Math.floor(LATEST)).code();
    }
}
