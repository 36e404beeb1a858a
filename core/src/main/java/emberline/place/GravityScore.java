package emberline.place;

import emberline.catalogue.Feature;
import emberline.measure.Measurement;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * The score of one gravity-sensitive feature.
 *
 * @param feature the feature
 * @param index its measurement
 * @param score 0 field, 1 intermediate, 2 very low gravity; empty where it is not scored
 * @param intermediateThreshold the threshold of score 1 at the type of the object; empty where the
 *     scheme does not score this feature there
 * @param veryLowThreshold the threshold of score 2 at the type of the object
 * @param lowGravityIfBelow true where a smaller index means lower gravity
 * @param reason why it is not scored; empty where it is
 */
public record GravityScore(
        Feature feature,
        Measurement index,
        OptionalInt score,
        OptionalDouble intermediateThreshold,
        OptionalDouble veryLowThreshold,
        boolean lowGravityIfBelow,
        String reason) {}
