package emberline.catalogue;

/**
 * An interval of wavelength.
 *
 * @param lowMicron lower edge (micron, vacuum), positive
 * @param highMicron upper edge (micron, vacuum), greater than {@code lowMicron}, finite
 */
public record Window(double lowMicron, double highMicron) {

    /** Checks the order of the edges. */
    public Window {
        if (!(0 < lowMicron && lowMicron < highMicron) || Double.isInfinite(highMicron)) {
            throw new IllegalArgumentException(
                    "window "
                            + lowMicron
                            + " to "
                            + highMicron
                            + " micron: expected 0 < low < high, both finite");
        }
    }

    /**
     * The middle of the window.
     *
     * @return wavelength (micron, vacuum)
     */
    public double centreMicron() {
        return (lowMicron + highMicron) / 2;
    }

    /**
     * The full width of the window.
     *
     * @return width (micron), positive
     */
    public double widthMicron() {
        return highMicron - lowMicron;
    }
}
