package emberline.reports.attach;

import emberline.place.TypeEstimate;

/** Spectral types as text. */
public final class TypeText {

    private static final double FIRST = -9;
    private static final double END = 40;

    private TypeText() {}

    /**
     * The code of a type with its marks of doubt.
     *
     * @param type an estimate; a single relation may give one that lies off the scale
     * @return for instance {@code L3.5} or {@code T2:}; off the scale {@code before K} or {@code
     *     after Y}
     */
    public static String code(TypeEstimate type) {
        if (!(type.typeNumber() >= FIRST)) {
            return "before K";
        }
        return type.typeNumber() < END ? type.code() : "after Y";
    }
}
