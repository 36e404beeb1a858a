package emberline.place.calibrated;

import emberline.place.TypePosterior;
import java.util.List;
import java.util.Optional;

/**
 * What the calibrated witness says.
 *
 * @param posterior probability of type and gravity class; empty where too little was measured
 * @param reason why there is none; empty where there is one
 * @param contributions what each feature did, in the order of the calibration
 * @param gravitySeparationSigma how far the measured features set very low gravity apart from field
 *     gravity at the type found, in sigma of scatter and noise; 0 where nothing is known
 * @param logEvidence natural logarithm of the probability density of the values under the
 *     calibration, types and gravities averaged; comparable between samples of the same features
 *     only
 */
public record CalibratedType(
        Optional<TypePosterior> posterior,
        String reason,
        List<Contribution> contributions,
        double gravitySeparationSigma,
        double logEvidence) {

    /** Copies the list. */
    public CalibratedType {
        contributions = List.copyOf(contributions);
    }

    /**
     * No statement.
     *
     * @param reason why
     * @return a result without posterior
     */
    public static CalibratedType none(String reason) {
        return new CalibratedType(Optional.empty(), reason, List.of(), 0, Double.NEGATIVE_INFINITY);
    }

    /**
     * This with another posterior.
     *
     * @param other posterior that goes before that of the features alone
     * @return the same contributions with that posterior
     */
    public CalibratedType with(TypePosterior other) {
        return new CalibratedType(
                Optional.of(other), reason, contributions, gravitySeparationSigma, logEvidence);
    }
}
