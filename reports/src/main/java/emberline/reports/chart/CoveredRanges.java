package emberline.reports.chart;

import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Which wavelengths the good pixels of some spectra cover. */
final class CoveredRanges {

    private CoveredRanges() {}

    /** The covered ranges of one or several spectra, joined where they touch; low to high. */
    static List<double[]> of(List<Spectrum> spectra) {
        List<double[]> pieces = new ArrayList<>();
        for (Spectrum spectrum : spectra) {
            double[] piece = null;
            for (int i = 0; i < spectrum.size(); i++) {
                if (!spectrum.isGood(i)) {
                    continue;
                }
                double low = spectrum.lowEdgeMicron(i);
                double slack = spectrum.localSpacingMicron(i);
                if (piece != null && low <= piece[1] + slack) {
                    piece[1] = spectrum.highEdgeMicron(i);
                } else {
                    piece = new double[] {low, spectrum.highEdgeMicron(i)};
                    pieces.add(piece);
                }
            }
        }
        pieces.sort(Comparator.comparingDouble(p -> p[0]));
        List<double[]> joined = new ArrayList<>();
        for (double[] piece : pieces) {
            double[] last = joined.isEmpty() ? null : joined.get(joined.size() - 1);
            if (last != null && piece[0] <= last[1]) {
                last[1] = Math.max(last[1], piece[1]);
            } else {
                joined.add(piece);
            }
        }
        return joined;
    }

    /** The gaps between covered ranges that are wider than a limit (micron). */
    static List<double[]> gaps(List<Spectrum> spectra, double widerThanMicron) {
        List<double[]> covered = of(spectra);
        List<double[]> gaps = new ArrayList<>();
        for (int i = 1; i < covered.size(); i++) {
            double from = covered.get(i - 1)[1];
            double to = covered.get(i)[0];
            if (to - from > widerThanMicron) {
                gaps.add(new double[] {from, to});
            }
        }
        return gaps;
    }
}
