package emberline.reports.attach;

import emberline.catalogue.Feature;
import emberline.catalogue.Kind;

/** Features as text. */
public final class FeatureText {

    private FeatureText() {}

    /**
     * The unit of a feature.
     *
     * @param feature a feature
     * @return {@code index} for a number without unit, {@code angstrom} for an equivalent width
     */
    public static String unit(Feature feature) {
        return feature.kind() == Kind.BAND_INDEX ? "index" : "angstrom";
    }
}
