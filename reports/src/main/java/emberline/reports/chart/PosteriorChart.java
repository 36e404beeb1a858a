package emberline.reports.chart;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Source;
import emberline.place.Placement;
import emberline.place.PublishedType;
import emberline.place.RelationEstimate;
import emberline.place.RelationEstimate.Use;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.reports.chart.Axis.Tick;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * The type of an object: each published relation as a point with its error in a row of its own,
 * those that were combined above those that are shown for comparison, under them the type that the
 * relations give together, and at the bottom the posterior with that type marked in it by a dashed
 * line and the 68% and 95% intervals of the adopted type.
 */
public final class PosteriorChart {

    /** At least this much of the sequence is shown (subclass). */
    private static final double LEAST_WIDTH = 8;

    /** Points further than this from all else are left to the table (subclass). */
    private static final double FAR = 9;

    private static final double EARLIEST = -2;
    private static final double LATEST = 32;

    /** Rows that the posterior takes up below the relations. */
    private static final double POSTERIOR_ROWS = 3;

    /** Where the posterior stands, one row below the combined type. */
    private static final double FOOT = -0.8 - POSTERIOR_ROWS;

    private PosteriorChart() {}

    /**
     * The chart of a type.
     *
     * @param placement what the witnesses say
     * @param catalogue the names of the indices
     * @param mostRows the most relations that are shown, at least 1; those that were combined go
     *     first
     * @return the chart; the heights of its rows are whole numbers, that of the combined type 0
     */
    public static Chart of(Placement placement, FeatureCatalogue catalogue, int mostRows) {
        PublishedType type = placement.published();
        List<RelationEstimate> shown = shown(placement, mostRows);
        List<Layer.Point> used = new ArrayList<>();
        List<Layer.Point> aside = new ArrayList<>();
        List<Tick> rows = new ArrayList<>();
        int row = shown.size();
        for (RelationEstimate estimate : shown) {
            TypeEstimate given = estimate.type().orElseThrow();
            (estimate.use() == Use.COMBINED ? used : aside).add(point(given, row));
            rows.add(new Tick(row, rowLabel(estimate, catalogue)));
            row--;
        }
        double[] range = range(placement, shown);
        List<Layer> layers = new ArrayList<>();
        placement
                .type()
                .ifPresent(
                        adopted ->
                                layers.add(
                                        new Layer.Region(
                                                adopted.lo68(),
                                                adopted.hi68(),
                                                0,
                                                1,
                                                Tone.RESULT_95,
                                                false)));
        layers.add(new Layer.Points(aside, Tone.SHOWN, false));
        layers.add(new Layer.Points(used, Tone.USED, true));
        if (type.type().isPresent()) {
            layers.add(new Layer.Points(List.of(point(type.type().get(), 0)), Tone.USED, false));
            rows.add(new Tick(0, "published, combined"));
        }
        double foot = -0.8;
        if (placement.calibrated().posterior().isPresent()) {
            layers.addAll(posterior(placement.calibrated().posterior().get(), range));
            type.type()
                    .ifPresent(
                            published ->
                                    layers.add(
                                            new Layer.Segment(
                                                    published.typeNumber(),
                                                    -0.45,
                                                    published.typeNumber(),
                                                    FOOT + 0.7,
                                                    Tone.USED,
                                                    true)));
            rows.add(new Tick(FOOT + POSTERIOR_ROWS / 2, "posterior"));
            foot = FOOT;
        }
        List<Tick> types = Ticks.types(range[0], range[1], 9);
        Axis x = new Axis("Spectral type", "", range[0], range[1], types);
        Axis y = new Axis("", "", foot, shown.size() + 0.8, rows);
        return new Chart("", x, y, layers);
    }

    private static Layer.Point point(TypeEstimate given, double row) {
        return new Layer.Point(given.typeNumber(), given.lo68(), given.hi68(), row, row, row);
    }

    /** The posterior as an area, and under it the intervals of the type. */
    private static List<Layer> posterior(TypePosterior posterior, double[] range) {
        double highest = 0;
        for (int i = 0; i < posterior.size(); i++) {
            highest = Math.max(highest, posterior.probability(i));
        }
        double base = FOOT + 0.7;
        double tall = POSTERIOR_ROWS - 1.2;
        List<Layer.Vertex> lower = new ArrayList<>();
        List<Layer.Vertex> upper = new ArrayList<>();
        for (int i = 0; i < posterior.size(); i++) {
            double type = posterior.typeNumber(i);
            if (type >= range[0] && type <= range[1]) {
                lower.add(new Layer.Vertex(type, base));
                upper.add(new Layer.Vertex(type, base + tall * posterior.probability(i) / highest));
            }
        }
        TypeEstimate type = posterior.estimate();
        double bars = FOOT + 0.35;
        return List.of(
                new Layer.Area(lower, upper, Tone.RESULT_68, ""),
                new Layer.Interval(type.lo95(), type.hi95(), bars, 0.12, Tone.RESULT_95),
                new Layer.Interval(type.lo68(), type.hi68(), bars, 0.28, Tone.RESULT_68));
    }

    /** The relations with a type, the combined ones first, in the order of their types. */
    private static List<RelationEstimate> shown(Placement placement, int mostRows) {
        PublishedType type = placement.published();
        double centre = placement.type().map(TypeEstimate::typeNumber).orElse(Double.NaN);
        Comparator<RelationEstimate> byType =
                Comparator.comparingDouble(e -> e.type().orElseThrow().typeNumber());
        List<RelationEstimate> used =
                type.estimates().stream()
                        .filter(e -> e.use() == Use.COMBINED && e.type().isPresent())
                        .sorted(byType)
                        .limit(mostRows)
                        .toList();
        List<RelationEstimate> shown = new ArrayList<>(used);
        type.estimates().stream()
                .filter(e -> e.use() != Use.COMBINED && e.type().isPresent())
                .filter(
                        e ->
                                Double.isNaN(centre)
                                        || Math.abs(e.type().get().typeNumber() - centre) < FAR)
                .limit(mostRows - used.size())
                .sorted(byType)
                .forEach(shown::add);
        return shown;
    }

    private static double[] range(Placement placement, List<RelationEstimate> shown) {
        double low = placement.type().map(TypeEstimate::lo95).orElse(LATEST);
        double high = placement.type().map(TypeEstimate::hi95).orElse(EARLIEST);
        for (RelationEstimate estimate : shown) {
            low = Math.min(low, estimate.type().orElseThrow().lo68());
            high = Math.max(high, estimate.type().orElseThrow().hi68());
        }
        low = Math.max(EARLIEST, low - 0.5);
        high = Math.min(LATEST, high + 0.5);
        if (!(low < high)) {
            return new double[] {0, 30};
        }
        double missing = Math.max(0, LEAST_WIDTH - (high - low)) / 2;
        return new double[] {low - missing, high + missing};
    }

    private static String rowLabel(RelationEstimate estimate, FeatureCatalogue catalogue) {
        String id = estimate.relation().feature();
        String symbol = catalogue.feature(id).map(Feature::symbol).orElse(id);
        Source source = estimate.relation().source();
        int comma = source.authors().indexOf(',');
        String authors =
                comma < 0 ? source.authors() : source.authors().substring(0, comma) + " et al.";
        return symbol + "\u2002" + authors + " " + source.year();
    }
}
