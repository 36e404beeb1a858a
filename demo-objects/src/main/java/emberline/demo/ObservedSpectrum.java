package emberline.demo;

/**
 * A spectrum as an instrument would give it: in vacuum and in erg/s/cm2/A, before it is written in
 * the units of its file. A value; arrays are copied in and out.
 */
final class ObservedSpectrum {

    private final double[] micron;
    private final double[] flux;
    private final double[] sigma;

    /**
     * A spectrum.
     *
     * @param micron pixel centres (micron, vacuum), increasing
     * @param flux flux (erg/s/cm2/A)
     * @param sigma one-sigma noise (erg/s/cm2/A)
     */
    ObservedSpectrum(double[] micron, double[] flux, double[] sigma) {
        this.micron = micron.clone();
        this.flux = flux.clone();
        this.sigma = sigma.clone();
    }

    int size() {
        return micron.length;
    }

    double micron(int pixel) {
        return micron[pixel];
    }

    double flux(int pixel) {
        return flux[pixel];
    }

    double sigma(int pixel) {
        return sigma[pixel];
    }

    double[] microns() {
        return micron.clone();
    }

    double[] fluxes() {
        return flux.clone();
    }

    double[] sigmas() {
        return sigma.clone();
    }
}
