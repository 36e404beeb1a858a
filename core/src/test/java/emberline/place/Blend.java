package emberline.place;

import emberline.PublishedRows;
import emberline.SharedList;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Spectrum;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/** Sums of two real spectra, scaled by absolute magnitudes in J. */
public final class Blend {

    private Blend() {}

    /** The mean flux over J. */
    private static double level(Spectrum spectrum) {
        double sum = 0;
        int count = 0;
        for (int i = 0; i < spectrum.size(); i++) {
            double micron = spectrum.wavelengthMicron(i);
            if (micron > 1.17 && micron < 1.33 && spectrum.isGood(i)) {
                sum += spectrum.flux(i);
                count++;
            }
        }
        return sum / count;
    }

    private static double jMag(String type) throws Exception {
        return PublishedRows.of("absolute-magnitudes.csv").stream()
                .filter(row -> row.getField("type").equals(type))
                .mapToDouble(row -> PublishedRows.number(row, "j_mag"))
                .findFirst()
                .orElseThrow();
    }

    /** The sum of two objects of stated types, on the pixels of the first, with noise added. */
    public static PreparedSpectrum of(
            String first, String firstType, String second, String secondType, double snr, long seed)
            throws Exception {
        PreparedSpectrum one = SharedList.prepared(first);
        Spectrum a = one.spectrum();
        Spectrum b = SharedList.prepared(second).spectrum();
        double share =
                Math.pow(10, -0.4 * (jMag(secondType) - jMag(firstType))) * level(a) / level(b);
        return noisy(one, sum(a, b, share), snr, seed);
    }

    /** A single object with noise added. */
    public static PreparedSpectrum single(String name, double snr, long seed) throws Exception {
        PreparedSpectrum one = SharedList.prepared(name);
        return noisy(one, one.spectrum().fluxes(), snr, seed);
    }

    private static double[] sum(Spectrum a, Spectrum b, double share) {
        double[] flux = a.fluxes();
        for (int i = 0; i < flux.length; i++) {
            int above = b.firstAtOrAbove(a.wavelengthMicron(i));
            if (above == 0 || above >= b.size()) {
                flux[i] = Double.NaN;
            } else {
                double low = b.wavelengthMicron(above - 1);
                double t = (a.wavelengthMicron(i) - low) / (b.wavelengthMicron(above) - low);
                flux[i] += share * ((1 - t) * b.flux(above - 1) + t * b.flux(above));
            }
        }
        return flux;
    }

    private static PreparedSpectrum noisy(
            PreparedSpectrum one, double[] flux, double snr, long seed) {
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(seed);
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        double added = level(one.spectrum()) / snr;
        double[] sigma = one.spectrum().fluxSigmas();
        for (int i = 0; i < flux.length; i++) {
            flux[i] += added * normal.sample();
            sigma[i] = Math.hypot(sigma[i], added);
        }
        return new PreparedSpectrum(
                one.spectrum().withFluxes(flux, sigma),
                one.resolvingPower(),
                NoiseModel.INDEPENDENT,
                one.findings());
    }
}
