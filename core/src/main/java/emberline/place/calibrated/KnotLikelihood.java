package emberline.place.calibrated;

import java.util.Arrays;
import java.util.List;

/**
 * The normal likelihood of a sample around one knot. The covariance of the knot, scatter and noise
 * together, is taken for the types between its neighbours; the mean runs linearly between knots, so
 * a few triangular solutions serve all types and gravities there.
 */
final class KnotLikelihood {

    private static final double LEAST_VARIANCE = 1e-14;
    private static final double LEAST_SHARE = 1e-12;

    private final double[] lower;
    private final double logDeterminant;
    private final int size;

    /** Whitened residual of field gravity, and whitened gravity shift, at three knots. */
    private final double[][] residual = new double[3][];

    private final double[][] shift = new double[3][];

    /**
     * Prepares a knot.
     *
     * @param sample the values
     * @param calibration the correlations
     * @param inflation factor on the sigma of each feature, 1 for one that fits
     * @param knot index of the knot
     */
    KnotLikelihood(Sample sample, Calibration calibration, double[] inflation, int knot) {
        this.size = sample.size();
        this.lower = cholesky(covariance(sample, calibration, inflation, knot), size);
        double sum = 0;
        for (int f = 0; f < size; f++) {
            sum += Math.log(lower[f * size + f]);
        }
        this.logDeterminant = 2 * sum;
        for (int side = -1; side <= 1; side++) {
            int at = Math.max(0, Math.min(TypeKnots.COUNT - 1, knot + side));
            double[] difference = new double[size];
            double[] ofGravity = new double[size];
            for (int f = 0; f < size; f++) {
                double mean = sample.locus(f).mean(at, 0);
                difference[f] = sample.value(f) - mean;
                ofGravity[f] = sample.locus(f).mean(at, 1) - mean;
            }
            residual[side + 1] = whiten(difference);
            shift[side + 1] = whiten(ofGravity);
        }
    }

    private static double[] covariance(
            Sample sample, Calibration calibration, double[] inflation, int knot) {
        int size = sample.size();
        double[] scatter = new double[size];
        for (int f = 0; f < size; f++) {
            scatter[f] = sample.locus(f).scatter(knot);
        }
        double[] matrix = new double[size * size];
        for (int f = 0; f < size; f++) {
            for (int g = 0; g <= f; g++) {
                double intrinsic =
                        scatter[f]
                                * scatter[g]
                                * calibration.correlation(sample.place(f), sample.place(g));
                matrix[f * size + g] =
                        inflation[f] * inflation[g] * (intrinsic + sample.noise(f, g));
            }
        }
        return matrix;
    }

    /**
     * The lower factor, in place; the sum of a positive definite and a semidefinite matrix. A pivot
     * that rounding made too small is kept at a share of its diagonal element, so that very large
     * noise beside small scatter makes no infinite numbers.
     */
    private static double[] cholesky(double[] a, int size) {
        for (int row = 0; row < size; row++) {
            int start = row * size;
            double least = Math.max(LEAST_VARIANCE, LEAST_SHARE * a[start + row]);
            for (int col = 0; col <= row; col++) {
                int other = col * size;
                double sum = a[start + col];
                for (int k = 0; k < col; k++) {
                    sum -= a[start + k] * a[other + k];
                }
                a[start + col] =
                        row == col ? Math.sqrt(Math.max(sum, least)) : sum / a[other + col];
            }
        }
        return a;
    }

    /**
     * Chi-square of a vector.
     *
     * @param covariance its covariance, row by row; used up
     * @param vector the vector
     */
    static double chiSquare(double[] covariance, List<Double> vector) {
        double[] white = vector.stream().mapToDouble(Double::doubleValue).toArray();
        whiten(cholesky(covariance, white.length), white);
        return Arrays.stream(white).map(z -> z * z).sum();
    }

    private double[] whiten(double[] vector) {
        return whiten(lower, vector);
    }

    /** Solves the lower triangle for a vector, in place. */
    private static double[] whiten(double[] lower, double[] vector) {
        int size = vector.length;
        for (int row = 0; row < size; row++) {
            double sum = vector[row];
            for (int k = 0; k < row; k++) {
                sum -= lower[row * size + k] * vector[k];
            }
            vector[row] = sum / lower[row * size + row];
        }
        return vector;
    }

    /**
     * The logarithm of the likelihood.
     *
     * @param stepsFromKnot distance of the type from this knot in steps of the knots, -1 to 1
     * @param lowGravity 0 field, 0.5 intermediate, 1 very low
     * @return log likelihood, up to a constant of the sample
     */
    double logLikelihood(double stepsFromKnot, double lowGravity) {
        int side = stepsFromKnot < 0 ? 0 : 2;
        double part = Math.abs(stepsFromKnot);
        double sum = 0;
        for (int f = 0; f < size; f++) {
            double here = residual[1][f] - lowGravity * shift[1][f];
            double there = residual[side][f] - lowGravity * shift[side][f];
            double z = here + part * (there - here);
            sum += z * z;
        }
        return -0.5 * (sum + logDeterminant);
    }

    /**
     * How far very low gravity stands apart from field gravity at this knot.
     *
     * @return distance in sigma of scatter and noise
     */
    double gravitySeparationSigma() {
        double sum = 0;
        for (double one : shift[1]) {
            sum += one * one;
        }
        return Math.sqrt(sum);
    }

    /**
     * How far each feature moves the type of a normal fit around this knot.
     *
     * @param lowGravity 0 field, 0.5 intermediate, 1 very low
     * @param stepsFromKnot the type that was found, in steps from this knot
     * @return for each feature its pull (subclass, positive to later types; the pulls add up to
     *     about 0) and its share of the information (adding up to 1)
     */
    Pull[] pulls(double stepsFromKnot, double lowGravity) {
        double[] slope = new double[size];
        double[] rest = new double[size];
        for (int f = 0; f < size; f++) {
            double before = residual[0][f] - lowGravity * shift[0][f];
            double after = residual[2][f] - lowGravity * shift[2][f];
            double here = residual[1][f] - lowGravity * shift[1][f];
            slope[f] = (before - after) / (2 * TypeKnots.STEP);
            rest[f] = here + stepsFromKnot * (after - before) / 2;
        }
        double information = 0;
        for (int f = 0; f < size; f++) {
            information += slope[f] * slope[f];
        }
        double[] slopeBack = unwhiten(slope.clone());
        double[] restRaw = colour(rest);
        double[] slopeRaw = colour(slope);
        Pull[] pulls = new Pull[size];
        for (int f = 0; f < size; f++) {
            pulls[f] =
                    new Pull(
                            slopeBack[f] * restRaw[f] / information,
                            slopeBack[f] * slopeRaw[f] / information);
        }
        return pulls;
    }

    /**
     * What one feature does.
     *
     * @param subclass how far it pulls the type (subclass)
     * @param share its share of the information on the type
     */
    record Pull(double subclass, double share) {}

    /** Solves the transposed triangle, in place. */
    private double[] unwhiten(double[] vector) {
        for (int row = size - 1; row >= 0; row--) {
            double sum = vector[row];
            for (int k = row + 1; k < size; k++) {
                sum -= lower[k * size + row] * vector[k];
            }
            vector[row] = sum / lower[row * size + row];
        }
        return vector;
    }

    /** The triangle times a vector. */
    private double[] colour(double[] vector) {
        double[] raw = new double[size];
        for (int row = 0; row < size; row++) {
            for (int k = 0; k <= row; k++) {
                raw[row] += lower[row * size + k] * vector[k];
            }
        }
        return raw;
    }
}
