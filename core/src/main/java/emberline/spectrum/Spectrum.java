package emberline.spectrum;

import java.util.Arrays;

/**
 * A one-dimensional spectrum: flux density per unit wavelength on a strictly increasing wavelength
 * grid in vacuum, with its one-sigma noise. A value: nothing can change it, arrays are copied in
 * and out.
 *
 * <p>A pixel covers the interval between the midpoints to its neighbours, but never reaches further
 * than 0.75 of the local spacing to either side, so that a gap in the data stays a gap. The local
 * spacing is the fourth smallest of the six nearest distances between neighbouring pixels.
 */
public final class Spectrum {

    /** How far a pixel may reach to one side, in units of the local spacing. */
    private static final double REACH = 0.75;

    private final double[] wavelengthMicron;
    private final double[] flux;
    private final double[] fluxSigma;

    private Spectrum(double[] wavelengthMicron, double[] flux, double[] fluxSigma) {
        this.wavelengthMicron = wavelengthMicron;
        this.flux = flux;
        this.fluxSigma = fluxSigma;
    }

    /**
     * Makes a spectrum from three parallel arrays, which are copied.
     *
     * @param wavelengthMicron pixel centres (micron, vacuum), finite, positive, strictly
     *     increasing, at least two
     * @param flux flux density per unit wavelength on any one scale; NaN marks a bad pixel
     * @param fluxSigma one-sigma noise on the scale of {@code flux}; a pixel whose sigma is not a
     *     finite, non-negative number counts as bad
     * @return the spectrum
     * @throws IllegalArgumentException if the lengths differ, there are fewer than two pixels or
     *     the wavelengths do not increase
     */
    public static Spectrum of(double[] wavelengthMicron, double[] flux, double[] fluxSigma) {
        if (wavelengthMicron.length < 2
                || flux.length != wavelengthMicron.length
                || fluxSigma.length != wavelengthMicron.length) {
            throw new IllegalArgumentException(
                    "spectrum of "
                            + wavelengthMicron.length
                            + " wavelengths, "
                            + flux.length
                            + " fluxes and "
                            + fluxSigma.length
                            + " sigmas: expected equal lengths and at least two pixels");
        }
        double before = 0;
        for (int i = 0; i < wavelengthMicron.length; i++) {
            if (!(wavelengthMicron[i] > before) || Double.isInfinite(wavelengthMicron[i])) {
                throw new IllegalArgumentException(
                        "wavelength "
                                + wavelengthMicron[i]
                                + " micron of pixel "
                                + i
                                + " follows "
                                + before
                                + ": expected finite, positive, increasing wavelengths");
            }
            before = wavelengthMicron[i];
        }
        return new Spectrum(wavelengthMicron.clone(), flux.clone(), fluxSigma.clone());
    }

    /**
     * The number of pixels, bad ones included.
     *
     * @return at least two
     */
    public int size() {
        return wavelengthMicron.length;
    }

    /**
     * The centre of a pixel.
     *
     * @param pixel index from 0
     * @return wavelength (micron, vacuum)
     */
    public double wavelengthMicron(int pixel) {
        return wavelengthMicron[pixel];
    }

    /**
     * The flux density of a pixel.
     *
     * @param pixel index from 0
     * @return flux per unit wavelength; NaN in a bad pixel
     */
    public double flux(int pixel) {
        return flux[pixel];
    }

    /**
     * The noise of a pixel.
     *
     * @param pixel index from 0
     * @return one-sigma noise on the scale of the flux
     */
    public double fluxSigma(int pixel) {
        return fluxSigma[pixel];
    }

    /**
     * Whether a pixel can be used: its flux is finite and its sigma finite and not negative.
     *
     * @param pixel index from 0
     * @return true if the pixel is good
     */
    public boolean isGood(int pixel) {
        return Double.isFinite(flux[pixel])
                && fluxSigma[pixel] >= 0
                && Double.isFinite(fluxSigma[pixel]);
    }

    /**
     * A copy of the pixel centres.
     *
     * @return wavelengths (micron, vacuum), strictly increasing
     */
    public double[] wavelengthsMicron() {
        return wavelengthMicron.clone();
    }

    /**
     * A copy of the fluxes.
     *
     * @return flux per unit wavelength; NaN in bad pixels
     */
    public double[] fluxes() {
        return flux.clone();
    }

    /**
     * A copy of the noise.
     *
     * @return one-sigma noise on the scale of the flux
     */
    public double[] fluxSigmas() {
        return fluxSigma.clone();
    }

