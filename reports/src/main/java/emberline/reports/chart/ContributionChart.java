package emberline.reports.chart;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.place.calibrated.Contribution;
import emberline.reports.chart.Axis.Tick;
import emberline.reports.chart.Layer.Block;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * Which features pulled the type which way: a bar for each, to the right where it pulls to later
 * types. Features that were set aside as outliers are open bars.
 */
public final class ContributionChart {

    private static final double HALF = 0.34;
    private static final double LEAST_REACH = 0.1;

    /** Part of the rows that features set aside may take up. */
    private static final int SET_ASIDE_PART = 3;

    private ContributionChart() {}

    /**
     * The chart of the features that matter most.
     *
     * @param contributions what each feature did; at least one
     * @param catalogue the names of the features
     * @param mostRows the most rows, at least 3
     * @return rows from top to bottom at whole heights down to 1, the latest pull first
     */
    public static Chart of(
            List<Contribution> contributions, FeatureCatalogue catalogue, int mostRows) {
        List<Contribution> shown = shown(contributions, mostRows);
        double reach = LEAST_REACH;
        for (Contribution one : shown) {
            reach = Math.max(reach, Math.abs(one.pullSubclass()));
        }
        reach *= 1.08;
        List<Block> later = new ArrayList<>();
        List<Block> earlier = new ArrayList<>();
        List<Block> aside = new ArrayList<>();
        List<Tick> rows = new ArrayList<>();
        int row = shown.size();
        for (Contribution one : shown) {
            double pull = one.pullSubclass();
            Block block = new Block(Math.min(0, pull), Math.max(0, pull), row - HALF, row + HALF);
            (one.setAside() ? aside : pull >= 0 ? later : earlier).add(block);
            rows.add(new Tick(row, label(one, catalogue)));
            row--;
        }
        List<Layer> layers = new ArrayList<>();
        layers.add(new Layer.Blocks(later, Tone.TOWARDS, true));
        layers.add(new Layer.Blocks(earlier, Tone.AGAINST, true));
        layers.add(new Layer.Blocks(aside, Tone.SET_ASIDE, true));
        layers.add(new Layer.Segment(0, 0.3, 0, shown.size() + 0.7, Tone.SPECTRUM, false));
        Axis x =
                new Axis(
                        "Pull on the type",
                        "subclass, + later",
                        -reach,
                        reach,
                        Ticks.round(-reach, reach, 4));
        return new Chart("", x, new Axis("", "", 0.3, shown.size() + 0.7, rows), layers);
    }

    /** Those with the most information, and the strongest of those set aside; latest pull first. */
    private static List<Contribution> shown(List<Contribution> all, int mostRows) {
        Set<Contribution> chosen = new HashSet<>();
        all.stream()
                .filter(Contribution::setAside)
                .sorted(
                        Comparator.comparingDouble(
                                        (Contribution c) -> -Math.abs(c.deviationSigma()))
                                .thenComparing(Contribution::feature))
                .limit(mostRows / SET_ASIDE_PART)
                .forEach(chosen::add);
        all.stream()
                .filter(c -> !c.setAside())
                .sorted(
                        Comparator.comparingDouble(
                                        (Contribution c) ->
                                                -Math.max(c.share(), Math.abs(c.pullSubclass())))
                                .thenComparing(Contribution::feature))
                .limit(mostRows - chosen.size())
                .forEach(chosen::add);
        return chosen.stream()
                .sorted(
                        Comparator.comparingDouble((Contribution c) -> -c.pullSubclass())
                                .thenComparing(Contribution::feature))
                .toList();
    }

    private static String label(Contribution one, FeatureCatalogue catalogue) {
        return catalogue.feature(one.feature()).map(ContributionChart::label).orElse(one.feature());
    }

    private static String label(Feature feature) {
        return feature.symbol() + "\u2002" + feature.source().year();
    }
}
