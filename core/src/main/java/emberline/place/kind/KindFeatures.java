package emberline.place.kind;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.read.ProductTable;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The features by which kinds are told apart, with the wavelength region that each needs.
 *
 * @param features in their fixed order
 */
public record KindFeatures(List<KindFeature> features) {

    private static final String RESOURCE = "/emberline/place/kind/features.csv";
    private static final KindFeatures STANDARD = load();

    /** What a feature is for. */
    enum Block {
        /** Broad: holds at any resolution. */
        SHAPE,
        /** Needs resolved lines. */
        LINE
    }

    /**
     * A feature.
     *
     * @param id feature of the catalogue
     * @param regions the regions that it needs, a mask of {@link Regions}
     * @param block what it is for
     * @param isWindow whether it is one window of the shape of a region; these tell coverage
     */
    record KindFeature(String id, int regions, Block block, boolean isWindow) {}

    /** Copies the list. */
    public KindFeatures {
        features = List.copyOf(features);
    }

    /**
     * The features that the product uses.
     *
     * @return the features of the resource
     */
    public static KindFeatures standard() {
        return STANDARD;
    }

    /**
     * The number of features.
     *
     * @return a positive number
     */
    public int size() {
        return features.size();
    }

    /**
     * The ids of the features.
     *
     * @return ids of the catalogue, in order
     */
    public List<String> ids() {
        return features.stream().map(KindFeature::id).toList();
    }

    /** The values of a spectrum. */
    FeatureVector of(Measurements measurements) {
        double[] values = new double[size()];
        double[] sigmas = new double[size()];
        for (int k = 0; k < values.length; k++) {
            Optional<Measured> measured = measurements.measured(features.get(k).id());
            values[k] = measured.map(Measured::value).orElse(Double.NaN);
            sigmas[k] = measured.map(Measured::oneSigma).orElse(Double.NaN);
        }
        return new FeatureVector(values, sigmas);
    }

    private static KindFeatures load() {
        List<KindFeature> features = new ArrayList<>();
        for (NamedCsvRecord row : ProductTable.at(RESOURCE).rows()) {
            String id = row.getField("feature");
            int regions = Regions.parse(row.getField("region"));
            features.add(
                    new KindFeature(
                            id,
                            regions,
                            Block.valueOf(row.getField("block")),
                            id.contains("/shape_") && Integer.bitCount(regions) == 1));
        }
        return new KindFeatures(features);
    }
}
