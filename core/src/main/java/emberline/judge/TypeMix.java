package emberline.judge;

import emberline.place.GravityClass;
import java.util.Map;

/** The evidence of type and gravity class on the axis of types. */
final class TypeMix {

    /**
     * Mean types between which a gravity class is evidence of age: those of the objects that were
     * counted, M6 to L7, and somewhat more.
     */
    private static final double CLASS_FROM = 5.5;

    private static final double CLASS_TO = 20;

    /** Probabilities below this do not count. */
    private static final double NEGLIGIBLE = 1e-7;

    private final double[][] byClass = new double[GravityOrder.COUNT][];
    private final double[] marginal = new double[TypeAxis.SIZE];
    private final boolean classJudged;
    private final boolean gravityCounts;
    private final double[] priorOfClass = new double[GravityOrder.COUNT];

    TypeMix(Evidence evidence) {
        for (GravityClass gravity : GravityClass.values()) {
            double[] share = TypeAxis.spread(evidence.type(), gravity);
            byClass[GravityOrder.of(gravity)] = share;
            for (int n = 0; n < TypeAxis.SIZE; n++) {
                marginal[n] += share[n];
            }
        }
        Map<GravityClass, Double> prior = evidence.gravityPrior();
        this.classJudged = !prior.isEmpty();
        this.gravityCounts = classJudged && allowsClass();
        for (GravityClass gravity : GravityClass.values()) {
            priorOfClass[GravityOrder.of(gravity)] = prior.getOrDefault(gravity, 1.0);
        }
    }

    /** Whether the mean type is one at which a gravity class tells the age. */
    boolean allowsClass() {
        double type = meanType();
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
            return byClass[GravityOrder.of(gravity)][point];
        }
        return gravity == GravityClass.FLD_G ? marginal[point] : 0;
    }

    /** Evidence for a class at a type: probability by prior; 0 where no class counts. */
    double evidence(int point, int gravity) {
        return gravityCounts ? byClass[gravity][point] / priorOfClass[gravity] : 0;
    }

    /** Probability of a type where no class counts. */
    double withoutClass(int point) {
        return gravityCounts ? 0 : type(point);
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
}
