package emberline.demo;

import java.util.Arrays;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Observes the light of an object: the instrument blurs and samples it, photons and the sky add
 * noise, and the correction for the atmosphere leaves its residuals. The same observation of the
 * same light always gives the same spectrum.
 *
 * <p>Noise: sigma² goes with object plus sky, where the sky of H is {@value #SKY_H} times that of J
 * and the thermal background doubles every {@value #THERMAL_DOUBLING_MICRON} micron beyond 1.9
 * micron; it grows by the inverse transmission of the atmosphere. Residuals: the correction is
 * wrong by a share of the absorbed light, {@value #RESIDUAL} times a slow random curve.
 */
final class Observer {

    private static final double SKY_H = 1.6;
    private static final double THERMAL_DOUBLING_MICRON = 0.12;
    private static final double RESIDUAL = 0.05;
    private static final double RESIDUAL_PIXELS = 3;
    private static final double SIGMA_PER_FWHM = 1 / (2 * Math.sqrt(2 * StrictMath.log(2)));

    private final ModelGrid grid;
    private final Atmosphere atmosphere = new Atmosphere();

    /**
     * An observer of fluxes on a grid.
     *
     * @param grid the grid of the model
     */
    Observer(ModelGrid grid) {
        this.grid = grid;
    }

    /**
     * What an ideal detector would record: blurred and sampled, without noise and atmosphere.
     *
     * @param flux flux on the grid of the model
     * @param instrument the spectrograph
     * @return the flux of every pixel, with a sigma of a thousandth of it
     */
    ObservedSpectrum noiseless(double[] flux, Instrument instrument) {
        double[] edges = instrument.edgesMicron();
        double[] sampled = sample(flux, instrument, edges);
        double[] sigma = Arrays.stream(sampled).map(value -> 1e-3 * value).toArray();
        return new ObservedSpectrum(centres(edges), sampled, sigma);
    }

    /**
     * An observation with all its flaws.
     *
     * @param flux flux on the grid of the model
     * @param exposure instrument, signal-to-noise and gaps; its file name seeds the noise
     * @return the spectrum
     */
    ObservedSpectrum observe(double[] flux, Exposure exposure) {
        Instrument instrument = exposure.instrument();
        ObservedSpectrum ideal = noiseless(flux, instrument);
        UniformRandomProvider random =
                RandomSource.XO_RO_SHI_RO_128_PP.create(Seeds.of("noise/" + exposure.file()));
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        double[] slow = slowCurve(normal, ideal.size());
        double peak = peak(ideal);
        int size = ideal.size();
        double[] noisy = new double[size];
        double[] sigma = new double[size];
        boolean[] keep = new boolean[size];
        for (int i = 0; i < size; i++) {
            double micron = ideal.micron(i);
            double transmission = atmosphere.transmission(micron);
            double light = Math.max(0, ideal.flux(i) / peak) + sky(instrument, micron);
            sigma[i] =
                    peak
                            / exposure.signalToNoise()
                            * Math.sqrt(light / (1 + instrument.sky()))
                            / transmission;
            double residual = 1 + RESIDUAL * (1 - transmission) * slow[i];
            noisy[i] = ideal.flux(i) * residual + sigma[i] * normal.sample();
            keep[i] = !(transmission < exposure.leastTransmission().orElse(0));
        }
        return kept(ideal.microns(), noisy, sigma, keep);
    }

    private static ObservedSpectrum kept(
            double[] micron, double[] flux, double[] sigma, boolean[] keep) {
        int count = 0;
        double[][] kept = new double[3][micron.length];
        for (int i = 0; i < micron.length; i++) {
            if (keep[i]) {
                kept[0][count] = micron[i];
                kept[1][count] = flux[i];
                kept[2][count] = sigma[i];
                count++;
            }
        }
        return new ObservedSpectrum(
                Arrays.copyOf(kept[0], count),
                Arrays.copyOf(kept[1], count),
                Arrays.copyOf(kept[2], count));
    }

    private static double sky(Instrument instrument, double micron) {
        if (micron < 1.4) {
            return instrument.sky();
        }
        double thermal =
                micron < 1.9 ? 1 : StrictMath.pow(2, (micron - 1.9) / THERMAL_DOUBLING_MICRON);
        return instrument.sky() * SKY_H * thermal;
    }

    /** The brightest pixel of J, or of all where J is not covered. */
    private static double peak(ObservedSpectrum spectrum) {
        double inJ = 0;
        double anywhere = 0;
        for (int i = 0; i < spectrum.size(); i++) {
            double flux = spectrum.flux(i);
            anywhere = Math.max(anywhere, flux);
            if (spectrum.micron(i) > 1.2 && spectrum.micron(i) < 1.32) {
                inJ = Math.max(inJ, flux);
            }
        }
        return inJ > 0 ? inJ : anywhere;
    }

    private static double[] slowCurve(ZigguratSampler.NormalizedGaussian normal, int size) {
        double[] white = new double[size];
        for (int i = 0; i < size; i++) {
            white[i] = normal.sample();
        }
        double[] slow = GaussianBlur.blur(white, RESIDUAL_PIXELS);
        double gain = Math.sqrt(2 * RESIDUAL_PIXELS * Math.sqrt(Math.PI));
        return Arrays.stream(slow).map(value -> gain * value).toArray();
    }

    private double[] sample(double[] flux, Instrument instrument, double[] edges) {
        double sigmaPoints = ModelGrid.PIXELS_PER_E / instrument.resolvingPower() * SIGMA_PER_FWHM;
        double[] blurred = GaussianBlur.blur(flux, sigmaPoints);
        double[] integral = new double[blurred.length];
        for (int i = 1; i < integral.length; i++) {
            integral[i] =
                    integral[i - 1]
                            + (grid.micron(i) - grid.micron(i - 1))
                                    * (blurred[i] + blurred[i - 1])
                                    / 2;
        }
        double[] sampled = new double[edges.length - 1];
        for (int p = 0; p < sampled.length; p++) {
            sampled[p] =
                    (at(integral, edges[p + 1]) - at(integral, edges[p]))
                            / (edges[p + 1] - edges[p]);
        }
        return sampled;
    }

    private double at(double[] integral, double micron) {
        double place = grid.place(micron);
        int below = Math.min(Math.max(0, (int) place), integral.length - 2);
        double share =
                (micron - grid.micron(below)) / (grid.micron(below + 1) - grid.micron(below));
        return integral[below] + share * (integral[below + 1] - integral[below]);
    }

    private static double[] centres(double[] edges) {
        double[] centres = new double[edges.length - 1];
        for (int p = 0; p < centres.length; p++) {
            centres[p] = (edges[p] + edges[p + 1]) / 2;
        }
        return centres;
    }
}
