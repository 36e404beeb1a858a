package emberline.demo;

/** The fine wavelength grid of the model: equal steps in the logarithm of wavelength, in vacuum. */
final class ModelGrid {

    /** Shortest wavelength (micron). */
    static final double LOW_MICRON = 0.58;

    /** Longest wavelength (micron). */
    static final double HIGH_MICRON = 2.56;

    /** Pixels per unit of the natural logarithm: three to the resolution element at R = 4000. */
    static final double PIXELS_PER_E = 12000;

    private final double[] micron;

    /** The grid. */
    ModelGrid() {
        int size = (int) Math.ceil(StrictMath.log(HIGH_MICRON / LOW_MICRON) * PIXELS_PER_E);
        micron = new double[size];
        for (int i = 0; i < size; i++) {
            micron[i] = LOW_MICRON * StrictMath.exp(i / PIXELS_PER_E);
        }
    }

    /** Number of points. */
    int size() {
        return micron.length;
    }

    /** Wavelength of a point (micron, vacuum). */
    double micron(int i) {
        return micron[i];
    }

    /** The place of a wavelength on the grid, in points from its start, not rounded. */
    double place(double wavelengthMicron) {
        return StrictMath.log(wavelengthMicron / LOW_MICRON) * PIXELS_PER_E;
    }
}
