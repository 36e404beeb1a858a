package emberline.place.calibrated;

import emberline.place.calibrated.TrainingSet.Point;
import java.util.Arrays;
import java.util.List;

/**
 * Fits the locus of one feature: at every knot a local regression of the value on type, its square
 * and gravity, with weights that fall off with the difference in type and with the residual. Where
 * spectra are scarce the kernel widens. The scatter is that of the objects: what noise, the error
 * of published types and the spread of gravity within a published class put into the residuals is
 * taken off. To it goes the uncertainty of the fitted mean itself, which is small along the
 * sequence and large where few spectra bear on the mean or it is carried on beyond them: an object
 * that is placed is not among those from which the mean was found.
 */
final class LocusFit {

    /** One-sigma width of the kernel where there are enough spectra (subclass). */
    private static final double BANDWIDTH = 2.0;

    /** In the T dwarfs, where methane sets in and relations anchor the loci, it is narrower. */
    private static final double METHANE_BANDWIDTH = 1.2;

    /**
     * From the first of these types to the second, L7 to T1, the kernel narrows in step with the
     * type: a sudden change would put a step into the loci.
     */
    private static final double[] NARROWING = {17, 21};

    /** Greatest width that is still widened (subclass). */
    private static final double WIDEST = 6;

    /** The kernel widens until its weights add up to this many spectra. */
    private static final double ENOUGH = 5;

    /** Weight of the prior that gravity does nothing. */
    private static final double GRAVITY_RIDGE = 0.3;

    /** Weight of the prior that the locus is straight, as a share of the weight of the spectra. */
    private static final double CURVATURE_RIDGE = 0.01;

    /** Columns of the regression: mean, slope, gravity shift, curvature. */
    private static final int TERMS = 4;

    private static final int ROUNDS = 4;

    /** Spectra with less weight are left out of the regression. */
    private static final double LEAST_WEIGHT = 1e-6;

    /** Residuals beyond this many sigma lose more than half of their weight. */
    private static final double SOFT_LIMIT = 2;

    /** What the soft weights take off the variance of normal residuals. */
    private static final double SOFT_LOSS = 1.25;

    /** Largest share of the variance that is ascribed to noise and to labels. */
    private static final double MOST_NOISE = 0.65;

    /** Gravity is known to matter, and has been calibrated, between these types only. */
    private static final double[] GRAVITY_RANGE = {2, 4, 18, 20};

    private LocusFit() {}

    /** Mean, gravity shift, scatter at one knot. */
    private record AtKnot(double mean, double shift, double scatter) {}

    /** A weighted regression. */
    private static final class Regression {

        /** Mean, slope, gravity shift, curvature. */
        private final double[] beta;

        /** Variance of the mean where that of a value is 1. */
        private final double varianceOfMean;

        private Regression(double[] beta, double varianceOfMean) {
            this.beta = beta;
            this.varianceOfMean = varianceOfMean;
        }
    }

    /**
     * Fits a locus.
     *
     * @param feature id of the feature
     * @param points what was measured on spectra of known type
     * @return the locus
     */
    static Locus fit(String feature, List<Point> points) {
        double[] mean = new double[TypeKnots.COUNT];
        double[] shift = new double[TypeKnots.COUNT];
        double[] scatter = new double[TypeKnots.COUNT];
        double[] weights = new double[points.size()];
        for (int k = 0; k < TypeKnots.COUNT; k++) {
            double type = TypeKnots.typeNumber(k);
            kernel(points, type, weights);
            AtKnot fit = local(points, type, gravityMatters(type), weights);
            mean[k] = fit.mean;
            shift[k] = fit.shift;
            scatter[k] = fit.scatter;
        }
        return new Locus(feature, mean, shift, scatter);
    }

    private static double gravityMatters(double type) {
        double rise = (type - GRAVITY_RANGE[0]) / (GRAVITY_RANGE[1] - GRAVITY_RANGE[0]);
        double fall = (GRAVITY_RANGE[3] - type) / (GRAVITY_RANGE[3] - GRAVITY_RANGE[2]);
        return Math.max(0, Math.min(1, Math.min(rise, fall)));
    }

    private static void kernel(List<Point> points, double type, double[] weights) {
        double width = width(type);
        while (true) {
            double sum = 0;
            for (int i = 0; i < weights.length; i++) {
                double u = (points.get(i).typeNumber() - type) / width;
                weights[i] = Math.exp(-0.5 * u * u) * points.get(i).weight();
                sum += weights[i];
            }
            if (sum >= ENOUGH || width > WIDEST) {
                return;
            }
            width *= 1.25;
        }
    }

    /** Width of the kernel where there are enough spectra (subclass). */
    private static double width(double type) {
        double part = (type - NARROWING[0]) / (NARROWING[1] - NARROWING[0]);
        return BANDWIDTH + Math.max(0, Math.min(1, part)) * (METHANE_BANDWIDTH - BANDWIDTH);
    }

