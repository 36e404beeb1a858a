package emberline.place.calibrated;

/**
 * What one feature did to the type.
 *
 * @param feature id of the feature
 * @param deviationSigma how far its value lies from what the type and gravity found let expect, in
 *     sigma of scatter and noise
 * @param pullSubclass how far it pulls the type (subclass, positive to later types); the pulls of
 *     all features balance
 * @param share its share of the information on the type; the shares add up to 1, and one that only
 *     corrects others can be slightly negative
 * @param setAside whether it was taken as an outlier and counts less than half
 */
public record Contribution(
        String feature,
        double deviationSigma,
        double pullSubclass,
        double share,
        boolean setAside) {}
