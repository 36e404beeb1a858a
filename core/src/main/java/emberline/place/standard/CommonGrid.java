package emberline.place.standard;

import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.List;

/**
 * A grid of bins on which spectra of different instruments can be compared. Bins are one resolution
 * element of the coarsest spectrum wide; a flux is the mean over its bin with fractional pixels, so
 * that the flux in the bins is that in the pixels.
 */
final class CommonGrid {

    /** Share of a bin that good pixels must cover. */
    private static final double LEAST_COVERAGE = 0.8;

    private final double[] edges;

    private CommonGrid(double[] edges) {
        this.edges = edges;
    }

    /** Fluxes with their one-sigma errors in the bins; NaN where a bin is not covered. */
    @SuppressWarnings("ArrayRecordComponent") // never compared
    record Binned(double[] flux, double[] sigma) {}

    /**
     * A grid over some ranges.
     *
     * @param ranges pairs of low and high wavelength (micron), increasing
     * @param resolvingPower resolving power of the coarsest spectrum
     */
    static CommonGrid over(List<double[]> ranges, double resolvingPower) {
        List<Double> edges = new ArrayList<>();
        for (double[] range : ranges) {
            double step = 1 / resolvingPower;
            int bins = Math.max(1, (int) (Math.log(range[1] / range[0]) / step));
            for (int k = 0; k < bins; k++) {
                edges.add(range[0] * Math.exp(k * step));
                edges.add(range[0] * Math.exp((k + 1) * step));
            }
        }
        return new CommonGrid(edges.stream().mapToDouble(Double::doubleValue).toArray());
    }

    int size() {
        return edges.length / 2;
    }

    double centreMicron(int bin) {
        return 0.5 * (edges[2 * bin] + edges[2 * bin + 1]);
    }

    Binned of(PreparedSpectrum prepared) {
        Spectrum spectrum = prepared.spectrum();
        double[] flux = new double[size()];
        double[] sigma = new double[size()];
        for (int bin = 0; bin < size(); bin++) {
            bin(spectrum, prepared.noise().lag1(), bin, flux, sigma);
        }
        return new Binned(flux, sigma);
    }

    private void bin(Spectrum spectrum, double lag1, int bin, double[] flux, double[] sigma) {
        double low = edges[2 * bin];
        double high = edges[2 * bin + 1];
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