    private static AtKnot local(
            List<Point> points, double type, double gravityMatters, double[] kernel) {
        double[] robust = new double[kernel.length];
        Arrays.fill(robust, 1);
        double[] beta = new double[TERMS];
        double varianceOfMean = 0;
        double variance = 0;
        double noise = 0;
        double effective = 1;
        for (int round = 0; round < ROUNDS; round++) {
            Regression regression = regress(points, type, kernel, robust);
            beta = regression.beta;
            varianceOfMean = regression.varianceOfMean;
            double sum = 0;
            double squares = 0;
            double spread = 0;
            double ofNoise = 0;
            for (int i = 0; i < kernel.length; i++) {
                Point point = points.get(i);
                double w = kernel[i] * robust[i];
                double r = residual(point, type, beta);
                sum += w;
                squares += w * w;
                spread += w * (r * r + point.ownScatter() * point.ownScatter());
                ofNoise += w * point.oneSigma() * point.oneSigma();
            }
            variance = spread / sum;
            noise = ofNoise / sum;
            effective = sum * sum / squares;
            double sigma = Math.sqrt(variance) + 1e-6;
            for (int i = 0; i < kernel.length; i++) {
                double u = residual(points.get(i), type, beta) / (SOFT_LIMIT * sigma);
                robust[i] = 1 / (1 + u * u);
            }
        }
        double corrected = variance * SOFT_LOSS * effective / Math.max(effective - 2, 1);
        double shift = beta[2] * gravityMatters;
        double ofLabels =
                Math.pow(TrainingSet.TYPE_NOISE_SUBCLASS * beta[1], 2)
                        + Math.pow(TrainingSet.GRAVITY_NOISE * shift, 2);
        double intrinsic = corrected - Math.min(noise + ofLabels, MOST_NOISE * corrected);
        double expected = intrinsic + varianceOfMean * corrected;
        return new AtKnot(beta[0], shift, Math.sqrt(Math.max(expected, 1e-8)));
    }

    private static double residual(Point point, double type, double[] beta) {
        double difference = point.typeNumber() - type;
        return point.value()
                - beta[0]
                - beta[1] * difference
                - beta[2] * point.lowGravity()
                - beta[3] * difference * difference;
    }

    /**
     * Weighted least squares for mean, slope, gravity shift and curvature, with weak priors on all
     * but the mean.
     */
    private static Regression regress(
            List<Point> points, double type, double[] kernel, double[] robust) {
        double[][] normal = new double[TERMS][TERMS + 2];
        for (int i = 0; i < kernel.length; i++) {
            double w = kernel[i] * robust[i];
            if (w < LEAST_WEIGHT) {
                continue;
            }
            double[] row = row(points.get(i), type);
            for (int a = 0; a < TERMS; a++) {
                for (int b = 0; b < TERMS; b++) {
                    normal[a][b] += w * row[a] * row[b];
                }
                normal[a][TERMS] += w * row[a] * points.get(i).value();
            }
        }
        normal[0][TERMS + 1] = 1;
        normal[0][0] += 1e-9;
        normal[1][1] += 5e-5 * normal[0][0] + 1e-9;
        normal[2][2] += GRAVITY_RIDGE;
        normal[3][3] += CURVATURE_RIDGE * normal[0][0] + 1e-9;
        eliminate(normal);
        double[] ofMean = substitute(normal, TERMS + 1);
        double varianceOfMean = 0;
        for (int i = 0; i < kernel.length; i++) {
            double w = kernel[i] * robust[i];
            if (w >= LEAST_WEIGHT) {
                double[] row = row(points.get(i), type);
                double influence = 0;
                for (int a = 0; a < TERMS; a++) {
                    influence += w * row[a] * ofMean[a];
                }
                varianceOfMean += influence * influence;
            }
        }
        return new Regression(substitute(normal, TERMS), varianceOfMean);
    }

    private static double[] row(Point point, double type) {
        double difference = point.typeNumber() - type;
        return new double[] {1, difference, point.lowGravity(), difference * difference};
    }

    /** Brings the normal equations into triangular form; they are positive definite. */
    private static void eliminate(double[][] a) {
        for (int p = 0; p < TERMS; p++) {
            for (int row = p + 1; row < TERMS; row++) {
                double factor = a[row][p] / a[p][p];
                for (int col = p; col < a[row].length; col++) {
                    a[row][col] -= factor * a[p][col];
                }
            }
        }
    }

    /** Solves the triangular equations for one of their right sides. */
    private static double[] substitute(double[][] a, int rightSide) {
        double[] x = new double[TERMS];
        for (int p = TERMS - 1; p >= 0; p--) {
            double sum = a[p][rightSide];
            for (int col = p + 1; col < TERMS; col++) {
                sum -= a[p][col] * x[col];
            }
            x[p] = sum / a[p][p];
        }
        return x;
    }
}
