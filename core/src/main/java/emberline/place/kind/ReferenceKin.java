package emberline.place.kind;

import java.util.OptionalDouble;

/**
 * A reference object with what is known of it.
 *
 * @param object name of the spectrum as listed
 * @param group name of the object; spectra of one object share it
 * @param typeNumber published type (M0 = 0, L0 = 10, T0 = 20, Y0 = 30); empty where it has none on
 *     this scale
 * @param gravity published gravity class; may be blank
 * @param kind what it is
 * @param source the data set
 * @param vector its features
 */
record ReferenceKin(
        String object,
        String group,
        OptionalDouble typeNumber,
        String gravity,
        ObjectKind kind,
        String source,
        FeatureVector vector) {}
