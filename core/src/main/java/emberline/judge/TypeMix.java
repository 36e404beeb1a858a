package emberline.judge;

import emberline.place.GravityClass;
import java.util.Map;

/** The evidence of type and gravity class on the axis of types. */
final class TypeMix {

    /** Between these types (M6 and L7) a gravity class is evidence of age: its counts end there. */
    private static final double CLASS_FROM = 5.5;

    private static final double CLASS_TO = 17.5;

    /** Probabilities below this do not count. */
    private static final double NEGLIGIBLE = 1e-7;

    private final double[][] byClass = new double[GravityClass.values().length][];
    private final double[] marginal = new double[TypeAxis.SIZE];
    private final boolean classJudged;
    private final boolean gravityCounts;
    private final double[] priorOfClass = new double[GravityClass.values().length];

    TypeMix(Evidence evidence) {
        for (GravityClass gravity : GravityClass.values()) {
            double[] share = TypeAxis.spread(evidence.type(), gravity);
            byClass[gravity.ordinal()] = share;
            for (int n = 0; n < TypeAxis.SIZE; n++) {
                marginal[n] += share[n];
            }
        }
        Map<GravityClass, Double> prior = evidence.gravityPrior();
        double inside = 0;
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            inside += classCounts(n) ? marginal[n] : 0;
        }
        this.classJudged = !prior.isEmpty();
        this.gravityCounts = classJudged && inside > 0.01;
        for (GravityClass gravity : GravityClass.values()) {
            priorOfClass[gravity.ordinal()] = prior.getOrDefault(gravity, 1.0);
        }
    }

    private static boolean classCounts(int point) {
        double type = TypeAxis.type(point);
        return type >= CLASS_FROM && type <= CLASS_TO;
    }

    /** Whether the gravity class says anything about the age. */
    boolean gravityCounts() {
        return gravityCounts;
    }

    /** Probability of a type, 0 where it is negligible. */
    double type(int point) {
        return marginal[point] > NEGLIGIBLE ? marginal[point] : 0;
    }

    /** Probability of a type and a class; the field where the gravity was not judged. */
    double type(int point, GravityClass gravity) {
        if (classJudged) {
            return byClass[gravity.ordinal()][point];
        }
        return gravity == GravityClass.FLD_G ? marginal[point] : 0;
    }

    /** Evidence for a class at a type: probability by prior; 0 where no class counts. */
    double evidence(int point, int gravity) {
        return gravityCounts && classCounts(point)
                ? byClass[gravity][point] / priorOfClass[gravity]
                : 0;
    }

    /** Probability of a type where no class counts. */
    double withoutClass(int point) {
        return gravityCounts && classCounts(point) ? 0 : type(point);
    }

    /** Evidence for a class, whatever the type, up to a common factor. */
    double evidence(int gravity) {
        double sum = 0;
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            sum += evidence(n, gravity);
        }
        return sum;
    }

    /** Mean type. */
    double meanType() {
        double sum = 0;
        double weight = 0;
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            sum += marginal[n] * TypeAxis.type(n);
            weight += marginal[n];
        }
        return sum / weight;
    }

    /** Standard deviation of the type (subclass). */
    double sigmaType() {
        double mean = meanType();
        double sum = 0;
        double weight = 0;
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            double off = TypeAxis.type(n) - mean;
            sum += marginal[n] * off * off;
            weight += marginal[n];
        }
        return Math.sqrt(sum / weight);
    }

    /** Part of the probability between M6 and L7, where a gravity class can be given. */
    double shareWithClasses() {
        double sum = 0;
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            sum += classCounts(n) ? marginal[n] : 0;
        }
        return sum;
    }
}
