package emberline.reports.chart;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.TelluricRegion;
import emberline.place.Placement;
import emberline.place.TypeEstimate;
import emberline.prepare.BandSignal;
import emberline.spectrum.Spectrum;
import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The spectrum of an object with its one-sigma band; bands and lines labelled in rows above it;
 * telluric regions marked at the bottom, the opaque ones over the full height; gaps hatched.
 */
public final class SpectrumChart {

    /** Below this signal-to-noise a long spectrum is shown as means, with its pixels behind. */
    private static final double NOISY = 12;

    /** Pixels of a good spectrum with more noise than this share of its peak are pale. */
    private static final double SPOILT = 0.25;

    /** Signal-to-noise from which a mean needs no further pixels. */
    private static final double PLAIN = 20;

    /** About so many means are shown of a noisy spectrum. */
    private static final int MEANS = 260;

    /** A gap is hatched when it is wider than this share of the axis. */
    private static final double WIDE_GAP = 0.004;

    /** Share of the axis that stays free at either end. */
    private static final double MARGIN = 0.008;

    private static final double STRIP_SHARE = 0.018;
    private static final double LOWEST = -0.35;
    private static final double HIGHEST = 1.7;

    private final FeatureCatalogue catalogue;
    private final ChartSize size;
    private final TextWidth textWidth;

    /**
     * A builder of spectrum charts.
     *
     * @param catalogue bands, lines and telluric regions
     * @param size the room inside the axes
     * @param textWidth how wide labels are
     */
    public SpectrumChart(FeatureCatalogue catalogue, ChartSize size, TextWidth textWidth) {
        this.catalogue = catalogue;
        this.size = size;
        this.textWidth = textWidth;
    }

    /**
     * A chart with what must be said below it.
     *
     * @param chart the chart
     * @param remark how the curve was made, in a sentence; empty where pixels are shown as they are
     */
    public record Drawn(Chart chart, String remark) {}

    /**
     * The chart of an object.
     *
     * @param result the result of an object with at least one spectrum
     * @return the chart
     * @throws IllegalArgumentException if there is no spectrum
     */
    public Drawn of(ObjectResult result) {
        if (result.spectra().isEmpty()) {
            throw new IllegalArgumentException(
                    result.candidate().name() + " has no spectrum: expected at least one");
        }
        List<Spectrum> spectra =
                result.spectra().stream().map(s -> s.prepared().spectrum()).toList();
        double from = spectra.stream().mapToDouble(s -> s.lowEdgeMicron(0)).min().orElseThrow();
        double to =
                spectra.stream()
                        .mapToDouble(s -> s.highEdgeMicron(s.size() - 1))
                        .max()
                        .orElseThrow();
        double margin = MARGIN * (to - from);
        double low = from - margin;
        double high = to + margin;
        List<Curve> curves = new ArrayList<>();
        List<String> remarks = new ArrayList<>();
        Heights heights = new Heights();
        List<Shown> shown = spectra.stream().map(one -> shown(one, low, high)).toList();
        double[] factors = factors(shown);
        for (int i = 0; i < factors.length; i++) {
            addSpectrum(shown.get(i), factors[i], curves, remarks, heights);
        }
        result.standards()
                .filter(verdict -> !verdict.best().isEmpty())
                .map(verdict -> StandardOverlay.of(verdict, spectra, factors))
                .ifPresent(
                        overlay -> {
                            curves.add(overlay.curve());
                            remarks.add(overlay.remark());
                        });
        if (spectra.size() > 1) {
            remarks.add("Several spectra are scaled to the first where they overlap.");
        }
        BandMarks marks = new BandMarks(catalogue, size, textWidth, low, high);
        List<PlacedLabel> labels = marks.of(spectra, type(result), resolvingPower(result));
        double rowHeight = size.labelSizePoint() + 4.5;
        double room = labels.stream().mapToInt(l -> l.row() + 1).max().orElse(0) * rowHeight + 4;
        double share = Math.min(0.45, room / size.heightPoint());
        double top = heights.high + (heights.high - heights.low) * share / (1 - share);
        List<Layer> layers = new ArrayList<>(telluric(low, high, 1 - share));
        layers.addAll(gaps(spectra, low, high, 1 - share));
        curves.forEach(curve -> layers.add(curve.upTo(heights.high)));
        layers.add(new Layer.Labels(labels, rowHeight));
        Axis x = new Axis("Wavelength", "µm, vacuum", low, high, Ticks.round(low, high, 10));
        Axis y =
                new Axis(
                        "Normalised flux F\u03bb",
                        "",
                        heights.low,
                        top,
                        Ticks.round(heights.low, heights.high, 5));
        return new Drawn(new Chart("", x, y, layers), String.join(" ", remarks));
    }

    /** The range of heights that is shown. */
    private static final class Heights {
        private double low = -0.03;
        private double high = 1.05;

