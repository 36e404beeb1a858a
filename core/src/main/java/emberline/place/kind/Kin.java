package emberline.place.kind;

import java.util.OptionalDouble;

/**
 * A reference object near to an object in the space of features.
 *
 * @param object name of the reference spectrum
 * @param typeNumber its published type (M0 = 0, L0 = 10, T0 = 20, Y0 = 30); empty where it has none
 *     on this scale
 * @param gravity its published gravity class; may be blank
 * @param kind what it is
 * @param source the data set that it comes from
 * @param distance root mean square difference of the features in common, each in units of the
 *     scatter between like objects and the noise of both; about 1 for twins
 * @param featuresInCommon number of features that were compared
 */
public record Kin(
        String object,
        OptionalDouble typeNumber,
        String gravity,
        ObjectKind kind,
        String source,
        double distance,
        int featuresInCommon) {}
