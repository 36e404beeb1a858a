package emberline.reports.chart;

import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.OptionalDouble;

/** Brings a spectrum to the scale of another one for a plot. */
final class OverlapScale {

    private static final int FEWEST = 5;

    private OverlapScale() {}

    /**
     * The factor that brings the median flux of a spectrum, where both have pixels, to that of
     * another.
     *
     * @param spectrum the spectrum to be scaled
     * @param other the other
     * @return the factor; empty where they do not overlap by five pixels or a median is not
     *     positive
     */
    static OptionalDouble of(Spectrum spectrum, Spectrum other) {
        double from = Math.max(spectrum.wavelengthMicron(0), other.wavelengthMicron(0));
        double to =
                Math.min(
                        spectrum.wavelengthMicron(spectrum.size() - 1),
                        other.wavelengthMicron(other.size() - 1));
        double here = median(spectrum, from, to);
        double there = median(other, from, to);
        return here > 0 && there > 0 ? OptionalDouble.of(there / here) : OptionalDouble.empty();
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
