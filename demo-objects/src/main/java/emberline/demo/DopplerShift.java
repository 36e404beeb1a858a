package emberline.demo;

/** Moves a spectrum on the logarithmic grid of the model by a radial velocity. */
final class DopplerShift {

    private static final double SPEED_OF_LIGHT_KMS = 299_792.458;

    private DopplerShift() {}

    /**
     * The spectrum as seen from an observer whom the object leaves.
     *
     * @param flux flux on the grid of the model
     * @param velocityKms radial velocity (km/s), positive away from the observer
     * @return the moved flux; the ends hold the nearest value
     */
    static double[] of(double[] flux, double velocityKms) {
        if (velocityKms == 0) {
            return flux.clone();
        }
        double points = ModelGrid.PIXELS_PER_E * StrictMath.log1p(velocityKms / SPEED_OF_LIGHT_KMS);
        double[] moved = new double[flux.length];
        for (int i = 0; i < moved.length; i++) {
            double from = Math.max(0, Math.min(flux.length - 1.0, i - points));
            int below = Math.min((int) from, flux.length - 2);
            moved[i] = flux[below] + (from - below) * (flux[below + 1] - flux[below]);
        }
        return moved;
    }
}
