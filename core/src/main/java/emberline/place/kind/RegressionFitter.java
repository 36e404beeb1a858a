package emberline.place.kind;

import java.util.Arrays;
import java.util.List;
import smile.math.BFGS;
import smile.math.DifferentiableMultivariateFunction;

/**
 * Fits the regression of one coverage: the greatest likelihood with every kind of equal weight,
 * less {@value #PENALTY} / 2 times the sum of the squared weights. The maximum is unique.
 */
final class RegressionFitter {

    /** The unit of a feature as a part of half its range from the 16th to the 84th percentile. */
    private static final double UNIT = 0.3;

    private static final double LEAST_UNIT = 1e-6;
    private static final double PENALTY = 1;

    /** The constant is hardly held back. */
    private static final double CONSTANT_PENALTY = 1e-3;

    private static final int MOST_STEPS = 100;
    private static final int MEMORY = 10;
    private static final double TOLERANCE = 1e-5;

    private final KindFeatures features;

    RegressionFitter(KindFeatures features) {
        this.features = features;
    }

    /** A regression with uncalibrated probabilities. */
    Regression fit(Coverage coverage, List<TrainingRow> rows) {
        List<TrainingRow> chosen = TrainingSample.of(rows);
        int[] columns = coverage.columns(features);
        float[] medians = new float[columns.length];
        float[] units = new float[columns.length];
        double[][] squeezed = new double[chosen.size()][columns.length];
        for (int k = 0; k < columns.length; k++) {
            double[] sorted = measured(chosen, columns[k]);
            medians[k] = (float) quantile(sorted, 0.5);
            units[k] =
                    (float)
                            Math.max(
                                    LEAST_UNIT,
                                    UNIT * (quantile(sorted, 0.84) - quantile(sorted, 0.16)) / 2);
            for (int i = 0; i < squeezed.length; i++) {
                double value = chosen.get(i).vector().values()[columns[k]];
                squeezed[i][k] = Regression.squeezed(value, medians[k], units[k]);
            }
        }
        int[] kinds = chosen.stream().mapToInt(row -> row.kind().position()).toArray();
        Likelihood likelihood = new Likelihood(squeezed, kinds);
        double[] weights = new double[(columns.length + 1) * Forest.KINDS];
        BFGS.minimize(likelihood, MEMORY, weights, TOLERANCE, MOST_STEPS);
        float[] kept = new float[weights.length];
        for (int k = 0; k < kept.length; k++) {
            kept[k] = (float) weights[k];
        }
        return new Regression(columns, medians, units, likelihood.known(), kept, 1);
    }

    private static double[] measured(List<TrainingRow> rows, int column) {
        return rows.stream()
                .mapToDouble(row -> row.vector().values()[column])
                .filter(value -> !Double.isNaN(value))
                .sorted()
                .toArray();
    }

    private static double quantile(double[] sorted, double share) {
        return sorted.length == 0 ? 0 : sorted[(int) (share * (sorted.length - 1))];
    }

    /** Minus the penalised logarithm of the likelihood, with its gradient. */
    @SuppressWarnings("serial") // never written
    private static final class Likelihood implements DifferentiableMultivariateFunction {

        private final double[][] rows;
        private final int[] kinds;
        private final boolean[] known = new boolean[Forest.KINDS];
        private final double[] weightOfKind = new double[Forest.KINDS];

        Likelihood(double[][] rows, int[] kinds) {
            this.rows = rows;
            this.kinds = kinds;
            int[] count = new int[Forest.KINDS];
            for (int kind : kinds) {
                count[kind]++;
                known[kind] = true;
            }
            long present = Arrays.stream(count).filter(n -> n > 0).count();
            for (int kind = 0; kind < count.length; kind++) {
                weightOfKind[kind] = kinds.length / (double) present / Math.max(1, count[kind]);
            }
        }

        boolean[] known() {
            return known.clone();
        }

        @Override
        public double f(double[] weights) {
            return g(weights, new double[weights.length]);
        }

        @Override
        public double g(double[] weights, double[] gradient) {
            double value = 0;
            int constant = weights.length - Forest.KINDS;
            for (int k = 0; k < weights.length; k++) {
                double penalty = k < constant ? PENALTY : CONSTANT_PENALTY;
                value += penalty / 2 * weights[k] * weights[k];
                gradient[k] = penalty * weights[k];
            }
            double[] p = new double[Forest.KINDS];
            for (int i = 0; i < rows.length; i++) {
                value += add(rows[i], kinds[i], weights, gradient, p);
            }
            return value;
        }

        /** What one row adds to the value; its part is added to the gradient. */
        private double add(
                double[] row, int truth, double[] weights, double[] gradient, double[] p) {
            int constant = row.length * Forest.KINDS;
            System.arraycopy(weights, constant, p, 0, p.length);
            for (int k = 0; k < row.length; k++) {
                for (int kind = 0; kind < p.length; kind++) {
                    p[kind] += weights[k * Forest.KINDS + kind] * row[k];
                }
            }
            double logOfTruth = p[truth];
            double loss = weightOfKind[truth] * (Shares.fromLogarithms(p, known) - logOfTruth);
            p[truth] -= 1;
            for (int kind = 0; kind < p.length; kind++) {
                p[kind] *= weightOfKind[truth];
                gradient[constant + kind] += p[kind];
            }
            for (int k = 0; k < row.length; k++) {
                for (int kind = 0; kind < p.length; kind++) {
                    gradient[k * Forest.KINDS + kind] += p[kind] * row[k];
                }
            }
            return loss;
        }
    }
}
