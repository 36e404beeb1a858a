package emberline.reports.chart;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.place.PublishedType;
import emberline.place.RelationEstimate;
import emberline.place.RelationEstimate.Use;
import emberline.place.TypeEstimate;
import emberline.reports.chart.Axis.Tick;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * The type of an object: each published relation as a point with its error in a row of its own,
 * those that were combined above those that are shown for comparison, and the combined type with
 * its 68% and 95% intervals at the bottom.
 */
public final class PosteriorChart {

    /** At least this much of the sequence is shown (subclass). */
    private static final double LEAST_WIDTH = 8;

    /** Points further than this from all else are left to the table (subclass). */
    private static final double FAR = 9;

    private static final double EARLIEST = -2;
    private static final double LATEST = 32;

    private PosteriorChart() {}

    /**
     * The chart of a type.
     *
     * @param type what the published relations say
     * @param catalogue the names of the indices
     * @param mostRows the most relations that are shown, at least 1; those that were combined go
     *     first
     * @return the chart; the heights of its rows are whole numbers, that of the combined type 0
     */
    public static Chart of(PublishedType type, FeatureCatalogue catalogue, int mostRows) {
        List<RelationEstimate> shown = shown(type, mostRows);
        List<Layer.Point> used = new ArrayList<>();
        List<Layer.Point> aside = new ArrayList<>();
        List<Tick> rows = new ArrayList<>();
        int row = shown.size();
        for (RelationEstimate estimate : shown) {
            TypeEstimate given = estimate.type().orElseThrow();
            Layer.Point point =
                    new Layer.Point(given.typeNumber(), given.lo68(), given.hi68(), row, row, row);
            (estimate.use() == Use.COMBINED ? used : aside).add(point);
            rows.add(new Tick(row, rowLabel(estimate, catalogue)));
            row--;
        }
        double[] range = range(type, shown);
        List<Layer> layers = new ArrayList<>();
        type.type().ifPresent(combined -> layers.addAll(intervals(combined)));
        layers.add(new Layer.Points(aside, Tone.SHOWN, false));
        layers.add(new Layer.Points(used, Tone.USED, true));
        if (type.type().isPresent()) {
            double at = type.type().get().typeNumber();
            Layer.Point point = new Layer.Point(at, at, at, 0, 0, 0);
            layers.add(new Layer.Points(List.of(point), Tone.RESULT, true));
            rows.add(new Tick(0, "combined"));
        }
        List<Tick> types = Ticks.types(range[0], range[1], 9);
        Axis x = new Axis("Spectral type", "", range[0], range[1], types);
        Axis y = new Axis("", "", -0.8, shown.size() + 0.8, rows);
        return new Chart("", x, y, layers);
    }

    /** The combined type: its 68% interval over the full height, both intervals as bars. */
    private static List<Layer> intervals(TypeEstimate type) {
        return List.of(
                new Layer.Region(type.lo68(), type.hi68(), 0, 1, Tone.RESULT_95, false),
                new Layer.Interval(type.lo95(), type.hi95(), 0, 0.12, Tone.RESULT_95),
                new Layer.Interval(type.lo68(), type.hi68(), 0, 0.28, Tone.RESULT_68));
    }

    /** The relations with a type, the combined ones first, in the order of their types. */
    private static List<RelationEstimate> shown(PublishedType type, int mostRows) {
        double centre = type.type().map(TypeEstimate::typeNumber).orElse(Double.NaN);
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

    private static double[] range(PublishedType type, List<RelationEstimate> shown) {
        double low = type.type().map(TypeEstimate::lo95).orElse(LATEST);
        double high = type.type().map(TypeEstimate::hi95).orElse(EARLIEST);
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
        return symbol + "\u2002" + estimate.relation().source().shortCite();
    }
}
