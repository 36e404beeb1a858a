package emberline.place.calibrated;

import emberline.read.ProductTable;
import java.util.List;

/** The features that place an object on the sequence. */
final class LocusFeatures {

    private static final String RESOURCE = "/emberline/place/calibrated/locus-features.csv";

    private LocusFeatures() {}

    /**
     * The features of the product's calibration.
     *
     * @return feature ids
     */
    static List<String> standard() {
        return ProductTable.at(RESOURCE).rows().stream()
                .map(row -> row.getField("feature"))
                .toList();
    }
}
