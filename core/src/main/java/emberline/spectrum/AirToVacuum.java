package emberline.spectrum;

/**
 * Wavelengths in standard air (15 degrees Celsius, one atmosphere, dry) and in vacuum.
 *
 * <p>The refractive index of air is n = 1 + 8.34254e-5 + 0.02406147 / (130 - s²) + 0.00015998 /
 * (38.9 - s²), with s the vacuum wavenumber per micron, and air wavelength = vacuum wavelength / n.
 * It is the form adopted by the International Astronomical Union, as given by Morton (2000, ApJS
 * 130, 403). Between 0.6 and 2.5 micron it agrees with Ciddor (1996, Applied Optics 35, 1566)
 * within 2e-8 micron; it holds from 0.2 micron on and extrapolates smoothly to the infrared.
 */
public final class AirToVacuum {

    /** Shortest wavelength for which the formula holds (micron). */
    public static final double SHORTEST_MICRON = 0.2;

    /** Each round shrinks the error by a factor of some 1e5, so four reach the last digit. */
    private static final int ROUNDS = 4;

    private AirToVacuum() {}

    /**
     * The wavelength in air of light with a wavelength in vacuum.
     *
     * @param vacuumMicron wavelength in vacuum (micron), 0.2 or more
     * @return wavelength in air (micron)
     * @throws IllegalArgumentException if the wavelength is below 0.2 micron or not finite
     */
    public static double airMicron(double vacuumMicron) {
        check(vacuumMicron, "vacuum");
        return vacuumMicron / refractiveIndex(vacuumMicron);
    }

    /**
     * The wavelength in vacuum of light with a wavelength in air: the inverse of {@link
     * #airMicron}, by iteration.
     *
     * @param airMicron wavelength in air (micron), 0.2 or more
     * @return wavelength in vacuum (micron)
     * @throws IllegalArgumentException if the wavelength is below 0.2 micron or not finite
     */
    public static double vacuumMicron(double airMicron) {
        check(airMicron, "air");
        double vacuum = airMicron;
        for (int round = 0; round < ROUNDS; round++) {
            vacuum = airMicron * refractiveIndex(vacuum);
        }
        return vacuum;
    }

    private static double refractiveIndex(double vacuumMicron) {
        double wavenumberSquared = 1 / (vacuumMicron * vacuumMicron);
        return 1
                + 8.34254e-5
                + 0.02406147 / (130 - wavenumberSquared)
                + 0.00015998 / (38.9 - wavenumberSquared);
    }

    private static void check(double micron, String medium) {
        if (!(micron >= SHORTEST_MICRON) || Double.isInfinite(micron)) {
            throw new IllegalArgumentException(
                    medium
                            + " wavelength "
                            + micron
                            + " micron: expected a finite number from "
                            + SHORTEST_MICRON
                            + " micron, where the refractive index of air is known");
        }
    }
}
