package emberline.reports.chart;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.GravityThreshold;
import emberline.measure.Measurement.Measured;
import emberline.place.GravityScore;
import emberline.place.TypeEstimate;
import emberline.place.calibrated.Calibration;
import emberline.reports.chart.Layer.Vertex;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * One gravity-sensitive index against type: the published limits of intermediate and very low
 * gravity as areas over the types for which they are printed, the calibrated loci of field gravity
 * (full line) and very low gravity (dashed), and the object with its errors.
 */
public final class GravityChart {

    private static final double FIRST_TYPE = 5.5;
    private static final double LAST_TYPE = 17.5;

    private static final double LOCUS_STEP = 0.25;

    /** Room beside an object (subclass). */
    private static final double BESIDE = 0.7;

    /** By how much the axis is made longer for an object at most (subclass). */
    private static final double FURTHER = 2;

    private final FeatureCatalogue catalogue;
    private final Calibration calibration;

    /**
     * A builder of gravity charts.
     *
     * @param catalogue the published limits
     * @param calibration the loci
     */
    public GravityChart(FeatureCatalogue catalogue, Calibration calibration) {
        this.catalogue = catalogue;
        this.calibration = calibration;
    }

    /**
     * The chart of one feature.
     *
     * @param score what came of the feature
     * @param type the type of the object; empty where it has none
     * @return the chart; the object is left out where it has no type or the index no value
     */
    public Chart of(GravityScore score, Optional<TypeEstimate> type) {
        Feature feature = score.feature();
        List<GravityThreshold> limits =
                catalogue.gravityThresholds().stream()
                        .filter(t -> t.feature().equals(feature.id()))
                        .sorted(Comparator.comparingDouble(GravityThreshold::typeNumber))
                        .toList();
        List<Layer.Point> object = object(score, type);
        double[] range = heights(limits, object);
        List<Vertex> intermediate =
                limits.stream().map(t -> new Vertex(t.typeNumber(), t.intermediate())).toList();
        List<Vertex> veryLow =
                limits.stream().map(t -> new Vertex(t.typeNumber(), t.veryLow())).toList();
        boolean below = score.lowGravityIfBelow();
        List<Vertex> end = level(limits, below ? range[0] : range[1]);
        List<Vertex> field = level(limits, below ? range[1] : range[0]);
        List<Layer> layers = new ArrayList<>();
        layers.add(area(intermediate, field, below, Tone.FIELD, "FLD"));
        layers.add(area(veryLow, intermediate, below, Tone.INTERMEDIATE, "INT"));
        layers.add(area(end, veryLow, below, Tone.VERY_LOW, "VL"));
        double first = FIRST_TYPE;
        double last = LAST_TYPE;
        for (Layer.Point point : object) {
            first = Math.max(FIRST_TYPE - FURTHER, Math.min(first, point.x() - BESIDE));
            last = Math.min(LAST_TYPE + FURTHER, Math.max(last, point.x() + BESIDE));
        }
        locus(feature.id(), 0, Tone.LOCUS_FIELD, first, last).ifPresent(layers::add);
        locus(feature.id(), 1, Tone.LOCUS_VERY_LOW, first, last).ifPresent(layers::add);
        layers.add(new Layer.Points(object, Tone.RESULT, true));
        Axis x = new Axis("", "", first, last, Ticks.types(first, last, 6));
        Axis y = new Axis("", "", range[0], range[1], Ticks.round(range[0], range[1], 4));
        return new Chart(feature.symbol(), x, y, layers);
    }

    private Optional<Layer> locus(
            String feature, double lowGravity, Tone tone, double first, double last) {
        int points = (int) ((last - first) / LOCUS_STEP) + 1;
        double[] types = new double[points];
        double[] values = new double[points];
        for (int i = 0; i < points; i++) {
            types[i] = first + i * LOCUS_STEP;
            Optional<Calibration.Expected> expected =
                    calibration.expected(feature, types[i], lowGravity);
            if (expected.isEmpty()) {
                return Optional.empty();
            }
            values[i] = expected.get().mean();
        }
        return Optional.of(Curve.line(types, values, tone));
    }

    private static List<Layer.Point> object(GravityScore score, Optional<TypeEstimate> type) {
        boolean shown =
                type.isPresent()
                        && type.get().hi95() > FIRST_TYPE
                        && type.get().lo95() < LAST_TYPE
                        && score.index() instanceof Measured;
        if (!shown) {
            return List.of();
        }
        Measured index = (Measured) score.index();
        TypeEstimate at = type.orElseThrow();
        return List.of(
                new Layer.Point(
                        at.typeNumber(),
                        at.lo68(),
                        at.hi68(),
                        index.value(),
                        index.value() - index.oneSigma(),
                        index.value() + index.oneSigma()));
    }

    private static double[] heights(List<GravityThreshold> limits, List<Layer.Point> object) {
        double low = Double.POSITIVE_INFINITY;
        double high = Double.NEGATIVE_INFINITY;
        for (GravityThreshold limit : limits) {
            low = Math.min(low, Math.min(limit.intermediate(), limit.veryLow()));
            high = Math.max(high, Math.max(limit.intermediate(), limit.veryLow()));
        }
        double room = 0.3 * (high - low);
        double farthest = 1.5 * (high - low);
        double first = low - farthest;
        double last = high + farthest;
        low -= room;
        high += room;
        for (Layer.Point point : object) {
            low = Math.max(first, Math.min(low, point.yLow() - room / 2));
            high = Math.min(last, Math.max(high, point.yHigh() + room / 2));
        }
        return new double[] {low, high};
    }

    private static List<Vertex> level(List<GravityThreshold> limits, double height) {
        return List.of(
                new Vertex(limits.get(0).typeNumber(), height),
                new Vertex(limits.get(limits.size() - 1).typeNumber(), height));
    }

    /** The area from one chain to the next one away from low gravity. */
    private static Layer.Area area(
            List<Vertex> lower, List<Vertex> upper, boolean below, Tone tone, String label) {
        return below
                ? new Layer.Area(lower, upper, tone, label)
                : new Layer.Area(upper, lower, tone, label);
    }
}
