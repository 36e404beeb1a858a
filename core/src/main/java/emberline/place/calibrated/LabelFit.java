package emberline.place.calibrated;

import emberline.place.TypePosterior;
import emberline.place.reference.ReferenceRow;
import java.util.List;

/**
 * Finds the error of published types: the one under which the published types of objects that were
 * placed unseen are most probable. It takes up whatever the likelihood leaves out as well, so that
 * the intervals hold what they say.
 */
final class LabelFit {

    private static final String BEST_TIERS = "AB";

    private LabelFit() {}

    /**
     * An object of known type, placed unseen.
     *
     * @param posterior what the spectrum says, without label error
     * @param typeNumber published type
     * @param row the object
     */
    record Labelled(TypePosterior posterior, double typeNumber, ReferenceRow row) {}

    /**
     * The most probable error, by a search over a grid.
     *
     * @param labelled objects placed unseen; those of the best tiers count
     * @return the error
     */
    static LabelError fit(List<Labelled> labelled) {
        List<Labelled> best =
                labelled.stream().filter(one -> BEST_TIERS.contains(one.row().tier())).toList();
        LabelError found = new LabelError(0.5, 1.5, 0.1);
        double highest = Double.NEGATIVE_INFINITY;
        for (double core = 0.2; core < 0.85; core += 0.05) {
            for (double tail = 0.8; tail < 2.6; tail += 0.2) {
                for (double share = 0; share < 0.42; share += 0.05) {
                    LabelError error = new LabelError(core, tail, share);
                    double log = best.stream().mapToDouble(one -> log(one, error)).sum();
                    if (log > highest) {
                        highest = log;
                        found = error;
                    }
                }
            }
        }
        return found;
    }

    private static double log(Labelled one, LabelError error) {
        TypePosterior posterior = one.posterior();
        double sum = 1e-12;
        for (int i = 0; i < posterior.size(); i++) {
            double weight = posterior.probability(i);
            if (weight > 1e-9) {
                sum +=
                        weight
                                * error.probability(
                                        one.typeNumber() - posterior.typeNumber(i),
                                        posterior.stepSubclass());
            }
        }
        return Math.log(sum);
    }
}
