package emberline.catalogue;

/**
 * A part of a feature that is made of other features.
 *
 * @param role what the part is to the form
 * @param feature id of the feature that is the part
 * @param coefficient factor of a term of a linear combination, not zero; 1 in other forms
 */
public record Part(PartRole role, String feature, double coefficient) {

    /** Checks the coefficient. */
    public Part {
        if (!(Math.abs(coefficient) > 0) || Double.isInfinite(coefficient)) {
            throw new IllegalArgumentException(
                    "coefficient " + coefficient + ": expected a finite number other than 0");
        }
    }
}
