package emberline.demo;

/** The J band of 2MASS as a box, which brings fluxes of the model on a scale. */
final class JBand {

    /** Flux of a star of magnitude 0 in 2MASS J (erg/s/cm2/A), Cohen et al. 2003, AJ 126, 1090. */
    private static final double ZERO_CGS = 3.129e-10;

    private static final double LOW_MICRON = 1.17;
    private static final double HIGH_MICRON = 1.33;

    private JBand() {}

    /**
     * Scales a spectrum to a magnitude.
     *
     * @param flux flux on the grid, on any scale
     * @param grid the grid
     * @param magnitude 2MASS J (mag, Vega)
     * @return the flux (erg/s/cm2/A)
     */
    static double[] scaled(double[] flux, ModelGrid grid, double magnitude) {
        double sum = 0;
        double width = 0;
        for (int i = 0; i < grid.size(); i++) {
            if (grid.micron(i) >= LOW_MICRON && grid.micron(i) <= HIGH_MICRON) {
                sum += flux[i] * grid.micron(i);
                width += grid.micron(i);
            }
        }
        double scale = ZERO_CGS * StrictMath.pow(10, -0.4 * magnitude) / (sum / width);
        double[] scaled = new double[flux.length];
        for (int i = 0; i < flux.length; i++) {
            scaled[i] = flux[i] * scale;
        }
        return scaled;
    }
}
