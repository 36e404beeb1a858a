package emberline.judge;

import emberline.place.GravityClass;
import emberline.place.TypePosterior;

/** The types on which judging works: M4 to Y4 by tenths of a subclass. */
final class TypeAxis {

    /** Earliest type (M4). */
    static final double FIRST = 4;

    /** Latest type (Y4). */
    static final double LAST = 34;

    private static final double PER_SUBCLASS = 10;

    /** Number of points. */
    static final int SIZE = (int) Math.round((LAST - FIRST) * PER_SUBCLASS) + 1;

    private TypeAxis() {}

    /** Type of a point. */
    static double type(int point) {
        return FIRST + point / PER_SUBCLASS;
    }

    /** Probability of a class by point of this axis; types beyond the ends count at the ends. */
    static double[] spread(TypePosterior posterior, GravityClass gravity) {
        double[] share = new double[SIZE];
        for (int i = 0; i < posterior.size(); i++) {
            double p = posterior.probability(i, gravity);
            if (p > 0) {
                double at = (posterior.typeNumber(i) - FIRST) * PER_SUBCLASS;
                double inside = Math.min(SIZE - 1.0, Math.max(0, at));
                int low = Math.min(SIZE - 2, (int) inside);
                share[low] += p * (1 - (inside - low));
                share[low + 1] += p * (inside - low);
            }
        }
        return share;
    }

    /** Probability that a type lies beyond the ends by more than a subclass. */
    static double outside(TypePosterior posterior) {
        double sum = 0;
        for (int i = 0; i < posterior.size(); i++) {
            double type = posterior.typeNumber(i);
            if (type < FIRST - 1 || type > LAST + 1) {
                sum += posterior.probability(i);
            }
        }
        return sum;
    }
}
