package emberline.measure;

import emberline.catalogue.Feature;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.FeatureWindow;
import emberline.catalogue.Part;
import emberline.catalogue.TelluricRegion;
import emberline.catalogue.TelluricRegion.Strength;
import emberline.catalogue.Window;
import emberline.measure.Measurement.NotMeasured;
import emberline.measure.Measurement.Why;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * How much of a feature lies in regions that the atmosphere spoils at the site of the observation.
 * Such a feature is measured and flagged; it is refused only where more than half of one of its
 * windows lies where hardly any light comes through.
 */
final class TelluricCheck {

    private static final double MOST_OPAQUE = 0.5;

    private final FeatureCatalogue catalogue;
    private final List<TelluricRegion> regions;
    private final Site site;

    /**
     * A check.
     *
     * @param catalogue where the parts of composite features are looked up
     * @param regions what the atmosphere can spoil
     * @param site from where the objects were observed
     */
    TelluricCheck(FeatureCatalogue catalogue, List<TelluricRegion> regions, Site site) {
        this.catalogue = catalogue;
        this.regions =
                regions.stream()
                        .filter(r -> site.isSpoiledBy(r.strength()))
                        .sorted(Comparator.comparingDouble(r -> r.window().lowMicron()))
                        .toList();
        this.site = site;
    }

    /** The largest share of a window of the feature or of its parts that is spoiled, 0 to 1. */
    double share(Feature feature) {
        double largest = 0;
        for (FeatureWindow part : feature.windows()) {
            largest = Math.max(largest, share(part.window(), regions));
        }
        for (Part part : feature.parts()) {
            largest =
                    Math.max(
                            largest,
                            catalogue.feature(part.feature()).map(this::share).orElse(0.0));
        }
        return largest;
    }

    /** Why a feature cannot be measured for the atmosphere; empty where it can. */
    Optional<NotMeasured> refusal(Feature feature) {
        List<TelluricRegion> opaque =
                regions.stream().filter(r -> r.strength() == Strength.OPAQUE).toList();
        for (FeatureWindow part : feature.windows()) {
            double share = share(part.window(), opaque);
            if (share > MOST_OPAQUE) {
                return Optional.of(
                        new NotMeasured(
                                Why.TELLURIC,
                                String.format(
                                        Locale.ROOT,
                                        "%.0f%% of window %.4f to %.4f micron lies where the"
                                                + " atmosphere is opaque (site: %s)",
                                        100 * share,
                                        part.window().lowMicron(),
                                        part.window().highMicron(),
                                        site.word())));
            }
        }
        return Optional.empty();
    }

    /** Share of a window in regions, which are sorted by their lower ends. */
    private static double share(Window window, List<TelluricRegion> regions) {
        double covered = 0;
        double upTo = window.lowMicron();
        for (TelluricRegion region : regions) {
            double from = Math.max(upTo, region.window().lowMicron());
            double to = Math.min(window.highMicron(), region.window().highMicron());
            if (to > from) {
                covered += to - from;
                upTo = to;
            }
        }
        return covered / window.widthMicron();
    }
}
