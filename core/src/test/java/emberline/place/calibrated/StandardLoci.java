package emberline.place.calibrated;

import java.util.LinkedHashMap;
import java.util.Map;

/** Where the loci of the product lie, for tests elsewhere that make objects of them. */
public final class StandardLoci {

    private StandardLoci() {}

    /**
     * Features of an object at normal gravity that is off every locus by the same part of its
     * scatter, up and down by turns.
     *
     * @param type type number (M0 = 0)
     * @param off distance from each locus in its scatter
     * @return value by feature
     */
    public static Map<String, Double> at(double type, double off) {
        Map<String, Double> values = new LinkedHashMap<>();
        int sign = 1;
        for (Locus locus : Calibration.standard().loci()) {
            sign = -sign;
            values.put(locus.feature(), locus.mean(type, 0) + sign * off * locus.scatter(type));
        }
        return values;
    }
}
