package emberline.place.kind;

/**
 * The features of one spectrum in the order of {@link KindFeatures}; NaN where one was not
 * measured. Stays within this package, where nobody changes the arrays.
 *
 * @param values values in the units of the features
 * @param sigmas one-sigma errors from the pixel noise
 */
@SuppressWarnings("ArrayRecordComponent") // never compared
record FeatureVector(double[] values, double[] sigmas) {

    boolean has(int feature) {
        return !Double.isNaN(values[feature]);
    }

    /** This vector with only the features of some regions. */
    FeatureVector within(int regions, KindFeatures features) {
        double[] kept = values.clone();
        for (int k = 0; k < kept.length; k++) {
            if ((features.features().get(k).regions() & ~regions) != 0) {
                kept[k] = Double.NaN;
            }
        }
        return new FeatureVector(kept, sigmas);
    }
}
