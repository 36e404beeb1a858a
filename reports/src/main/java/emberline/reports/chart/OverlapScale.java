package emberline.reports.chart;

import emberline.spectrum.Spectrum;
import java.util.Arrays;

/** Brings a spectrum to the scale of another one for a plot. */
final class OverlapScale {

    private static final int FEWEST = 5;

    private OverlapScale() {}

    /**
     * The factor for a spectrum so that its median flux where both have pixels is that of the
     * other, whose peak is one.
     *
     * @param ownFactor the factor where they do not overlap
     */
    static double of(Spectrum spectrum, Spectrum first, double ownFactor) {
        double from = Math.max(spectrum.wavelengthMicron(0), first.wavelengthMicron(0));
        double to =
                Math.min(
                        spectrum.wavelengthMicron(spectrum.size() - 1),
                        first.wavelengthMicron(first.size() - 1));
        double here = median(spectrum, from, to);
        double there = median(first, from, to);
        Reduction means = Reduction.ofMeans(first, Math.max(1, first.size() / 260));
        double peak = means.size() > 0 ? means.peak() : 1;
        return here > 0 && there > 0 && peak > 0 ? there / here / peak : ownFactor;
    }

    private static double median(Spectrum spectrum, double from, double to) {
        double[] values = new double[spectrum.size()];
        int count = 0;
        for (int i = 0; i < spectrum.size(); i++) {
            double w = spectrum.wavelengthMicron(i);
            if (spectrum.isGood(i) && w >= from && w <= to) {
                values[count++] = spectrum.flux(i);
            }
        }
        if (count < FEWEST) {
            return Double.NaN;
        }
        double[] sorted = Arrays.copyOf(values, count);
        Arrays.sort(sorted);
        return sorted[count / 2];
    }
}
