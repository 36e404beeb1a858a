package emberline.survey.map;

import emberline.place.kind.ShapeVector;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;

/**
 * The principal axes of a set of objects of which each may lack some coordinates.
 *
 * <p>The model is that of probabilistic principal components: {@code u = mean + W z + noise}, with
 * scores {@code z} of unit variance and noise of one variance for all coordinates. Missing
 * coordinates are filled with what the model says of them and the axes found anew, until they stay.
 * The scores of an object are the posterior mean of {@code z} given the coordinates that it has and
 * their errors, so that an object with few or noisy coordinates lies nearer to the middle rather
 * than anywhere. Axes point to where the sum of their loadings is positive; the same objects give
 * the same axes.
 */
public final class PrincipalAxes {

    /** An object with fewer coordinates has no place. */
    public static final int LEAST_COORDINATES = 8;

    private static final int ROUNDS = 25;
    private static final double STILL = 1e-3;

    /** Least variance of the noise, so that no coordinate counts without limit. */
    private static final double LEAST_NOISE = 1e-4;

    private final double[] mean;
    private final double[][] loadings;
    private final double noise;
    private final double[] shares;

    private PrincipalAxes(double[] mean, double[][] loadings, double noise, double[] shares) {
        this.mean = mean;
        this.loadings = loadings;
        this.noise = noise;
        this.shares = shares;
    }

    /**
     * Finds the axes of a set of objects.
     *
     * @param objects all with as many coordinates, at least three objects; those with too few
     *     measured coordinates do not count
     * @param count number of axes, at least one and less than the number of coordinates
     * @return the axes
     * @throws IllegalArgumentException if there are too few objects or coordinates
     */
    public static PrincipalAxes of(List<ShapeVector> objects, int count) {
        List<ShapeVector> used =
                objects.stream().filter(o -> o.present() >= LEAST_COORDINATES).toList();
        if (used.size() < 3 || count < 1 || count >= used.get(0).size()) {
            throw new IllegalArgumentException(
                    used.size()
                            + " objects for "
                            + count
                            + " axes: expected at least three objects with "
                            + LEAST_COORDINATES
                            + " coordinates each, and fewer axes than coordinates");
        }
        double[][] filled = new double[used.size()][];
        for (int i = 0; i < filled.length; i++) {
            filled[i] = values(used.get(i), new double[used.get(i).size()]);
        }
        PrincipalAxes axes = axesOf(filled, count);
        double moved = Double.POSITIVE_INFINITY;
        for (int round = 0; round < ROUNDS && moved > STILL; round++) {
            moved = 0;
            for (int i = 0; i < filled.length; i++) {
                double[] better =
                        values(used.get(i), axes.expected(axes.posterior(used.get(i), false)));
                for (int k = 0; k < better.length; k++) {
                    moved = Math.max(moved, Math.abs(better[k] - filled[i][k]));
                }
                filled[i] = better;
            }
            axes = axesOf(filled, count);
        }
        return axes;
    }

    /** The measured coordinates, and those of another vector where they are missing. */
    private static double[] values(ShapeVector object, double[] others) {
        double[] values = others.clone();
        for (int k = 0; k < values.length; k++) {
            values[k] = object.has(k) ? object.value(k) : values[k];
        }
        return values;
    }

    private static PrincipalAxes axesOf(double[][] rows, int count) {
        int size = rows[0].length;
        double[] mean = new double[size];
        for (double[] row : rows) {
            for (int k = 0; k < size; k++) {
                mean[k] += row[k] / rows.length;
            }
        }
        double[][] covariance = new double[size][size];
        for (double[] row : rows) {
            for (int a = 0; a < size; a++) {
                for (int b = 0; b <= a; b++) {
                    covariance[a][b] += (row[a] - mean[a]) * (row[b] - mean[b]) / rows.length;
                    covariance[b][a] = covariance[a][b];
                }
            }
        }
        EigenDecomposition parts =
                new EigenDecomposition(new Array2DRowRealMatrix(covariance, false));
        double[] variances = parts.getRealEigenvalues(); // the greatest first
        double total = Arrays.stream(variances).map(v -> Math.max(0, v)).sum();
        double rest = Arrays.stream(variances).skip(count).map(v -> Math.max(0, v)).sum();
        double noise = Math.max(LEAST_NOISE, rest / (size - count));
        double[][] loadings = new double[count][];
        double[] shares = new double[count];
        for (int axis = 0; axis < count; axis++) {
            RealVector direction = parts.getEigenvector(axis);
            double length = Math.sqrt(Math.max(0, variances[axis] - noise));
            double sign = Arrays.stream(direction.toArray()).sum() < 0 ? -1 : 1;
            loadings[axis] = direction.mapMultiply(sign * length).toArray();
            shares[axis] = total > 0 ? Math.max(0, variances[axis]) / total : 0;
        }
        return new PrincipalAxes(mean, loadings, noise, shares);
    }

    /**
     * The number of axes.
     *
     * @return a positive number
     */
    public int count() {
        return loadings.length;
    }

    /**
     * The share of the variance along an axis.
     *
     * @param axis index from 0, the greatest share first
     * @return 0 to 1
     */
    public double share(int axis) {
        return shares[axis];
    }

    /**
     * The place of an object along the axes.
     *
     * @param object its coordinates
     * @return one score an axis, of unit variance over the objects that made the axes; empty where
     *     it has fewer than {@value #LEAST_COORDINATES} coordinates
     */
    public Optional<double[]> scores(ShapeVector object) {
        return object.present() < LEAST_COORDINATES
                ? Optional.empty()
                : Optional.of(posterior(object, true));
    }

    private double[] posterior(ShapeVector object, boolean withErrors) {
        int count = loadings.length;
        RealMatrix precision = new Array2DRowRealMatrix(count, count);
        RealVector right = new ArrayRealVector(count);
        for (int axis = 0; axis < count; axis++) {
            precision.setEntry(axis, axis, 1);
        }
        for (int k = 0; k < mean.length; k++) {
            if (object.has(k)) {
                double sigma = withErrors ? object.sigma(k) : 0;
                double variance = noise + sigma * sigma;
                for (int a = 0; a < count; a++) {
                    right.addToEntry(a, loadings[a][k] * (object.value(k) - mean[k]) / variance);
                    for (int b = 0; b < count; b++) {
                        precision.addToEntry(a, b, loadings[a][k] * loadings[b][k] / variance);
                    }
                }
            }
        }
        return new CholeskyDecomposition(precision).getSolver().solve(right).toArray();
    }

    private double[] expected(double[] scores) {
        double[] values = mean.clone();
        for (int axis = 0; axis < scores.length; axis++) {
            for (int k = 0; k < values.length; k++) {
                values[k] += scores[axis] * loadings[axis][k];
            }
        }
        return values;
    }
}