    /**
     * The lower edge of a pixel: the midpoint to its neighbour below, or closer where a gap lies
     * there.
     *
     * @param pixel index from 0
     * @return wavelength (micron, vacuum)
     */
    public double lowEdgeMicron(int pixel) {
        double reach = REACH * localSpacingMicron(pixel);
        if (pixel == 0) {
            return wavelengthMicron[0]
                    - Math.min(reach, (wavelengthMicron[1] - wavelengthMicron[0]) / 2);
        }
        double half = (wavelengthMicron[pixel] - wavelengthMicron[pixel - 1]) / 2;
        return wavelengthMicron[pixel] - Math.min(half, reach);
    }

    /**
     * The upper edge of a pixel: the midpoint to its neighbour above, or closer where a gap lies
     * there.
     *
     * @param pixel index from 0
     * @return wavelength (micron, vacuum)
     */
    public double highEdgeMicron(int pixel) {
        double reach = REACH * localSpacingMicron(pixel);
        int last = wavelengthMicron.length - 1;
        if (pixel == last) {
            return wavelengthMicron[last]
                    + Math.min(reach, (wavelengthMicron[last] - wavelengthMicron[last - 1]) / 2);
        }
        double half = (wavelengthMicron[pixel + 1] - wavelengthMicron[pixel]) / 2;
        return wavelengthMicron[pixel] + Math.min(half, reach);
    }

    /**
     * The spacing of pixels around one: of the six nearest distances between neighbours (fewer at
     * the ends) the fourth smallest, so that neither a gap nor an alternating spacing decides.
     *
     * @param pixel index from 0
     * @return spacing (micron), positive
     */
    public double localSpacingMicron(int pixel) {
        int first = Math.max(0, pixel - 3);
        int last = Math.min(wavelengthMicron.length - 1, pixel + 3);
        double[] steps = new double[last - first];
        for (int i = first; i < last; i++) {
            steps[i - first] = wavelengthMicron[i + 1] - wavelengthMicron[i];
        }
        Arrays.sort(steps);
        return steps[Math.min((steps.length + 1) / 2, steps.length - 1)];
    }

    /**
     * The first pixel whose centre is at or above a wavelength.
     *
     * @param micron wavelength (micron, vacuum)
     * @return pixel index, {@link #size()} if there is none
     */
    public int firstAtOrAbove(double micron) {
        int found = Arrays.binarySearch(wavelengthMicron, micron);
        return found >= 0 ? found : -found - 1;
    }

    /**
     * This spectrum with other wavelengths.
     *
     * @param wavelengths pixel centres (micron, vacuum), strictly increasing, as many as pixels
     * @return a new spectrum with the same fluxes and sigmas
     */
    public Spectrum withWavelengthsMicron(double[] wavelengths) {
        return of(wavelengths, flux, fluxSigma);
    }

    /**
     * This spectrum with other fluxes and noise on the same grid.
     *
     * @param fluxes flux per unit wavelength, as many as pixels
     * @param fluxSigmas one-sigma noise, as many as pixels
     * @return a new spectrum
     */
    public Spectrum withFluxes(double[] fluxes, double[] fluxSigmas) {
        return of(wavelengthMicron, fluxes, fluxSigmas);
    }

    /**
     * This spectrum with flux and noise multiplied by a factor.
     *
     * @param factor positive and finite
     * @return a new spectrum
     */
    public Spectrum withFluxScaledBy(double factor) {
        if (!(factor > 0) || Double.isInfinite(factor)) {
            throw new IllegalArgumentException(
                    "scale factor " + factor + ": expected a positive, finite number");
        }
        double[] scaled = flux.clone();
        double[] scaledSigma = fluxSigma.clone();
        for (int i = 0; i < scaled.length; i++) {
            scaled[i] *= factor;
            scaledSigma[i] *= factor;
        }
        return new Spectrum(wavelengthMicron, scaled, scaledSigma);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Spectrum that
                && Arrays.equals(wavelengthMicron, that.wavelengthMicron)
                && Arrays.equals(flux, that.flux)
                && Arrays.equals(fluxSigma, that.fluxSigma);
    }

    @Override
    public int hashCode() {
        return 31 * Arrays.hashCode(wavelengthMicron) + Arrays.hashCode(flux);
    }

    @Override
    public String toString() {
        return "spectrum of "
                + size()
                + " pixels, "
                + wavelengthMicron[0]
                + " to "
                + wavelengthMicron[size() - 1]
                + " micron";
    }
}
