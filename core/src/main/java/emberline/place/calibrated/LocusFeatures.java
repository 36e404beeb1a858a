package emberline.place.calibrated;

import emberline.place.reference.ReferenceTable;
import emberline.read.ProductTable;
import java.util.List;
import java.util.Set;

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

    /**
     * Those of them that a reference table holds.
     *
     * @param table the table
     * @return feature ids in the order of the table
     */
    static List<String> among(ReferenceTable table) {
        Set<String> placing = Set.copyOf(standard());
        return table.features().stream().filter(placing::contains).toList();
    }
}
