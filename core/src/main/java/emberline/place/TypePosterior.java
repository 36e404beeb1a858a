package emberline.place;

import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/**
 * The joint probability of spectral type and gravity class, on a regular grid of types. Everything
 * that depends on the type marginalises over this.
 */
public final class TypePosterior {

    private static final double[] QUANTILES = {0.025, 0.16, 0.5, 0.84, 0.975};

    private final double firstTypeNumber;
    private final double stepSubclass;
    private final double[] marginal;
    private final Map<GravityClass, double[]> joint;

    private TypePosterior(
            double firstTypeNumber, double stepSubclass, Map<GravityClass, double[]> joint) {
        this.firstTypeNumber = firstTypeNumber;
        this.stepSubclass = stepSubclass;
        this.joint = joint;
        this.marginal = new double[joint.get(GravityClass.FLD_G).length];
        for (double[] ofClass : joint.values()) {
            for (int i = 0; i < marginal.length; i++) {
                marginal[i] += ofClass[i];
            }
        }
    }

    /**
     * A posterior from weights.
     *
     * @param firstTypeNumber type of the first grid point (M0 = 0)
     * @param stepSubclass distance of grid points (subclass), positive
     * @param weights for every gravity class one weight a grid point, not negative, at least one of
     *     them positive; they need not add up to one
     * @return the posterior, normalised
     * @throws IllegalArgumentException if a class is missing, lengths differ, or the weights cannot
     *     be normalised
     */
    public static TypePosterior of(
            double firstTypeNumber, double stepSubclass, Map<GravityClass, double[]> weights) {
        double sum = 0;
        int size = -1;
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = weights.get(gravity);
            if (ofClass == null || ofClass.length == 0 || (size >= 0 && ofClass.length != size)) {
                throw new IllegalArgumentException(
                        "weights of " + gravity.label() + ": expected as many as grid points");
            }
            size = ofClass.length;
            sum += Arrays.stream(ofClass).sum();
        }
        if (!(sum > 0) || Double.isInfinite(sum) || !(stepSubclass > 0)) {
            throw new IllegalArgumentException(
                    "weights with the sum " + sum + ": expected a positive finite sum");
        }
        Map<GravityClass, double[]> joint = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = weights.get(gravity).clone();
            for (int i = 0; i < size; i++) {
                ofClass[i] /= sum;
            }
            joint.put(gravity, ofClass);
        }
        return new TypePosterior(firstTypeNumber, stepSubclass, joint);
    }

    /**
     * The mean of several posteriors.
     *
     * @param posteriors on the same grid, at least one
     * @param weights one for each, not negative, at least one of them positive
     * @return their weighted mean
     * @throws IllegalArgumentException if the grids differ or the weights cannot be normalised
     */
    public static TypePosterior mixture(List<TypePosterior> posteriors, List<Double> weights) {
        TypePosterior first = posteriors.get(0);
        Map<GravityClass, double[]> sum = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] ofClass = new double[first.size()];
            for (int p = 0; p < posteriors.size(); p++) {
                TypePosterior one = posteriors.get(p);
                if (one.size() != first.size() || one.firstTypeNumber != first.firstTypeNumber) {
                    throw new IllegalArgumentException("posteriors on different grids");
                }
                for (int i = 0; i < ofClass.length; i++) {
                    ofClass[i] += weights.get(p) * one.probability(i, gravity);
                }
            }
            sum.put(gravity, ofClass);
        }
        return of(first.firstTypeNumber, first.stepSubclass, sum);
    }

    /**
     * Type of a grid point.
     *
     * @param point index, from 0
     * @return type number (M0 = 0, L0 = 10, T0 = 20, Y0 = 30)
     */
    public double typeNumber(int point) {
        return firstTypeNumber + point * stepSubclass;
    }

    /**
     * Number of grid points.
     *
     * @return at least 1
     */
    public int size() {
        return marginal.length;
    }

    /**
     * Distance of grid points.
     *
     * @return subclass
     */
    public double stepSubclass() {
        return stepSubclass;
    }

    /**
     * Probability of a type, whatever the gravity.
     *
     * @param point index of the grid point
     * @return probability of the cell around it, 0 to 1
     */
    public double probability(int point) {
        return marginal[point];
    }

    /**
     * Probability of a type and a gravity class together.
     *
     * @param point index of the grid point
     * @param gravity the class
     * @return probability, 0 to 1
     */
    public double probability(int point, GravityClass gravity) {
        return joint.get(gravity)[point];
    }

    /**
     * Probability of a gravity class, whatever the type.
     *
     * @param gravity the class
     * @return probability, 0 to 1
     */
    public double probability(GravityClass gravity) {
        return Arrays.stream(joint.get(gravity)).sum();
    }

    /**
     * A quantile of the type; probability is spread evenly over the cell of each grid point.
     *
     * @param share 0 to 1
     * @return type number
     */
    public double quantile(double share) {
        return quantiles().at(share);
    }

    /**
     * The type in numbers: median, half of the 68% interval as one sigma, and the intervals.
     *
     * @return the estimate
     */
    public TypeEstimate estimate() {
        double[] q = Arrays.stream(QUANTILES).map(quantiles()::at).toArray();
        double sigma = Math.max((q[3] - q[1]) / 2, stepSubclass / 10);
        return new TypeEstimate(q[2], sigma, q[1], q[3], q[0], q[4]);
    }

    private CellQuantiles quantiles() {
        double[] types = new double[size()];
        for (int i = 0; i < types.length; i++) {
            types[i] = typeNumber(i);
        }
        return new CellQuantiles(types, marginal, stepSubclass);
    }
}
