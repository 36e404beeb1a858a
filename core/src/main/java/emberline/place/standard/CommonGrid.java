package emberline.place.standard;

import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Spectrum;
import java.util.EnumMap;
import java.util.Map;

/**
 * A grid of bins on which spectra of different instruments can be compared. Bins are one resolution
 * element of the coarsest spectrum wide; a flux is the mean over its bin with fractional pixels, so
 * that the flux in the bins is that in the pixels.
 */
final class CommonGrid {

    /** Share of a bin that good pixels must cover. */
    private static final double LEAST_COVERAGE = 0.8;

    private final double[] lowMicron;
    private final double[] highMicron;
    private final Map<Range, int[]> bins = new EnumMap<>(Range.class);

    /**
     * A grid over all ranges.
     *
     * @param resolvingPower resolving power of the coarsest spectrum
     */
    CommonGrid(double resolvingPower) {
        int size = 0;
        for (Range range : Range.values()) {
            int count = count(range, resolvingPower);
            bins.put(range, new int[] {size, size + count});
            size += count;
        }
        lowMicron = new double[size];
        highMicron = new double[size];
        for (Range range : Range.values()) {
            int from = bins.get(range)[0];
            int to = bins.get(range)[1];
            double step = Math.log(range.highMicron() / range.lowMicron()) / (to - from);
            for (int k = from; k < to; k++) {
                lowMicron[k] = range.lowMicron() * Math.exp((k - from) * step);
                highMicron[k] = range.lowMicron() * Math.exp((k - from + 1) * step);
            }
        }
    }

    private static int count(Range range, double resolvingPower) {
        return Math.max(
                1, (int) (Math.log(range.highMicron() / range.lowMicron()) * resolvingPower));
    }

    int size() {
        return lowMicron.length;
    }

    /** The first bin of a range. */
    int from(Range range) {
        return bins.get(range)[0];
    }

    /** The bin after the last one of a range. */
    int to(Range range) {
        return bins.get(range)[1];
    }

    double centreMicron(int bin) {
        return 0.5 * (lowMicron[bin] + highMicron[bin]);
    }

    /** A spectrum in the bins. */
    Binned of(PreparedSpectrum prepared) {
        Spectrum spectrum = prepared.spectrum();
        double[] flux = new double[size()];
        double[] sigma = new double[size()];
        for (int bin = 0; bin < size(); bin++) {
            bin(spectrum, prepared.noise().lag1(), bin, flux, sigma);
        }
        return new Binned(this, flux, sigma);
    }

    private void bin(Spectrum spectrum, double lag1, int bin, double[] flux, double[] sigma) {
        double low = lowMicron[bin];
        double high = highMicron[bin];
        double covered = 0;
        double sum = 0;
        double variance = 0;
        double before = 0;
        int first = Math.max(0, spectrum.firstAtOrAbove(low) - 1);
        for (int i = first; i < spectrum.size() && spectrum.lowEdgeMicron(i) < high; i++) {
            double overlap =
                    Math.min(high, spectrum.highEdgeMicron(i))
                            - Math.max(low, spectrum.lowEdgeMicron(i));
            if (overlap > 0 && spectrum.isGood(i)) {
                covered += overlap;
                sum += overlap * spectrum.flux(i);
                double noise = overlap * spectrum.fluxSigma(i);
                variance += noise * noise + 2 * lag1 * noise * before;
                before = noise;
            } else {
                before = 0;
            }
        }
        boolean enough = covered >= LEAST_COVERAGE * (high - low);
        flux[bin] = enough ? sum / covered : Double.NaN;
        sigma[bin] = enough ? Math.sqrt(Math.max(0, variance)) / covered : Double.NaN;
    }
}
