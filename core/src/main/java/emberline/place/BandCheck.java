package emberline.place;

import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import java.util.List;
import java.util.Optional;

/**
 * Whether a spectrum shows any of the bands by which late dwarfs are known. Relations give a type
 * to any smooth spectrum, so their absence must be said.
 */
final class BandCheck {

    /** Features that are 1 on a smooth spectrum and differ from it in late dwarfs. */
    private static final List<String> FEATURES =
            List.of(
                    "burgasser2006/h2o-j",
                    "burgasser2006/h2o-h",
                    "burgasser2006/h2o-k",
                    "burgasser2006/ch4-h",
                    "allers2007/h2o",
                    "allers2013/feh_z",
                    "allers2013/ki_j");

    /** Fewer than this many measured features say nothing. */
    private static final int LEAST_MEASURED = 4;

    /** A band is seen where its feature differs from 1 by this and by three sigma. */
    private static final double LEAST_DEPTH = 0.03;

    private BandCheck() {}

    /** True if enough of the features were measured and none of them shows a band. */
    static boolean showsNone(Measurements measurements) {
        int measured = 0;
        for (String id : FEATURES) {
            Optional<Measured> feature = measurements.measured(id);
            if (feature.isPresent()) {
                measured++;
                double depth = Math.abs(feature.get().value() - 1);
                if (depth > LEAST_DEPTH && depth > 3 * feature.get().oneSigma()) {
                    return false;
                }
            }
        }
        return measured >= LEAST_MEASURED;
    }
}
