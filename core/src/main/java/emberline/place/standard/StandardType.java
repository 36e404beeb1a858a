package emberline.place.standard;

import emberline.place.TypeEstimate;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.apache.commons.statistics.distribution.FDistribution;

/**
 * The type of an object by the standards that fit it best: the mean of their types, each weighted
 * by the chance that its fit is no worse than the best one, by the F test of the ratio of both
 * chi-squares. Of standards of one type the best counts, so that types with many standards do not
 * outweigh others.
 */
final class StandardType {

    /** Differences between objects run over several bins; so many count as one. */
    static final double BINS_PER_DEGREE = 2;

    /** Standards are typed to half a subclass at best, and like objects differ by as much. */
    private static final double LEAST_SIGMA = 0.5;

    /** Standards of types that differ by less count as of one type (subclass). */
    private static final double SAME_TYPE = 0.5;

    private StandardType() {}

    /**
     * The type.
     *
     * @param matches single matches, the best first
     * @return type with its interval; empty where nothing matches
     */
    static Optional<TypeEstimate> of(List<StandardMatch> matches) {
        if (matches.isEmpty()) {
            return Optional.empty();
        }
        Map<Long, StandardMatch> bestOfType = new TreeMap<>();
        for (StandardMatch match : matches) {
            bestOfType.putIfAbsent(Math.round(match.first().typeNumber() / SAME_TYPE), match);
        }
        double best = matches.get(0).reducedChiSquare();
        double weights = 0;
        double sum = 0;
        double squares = 0;
        for (StandardMatch match : bestOfType.values()) {
            double weight = weight(match, matches.get(0), best);
            double type = match.first().typeNumber();
            weights += weight;
            sum += weight * type;
            squares += weight * type * type;
        }
        double mean = sum / weights;
        double spread = Math.sqrt(Math.max(0, squares / weights - mean * mean));
        return Optional.of(TypeEstimate.normal(mean, Math.hypot(LEAST_SIGMA, spread)));
    }

    private static double weight(StandardMatch match, StandardMatch best, double least) {
        if (match.reducedChiSquare() <= least) {
            return 1;
        }
        double freedom = Math.max(1, best.degreesOfFreedom() / BINS_PER_DEGREE);
        double other = Math.max(1, match.degreesOfFreedom() / BINS_PER_DEGREE);
        double ratio = match.reducedChiSquare() / Math.max(least, 1e-12);
        return 2 * FDistribution.of(other, freedom).survivalProbability(ratio);
    }
}
