package emberline.place.kind;

import emberline.prepare.ExtinctionLaw;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;

/** Spectra made worse: noisier, coarser, reddened, redshifted. */
final class Degraded {

    private static final double PIXELS_PER_ELEMENT = 2.5;
    private static final double FWHM_PER_SIGMA = 2 * Math.sqrt(2 * Math.log(2));

    private Degraded() {}

    /** With noise added, the same in all pixels: the median flux over the signal-to-noise. */
    static PreparedSpectrum noisy(
            PreparedSpectrum prepared, double signalToNoise, UniformRandomProvider random) {
        Spectrum spectrum = prepared.spectrum();
        double[] flux = spectrum.fluxes();
        double[] sigma = spectrum.fluxSigmas();
        double level =
                Arrays.stream(flux)
                        .filter(Double::isFinite)
                        .map(Math::abs)
                        .sorted()
                        .skip(flux.length / 2)
                        .findFirst()
                        .orElse(0);
        double added = level / signalToNoise;
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        for (int i = 0; i < flux.length; i++) {
            flux[i] += added * normal.sample();
            sigma[i] = Math.hypot(sigma[i], added);
        }
        return new PreparedSpectrum(
                spectrum.withFluxes(flux, sigma),
                prepared.resolvingPower(),
                NoiseModel.INDEPENDENT,
                prepared.findings());
    }

    /** Behind dust by the law of Fitzpatrick (1999) with R_V = 3.1. */
    static PreparedSpectrum reddened(PreparedSpectrum prepared, double avMag, ExtinctionLaw law) {
        Spectrum spectrum = prepared.spectrum();
        double[] flux = spectrum.fluxes();
        double[] sigma = spectrum.fluxSigmas();
        for (int i = 0; i < flux.length; i++) {
            double micron = spectrum.wavelengthMicron(i);
            double factor =
                    micron < ExtinctionLaw.SHORTEST_MICRON
                            ? 0
                            : Math.pow(10, -0.4 * avMag * law.relativeTo(micron));
            flux[i] *= factor;
            sigma[i] *= factor;
        }
        return with(prepared, spectrum.withFluxes(flux, sigma));
    }

    /** With all wavelengths stretched; a redshift z stretches by 1 + z. */
    static PreparedSpectrum stretched(PreparedSpectrum prepared, double factor) {
        Spectrum spectrum = prepared.spectrum();
        double[] wavelengths = spectrum.wavelengthsMicron();
        for (int i = 0; i < wavelengths.length; i++) {
            wavelengths[i] *= factor;
        }
        return with(prepared, spectrum.withWavelengthsMicron(wavelengths));
    }

    /** Smoothed to a resolving power and sampled with 2.5 pixels a resolution element. */
    static PreparedSpectrum coarse(PreparedSpectrum prepared, double resolvingPower) {
        Spectrum spectrum = prepared.spectrum();
        double low = spectrum.wavelengthMicron(0);
        double high = Math.min(spectrum.wavelengthMicron(spectrum.size() - 1), 2.6);
        double step = 1 / (PIXELS_PER_ELEMENT * resolvingPower);
        int size = Math.max(2, (int) (Math.log(high / low) / step));
        double narrow = 1 / resolvingPower;
        double own = 1 / prepared.resolvingPower().value();
        double width = Math.sqrt(Math.max(0, narrow * narrow - own * own)) / FWHM_PER_SIGMA;
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] sigma = new double[size];
        for (int k = 0; k < size; k++) {
            wavelengths[k] = low * Math.exp((k + 0.5) * step);
            smooth(spectrum, wavelengths[k], width * wavelengths[k], k, flux, sigma);
        }
        return new PreparedSpectrum(
                Spectrum.of(wavelengths, flux, sigma),
                new ResolvingPower(resolvingPower, ResolvingPower.Basis.GIVEN),
                NoiseModel.INDEPENDENT,
                prepared.findings());
    }

    private static void smooth(
            Spectrum spectrum, double at, double width, int k, double[] flux, double[] sigma) {
        double weights = 0;
        double sum = 0;
        double variance = 0;
        double near = Double.POSITIVE_INFINITY;
        int first = spectrum.firstAtOrAbove(at - 3 * width);
        for (int i = first; i < spectrum.size(); i++) {
            double offset = (spectrum.wavelengthMicron(i) - at) / width;
            if (offset > 3) {
                break;
            }
            if (spectrum.isGood(i)) {
                double weight = Math.exp(-offset * offset / 2) * spectrum.localSpacingMicron(i);
                weights += weight;
                sum += weight * spectrum.flux(i);
                variance += Math.pow(weight * spectrum.fluxSigma(i), 2);
                near = Math.min(near, Math.abs(offset));
            }
        }
        flux[k] = weights > 0 && near < 1 ? sum / weights : Double.NaN;
        sigma[k] = Math.sqrt(variance) / weights;
    }

    private static PreparedSpectrum with(PreparedSpectrum prepared, Spectrum spectrum) {
        return new PreparedSpectrum(
                spectrum, prepared.resolvingPower(), prepared.noise(), prepared.findings());
    }
}
