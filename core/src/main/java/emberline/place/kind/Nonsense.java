package emberline.place.kind;

import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Spectra that show no object that is known here: waves, wandering continua, lines of the night
 * sky, bright emission lines. From them, and from reference spectra that were reversed or have a
 * wrong wavelength scale, it is learned how remote something unknown is.
 */
final class Nonsense {

    private static final double LOW_MICRON = 0.61;
    private static final double HIGH_MICRON = 2.4;

    private Nonsense() {}

    /** Invented spectra, always the same ones. */
    static List<PreparedSpectrum> invented(int each) {
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(77);
        List<PreparedSpectrum> spectra = new ArrayList<>();
        for (int k = 0; k < each; k++) {
            spectra.add(waves(grid(random), random));
            spectra.add(wandering(grid(random), random));
            spectra.add(lines(grid(random), 60, 0.5 + 4 * random.nextDouble(), random));
            spectra.add(lines(grid(random), 6, 5 + 25 * random.nextDouble(), random));
        }
        return spectra;
    }

    private static double[] grid(UniformRandomProvider random) {
        double resolvingPower = random.nextBoolean() ? 100 : 800;
        double step = 1 / (2.5 * resolvingPower);
        int size = (int) (Math.log(HIGH_MICRON / LOW_MICRON) / step);
        double[] wavelengths = new double[size];
        for (int i = 0; i < size; i++) {
            wavelengths[i] = LOW_MICRON * Math.exp(i * step);
        }
        return wavelengths;
    }

    private static PreparedSpectrum waves(double[] micron, UniformRandomProvider random) {
        double period = 0.04 * Math.pow(10, random.nextDouble());
        double height = 0.3 + 0.65 * random.nextDouble();
        double phase = 2 * Math.PI * random.nextDouble();
        double[] flux =
                Arrays.stream(micron)
                        .map(w -> 1 + height * Math.sin(2 * Math.PI * w / period + phase))
                        .toArray();
        return noisy(micron, flux, random);
    }

    private static PreparedSpectrum wandering(double[] micron, UniformRandomProvider random) {
        double[] flux = new double[micron.length];
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        double step = 0.6 * Math.sqrt(40 * Math.log(micron[1] / micron[0]));
        double log = 0;
        for (int i = 0; i < flux.length; i++) {
            log = 0.999 * log + step * normal.sample();
            flux[i] = Math.exp(log);
        }
        return noisy(micron, flux, random);
    }

    private static PreparedSpectrum lines(
            double[] micron, int count, double height, UniformRandomProvider random) {
        double slope = -2 + 3 * random.nextDouble();
        double[] flux = Arrays.stream(micron).map(w -> Math.pow(w, slope)).toArray();
        for (int k = 0; k < count; k++) {
            double at = LOW_MICRON + (HIGH_MICRON - LOW_MICRON) * random.nextDouble();
            double width = 0.003 + 0.005 * random.nextDouble();
            double peak = height * (0.2 + random.nextDouble()) * Math.pow(at, slope);
            for (int i = 0; i < flux.length; i++) {
                double offset = (micron[i] - at) / width;
                flux[i] += peak * Math.exp(-offset * offset / 2);
            }
        }
        return noisy(micron, flux, random);
    }

    private static PreparedSpectrum noisy(
            double[] micron, double[] flux, UniformRandomProvider random) {
        double[] sigma = new double[flux.length];
        PreparedSpectrum clean =
                new PreparedSpectrum(
                        Spectrum.of(micron, flux, sigma),
                        new ResolvingPower(
                                1 / (2.5 * Math.log(micron[1] / micron[0])),
                                ResolvingPower.Basis.GIVEN),
                        NoiseModel.INDEPENDENT,
                        List.of());
        return Degraded.noisy(clean, 8 * Math.pow(10, random.nextDouble()), random);
    }

    /** A spectrum with its fluxes in reverse order. */
    static PreparedSpectrum reversed(PreparedSpectrum prepared) {
        Spectrum spectrum = prepared.spectrum();
        int first = spectrum.firstAtOrAbove(LOW_MICRON);
        int end = spectrum.firstAtOrAbove(HIGH_MICRON);
        double[] micron = Arrays.copyOfRange(spectrum.wavelengthsMicron(), first, end);
        double[] flux = new double[micron.length];
        double[] sigma = new double[micron.length];
        for (int i = 0; i < flux.length; i++) {
            flux[i] = spectrum.flux(end - 1 - i);
            sigma[i] = spectrum.fluxSigma(end - 1 - i);
        }
        return new PreparedSpectrum(
                Spectrum.of(micron, flux, sigma),
                prepared.resolvingPower(),
                prepared.noise(),
                prepared.findings());
    }
}
