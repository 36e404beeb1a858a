package emberline.place;

import emberline.PublishedRows;
import emberline.SharedList;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.read.ProductTable;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
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

    /** Resolving power of a prism. */
    private static final double PRISM = 120;

    /** Pixels a resolution element of a prism. */
    private static final double SAMPLING = 2.5;

    /**
     * A single object, or the sum of two, as a prism of R = 120 sees it, with even noise.
     *
     * @param objects one or two spectra by their type number; two are brought to one flux scale by
     *     the absolute J magnitudes of field dwarfs of their types
     * @param snr signal-to-noise per pixel at the mean flux in J
     */
    public static PreparedSpectrum prism(
            List<Map.Entry<Double, PreparedSpectrum>> objects, double snr, long seed) {
        double[] micron =
                DoubleStream.iterate(0.85, w -> w < 2.42, w -> w * (1 + 1 / (SAMPLING * PRISM)))
                        .toArray();
        double[] flux = new double[micron.length];
        for (Map.Entry<Double, PreparedSpectrum> object : objects) {
            double[] one = boxed(object.getValue().spectrum(), micron);
            double scale = Math.pow(10, -0.4 * absoluteJ(object.getKey())) / level(micron, one);
            for (int i = 0; i < flux.length; i++) {
                flux[i] += scale * one[i];
            }
        }
        double noise = level(micron, flux) / snr;
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(seed);
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        List<double[]> pixels = new ArrayList<>();
        for (int i = 0; i < flux.length; i++) {
            double value = flux[i] + noise * normal.sample();
            if (!Double.isNaN(value)) {
                pixels.add(new double[] {micron[i], value, noise});
            }
        }
        return new PreparedSpectrum(
                Spectrum.of(column(pixels, 0), column(pixels, 1), column(pixels, 2)),
                new ResolvingPower(PRISM, ResolvingPower.Basis.GIVEN),
                NoiseModel.INDEPENDENT,
                List.of());
    }

    private static double[] column(List<double[]> pixels, int column) {
        return pixels.stream().mapToDouble(pixel -> pixel[column]).toArray();
    }

    /** Means over a resolution element about each wavelength; NaN where half of it is missing. */
    private static double[] boxed(Spectrum spectrum, double[] micron) {
        double[] flux = new double[micron.length];
        for (int i = 0; i < micron.length; i++) {
            double low = micron[i] * (1 - 0.5 / PRISM);
            double high = micron[i] * (1 + 0.5 / PRISM);
            double sum = 0;
            double covered = 0;
            int first = Math.max(0, spectrum.firstAtOrAbove(low) - 1);
            for (int k = first; k < spectrum.size() && spectrum.lowEdgeMicron(k) < high; k++) {
                double overlap =
                        Math.min(high, spectrum.highEdgeMicron(k))
                                - Math.max(low, spectrum.lowEdgeMicron(k));
                if (overlap > 0 && spectrum.isGood(k)) {
                    sum += overlap * spectrum.flux(k);
                    covered += overlap;
                }
            }
            flux[i] = covered > 0.5 * (high - low) ? sum / covered : Double.NaN;
        }
        return flux;
    }

    private static double level(double[] micron, double[] flux) {
        return IntStream.range(0, micron.length)
                .filter(i -> micron[i] > 1.17 && micron[i] < 1.33 && !Double.isNaN(flux[i]))
                .mapToDouble(i -> flux[i])
                .average()
                .orElseThrow();
    }

    /** The absolute J magnitude of field dwarfs of a type, by the table of the product. */
    private static double absoluteJ(double typeNumber) {
        List<double[]> table =
                ProductTable.at("/emberline/place/standard/absolute-j.csv").rows().stream()
                        .map(
                                row ->
                                        new double[] {
                                            PublishedRows.number(row, "type_number"),
                                            PublishedRows.number(row, "j_mag")
                                        })
                        .toList();
        for (int k = 1; k < table.size(); k++) {
            double[] a = table.get(k - 1);
            double[] b = table.get(k);
            if (typeNumber >= a[0] && typeNumber <= b[0]) {
                return a[1] + (typeNumber - a[0]) / (b[0] - a[0]) * (b[1] - a[1]);
            }
        }
        return table.get(0)[1]; // earlier than M6
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
