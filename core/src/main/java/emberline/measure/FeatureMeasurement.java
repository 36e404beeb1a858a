package emberline.measure;

import emberline.catalogue.Feature;
import java.util.OptionalDouble;

/**
 * What came of one feature on one spectrum.
 *
 * @param feature the definition
 * @param result the value, or the reason why there is none
 * @param coverage least share of a window that good pixels cover, 0 to 1
 * @param continuumSignal least signal-to-noise of a continuum, or of a part, by which the feature
 *     divides; 0 where it was not measured, infinite where there is no noise
 * @param telluricShare largest share of a window that the atmosphere can spoil at the site of the
 *     observation, 0 to 1
 * @param smoothedToResolvingPower the resolving power to which the spectrum was smoothed for this
 *     feature; empty where it was measured as it is
 */
public record FeatureMeasurement(
        Feature feature,
        Measurement result,
        double coverage,
        double continuumSignal,
        double telluricShare,
        OptionalDouble smoothedToResolvingPower) {}