        void include(double lowest, double highest) {
            low = Math.max(LOWEST, Math.min(low, lowest));
            high = Math.min(HIGHEST, Math.max(high, highest));
        }
    }

    /**
     * By what the fluxes of each spectrum are multiplied: all are scaled to the first where they
     * overlap, and the highest peak of all is 1.
     */
    private static double[] factors(List<Shown> shown) {
        double[] factors = new double[shown.size()];
        double highest = 0;
        for (int i = 0; i < factors.length; i++) {
            double peak = shown.get(i).peak();
            double alone = peak > 0 ? 1 / peak : 1;
            OptionalDouble toFirst =
                    i == 0
                            ? OptionalDouble.empty()
                            : OverlapScale.of(shown.get(i).spectrum, shown.get(0).spectrum);
            factors[i] = toFirst.isPresent() ? toFirst.getAsDouble() * factors[0] : alone;
            highest = Math.max(highest, factors[i] * peak);
        }
        for (int i = 0; i < factors.length && highest > 0; i++) {
            factors[i] /= highest;
        }
        return factors;
    }

    /**
     * A spectrum as it can be shown: single pixels, and where they are noisy means of so many at
     * once.
     */
    private record Shown(
            Spectrum spectrum, Reduction pixels, Reduction means, int atOnce, boolean noisy) {

        double peak() {
            return noisy && means.size() > 0 ? means.peak() : pixels.peak();
        }
    }

    private Shown shown(Spectrum spectrum, double low, double high) {
        int columns = (int) Math.round(1.2 * size.widthPoint());
        int atOnce = Math.max(1, spectrum.size() / MEANS);
        boolean noisy =
                BandSignal.best(spectrum).map(s -> s.medianSignalToNoise() < NOISY).orElse(false);
        return new Shown(
                spectrum,
                Reduction.ofPixels(spectrum, low, high, columns),
                Reduction.ofMeans(spectrum, atOnce, PLAIN),
                atOnce,
                noisy);
    }

    private static void addSpectrum(
            Shown shown, double factor, List<Curve> curves, List<String> remarks, Heights heights) {
        Reduction pixels = shown.pixels;
        if (shown.noisy && shown.atOnce > 1 && shown.means.size() > 0) {
            curves.add(pixels.curve(factor, Tone.PIXELS, false));
            curves.add(shown.means.curve(factor, Tone.SPECTRUM, true));
            remarks.add("Dark: means of up to " + shown.atOnce + " pixels; light: single pixels.");
        } else if (shown.noisy) {
            curves.add(pixels.curve(factor, Tone.SPECTRUM, true));
        } else {
            Reduction spoilt = pixels.bySigma(SPOILT / factor, true);
            if (spoilt.size() > 0) {
                curves.add(spoilt.curve(factor, Tone.PIXELS, false));
                remarks.add("Light: pixels with a noise above a quarter of the peak.");
            }
            pixels = pixels.bySigma(SPOILT / factor, false);
            curves.add(pixels.curve(factor, Tone.SPECTRUM, true));
        }
        heights.include(
                factor * pixels.quantile(0.004) - 0.02, factor * pixels.quantile(0.996) + 0.04);
    }

    private static Optional<TypeEstimate> type(ObjectResult result) {
        return result.placement().flatMap(Placement::type);
    }

    private static double resolvingPower(ObjectResult result) {
        double finest = 0;
        for (SpectrumResult spectrum : result.spectra()) {
            finest = Math.max(finest, spectrum.prepared().resolvingPower().value());
        }
        return finest;
    }

    private List<Layer> telluric(double low, double high, double topShare) {
        List<Layer> regions = new ArrayList<>();
        for (TelluricRegion region : catalogue.telluricRegions()) {
            double from = Math.max(low, region.window().lowMicron());
            double to = Math.min(high, region.window().highMicron());
            if (!(from < to)) {
                continue;
            }
            Tone tone =
                    switch (region.strength()) {
                        case OPAQUE -> Tone.TELLURIC_OPAQUE;
                        case STRONG -> Tone.TELLURIC_STRONG;
                        case WET -> Tone.TELLURIC_WET;
                        case WEAK -> Tone.TELLURIC_WEAK;
                    };
            boolean opaque = tone == Tone.TELLURIC_OPAQUE;
            if (opaque) {
                regions.add(
                        new Layer.Region(
                                from, to, STRIP_SHARE, topShare, Tone.TELLURIC_WEAK, false));
            }
            regions.add(new Layer.Region(from, to, 0, STRIP_SHARE, tone, false));
        }
        return regions;
    }

    private static List<Layer> gaps(
            List<Spectrum> spectra, double low, double high, double topShare) {
        List<Layer> gaps = new ArrayList<>();
        double widest = WIDE_GAP * (high - low);
        for (double[] gap : CoveredRanges.gaps(spectra, widest)) {
            gaps.add(new Layer.Region(gap[0], gap[1], STRIP_SHARE, topShare, Tone.GAP, true));
        }
        return gaps;
    }
}
