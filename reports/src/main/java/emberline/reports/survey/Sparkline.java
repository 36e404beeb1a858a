package emberline.reports.survey;

import emberline.spectrum.Spectrum;
import java.util.Locale;

/**
 * A spectrum as a short text for a thumbnail: one sign a column, 64 levels, a dot where there are
 * no data. All thumbnails cover 0.6 to 2.45 micron in equal steps of log wavelength, so that
 * features stand below each other; a spectrum of which less than a fifth lies there is drawn over
 * its own range, which stands before its signs ({@code 0.350~0.550~ABC...}, in micron).
 */
final class Sparkline {

    private static final String SIGNS =
            "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_";
    private static final char GAP = '.';
    private static final int COLUMNS = 120;
    private static final double LOW_MICRON = 0.6;
    private static final double HIGH_MICRON = 2.45;
    private static final double LEAST_INSIDE = 0.2;

    /** Columns whose mean has less signal-to-noise do not set the scale. */
    private static final double CLEAR = 3;

    private Sparkline() {}

    static String of(Spectrum spectrum) {
        String range = "";
        double low = LOW_MICRON;
        double high = HIGH_MICRON;
        int last = spectrum.size() - 1;
        int inside = spectrum.firstAtOrAbove(high) - spectrum.firstAtOrAbove(low);
        if (inside < LEAST_INSIDE * spectrum.size()) {
            low = spectrum.lowEdgeMicron(0);
            high = spectrum.highEdgeMicron(last);
            range = String.format(Locale.ROOT, "%.3f~%.3f~", low, high);
        }
        double step = Math.log(high / low) / COLUMNS;
        double[] sums = new double[COLUMNS];
        double[] weights = new double[COLUMNS];
        for (int i = 0; i <= last; i++) {
            if (spectrum.isGood(i)) {
                int from = (int) Math.floor(Math.log(spectrum.lowEdgeMicron(i) / low) / step);
                int to = (int) Math.floor(Math.log(spectrum.highEdgeMicron(i) / low) / step);
                double sigma = spectrum.fluxSigma(i);
                double weight = sigma > 0 ? 1 / (sigma * sigma) : 1;
                for (int c = Math.max(0, from); c <= Math.min(COLUMNS - 1, to); c++) {
                    sums[c] += weight * spectrum.flux(i);
                    weights[c] += weight;
                }
            }
        }
        return range + text(sums, weights);
    }

    private static String text(double[] sums, double[] weights) {
        double clear = 0;
        double any = 0;
        for (int c = 0; c < COLUMNS; c++) {
            if (weights[c] > 0) {
                double mean = sums[c] / weights[c];
                any = Math.max(any, mean);
                clear = mean * Math.sqrt(weights[c]) > CLEAR ? Math.max(clear, mean) : clear;
            }
        }
        double peak = clear > 0 ? clear : any;
        StringBuilder text = new StringBuilder(COLUMNS);
        for (int c = 0; c < COLUMNS; c++) {
            double level = weights[c] > 0 && peak > 0 ? sums[c] / weights[c] / peak : Double.NaN;
            if (Double.isFinite(level)) {
                int sign = (int) Math.round(level * (SIGNS.length() - 1));
                text.append(SIGNS.charAt(Math.max(0, Math.min(SIGNS.length() - 1, sign))));
            } else {
                text.append(GAP);
            }
        }
        return text.toString();
    }
}
