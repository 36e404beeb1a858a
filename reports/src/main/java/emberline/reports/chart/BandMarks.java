package emberline.reports.chart;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.MolecularBand;
import emberline.catalogue.Purpose;
import emberline.catalogue.RestLine;
import emberline.place.TypeEstimate;
import emberline.reports.chart.LabelRows.Wanted;
import emberline.reports.chart.PlacedLabel.Span;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The labels of a spectrum: the molecular bands that a dwarf of its type shows and the atomic lines
 * that its resolving power separates from them. Without a type the bands of all types are shown.
 */
final class BandMarks {

    private static final int MOST_ROWS = 5;

    /** Label gap in units of the label size. */
    private static final double GAP = 0.45;

    /** Below this resolving power only lines of gravity are marked. */
    private static final double ALL_LINES_FROM = 1000;

    /** Below this resolving power no line is marked. */
    private static final double LINES_FROM = 90;

    /** Least share of a band that must be covered. */
    private static final double LEAST_COVERED = 0.25;

    private final FeatureCatalogue catalogue;
    private final ChartSize size;
    private final TextWidth textWidth;
    private final double low;
    private final double high;

    BandMarks(
            FeatureCatalogue catalogue,
            ChartSize size,
            TextWidth textWidth,
            double low,
            double high) {
        this.catalogue = catalogue;
        this.size = size;
        this.textWidth = textWidth;
        this.low = low;
        this.high = high;
    }

    List<PlacedLabel> of(
            List<Spectrum> spectra, Optional<TypeEstimate> type, double resolvingPower) {
        List<double[]> covered = CoveredRanges.of(spectra);
        List<Wanted> wanted = new ArrayList<>();
        for (MolecularBand band : catalogue.molecularBands()) {
            boolean shown =
                    type.isEmpty()
                            || (type.get().typeNumber() >= band.typeMin() - 0.5
                                    && type.get().typeNumber() <= band.typeMax() + 0.5);
            double from = band.extent().lowMicron();
            double to = band.extent().highMicron();
            if (shown && share(covered, from, to) >= LEAST_COVERED) {
                from = Math.max(from, covered.get(0)[0]);
                to = Math.min(to, covered.get(covered.size() - 1)[1]);
                wanted.add(wanted(band.species(), from, to, Tone.BAND));
            }
        }
        for (RestLine line : catalogue.restLines()) {
            double at = line.vacuumMicron();
            if (isMarked(line, resolvingPower) && share(covered, at, at * 1.0005) > 0) {
                wanted.add(wanted(line.species(), at, at, Tone.LINE));
            }
        }
        double unit = (high - low) / size.widthPoint();
        LabelRows rows = new LabelRows(low, high, GAP * size.labelSizePoint() * unit, MOST_ROWS);
        return rows.place(wanted);
    }

    private Wanted wanted(String species, double from, double to, Tone tone) {
        String text = Species.written(species);
        double unit = (high - low) / size.widthPoint();
        double width = textWidth.point(text, size.labelSizePoint()) * unit;
        return new Wanted(text, width, List.of(new Span(from, to)), tone);
    }

    private static boolean isMarked(RestLine line, double resolvingPower) {
        if (resolvingPower < LINES_FROM) {
            return false;
        }
        boolean gravity = line.purpose() == Purpose.GRAVITY && !line.species().equals("Rb I");
        return gravity || resolvingPower >= ALL_LINES_FROM;
    }

    private static double share(List<double[]> covered, double from, double to) {
        double sum = 0;
        for (double[] piece : covered) {
            sum += Math.max(0, Math.min(to, piece[1]) - Math.max(from, piece[0]));
        }
        return to > from ? sum / (to - from) : 0;
    }
}
