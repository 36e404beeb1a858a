package emberline.prepare;

import emberline.spectrum.Spectrum;

/**
 * What extinction takes from each pixel of a spectrum, so that any amount of it can be taken out.
 * The curve is read once, which is most of the work.
 */
public final class Dereddening {

    /** Magnitudes are this many decades of flux. */
    private static final double DECADES_A_MAG = 0.4;

    private final Spectrum seen;
    private final double[] relativeToV;

    /**
     * The law of Fitzpatrick (1999) at the pixels of a spectrum.
     *
     * @param seen a spectrum with its extinction, none of it below {@value
     *     ExtinctionLaw#SHORTEST_MICRON} micron
     * @param rv ratio of total to selective extinction, 2 to 6
     */
    public Dereddening(Spectrum seen, double rv) {
        ExtinctionLaw law = ExtinctionLaw.fitzpatrick1999(rv);
        this.seen = seen;
        this.relativeToV = new double[seen.size()];
        for (int i = 0; i < relativeToV.length; i++) {
            relativeToV[i] = law.relativeTo(seen.wavelengthMicron(i));
        }
    }

    /**
     * The spectrum without an extinction.
     *
     * @param avMag what is taken out (mag in V)
     * @return a spectrum of which flux and noise are brighter by that
     */
    public Spectrum without(double avMag) {
        double[] flux = seen.fluxes();
        double[] sigma = seen.fluxSigmas();
        for (int i = 0; i < flux.length; i++) {
            double factor = Math.pow(10, DECADES_A_MAG * avMag * relativeToV[i]);
            flux[i] *= factor;
            sigma[i] *= factor;
        }
        return seen.withFluxes(flux, sigma);
    }
}
