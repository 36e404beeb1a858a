package emberline.place.standard;

import java.util.Arrays;
import java.util.Collection;
import java.util.Optional;

/**
 * A fit of one standard, or of the sum of two, to an object: weighted least squares with free
 * scales. Objects of one type differ in colour, and flux calibrations do; so each range is
 * multiplied by a factor of its own, which is 1 with a sigma of {@value #FACTOR_SIGMA}.
 *
 * <p>The weight of a bin is one over the squares of the noise of the object, of {@value #FLOOR} of
 * its flux and of {@value #FLOOR_OF_MEAN} of its mean flux in the range: no two dwarfs of one type
 * are alike to better than that. The noise of standards does not enter, so that a noisy standard
 * fits worse and not better.
 *
 * @param a scale of the first standard, positive
 * @param b scale of the second, positive; 0 for a single one
 * @param chiSquare weighted sum of squares, those of the factors included
 * @param bins number of bins in common
 */
record ScaleFit(double a, double b, double chiSquare, int bins) {

    /** Share of the flux by which like objects differ in a bin. */
    static final double FLOOR = 0.02;

    /** Share of the mean flux of the range by which they differ where little flux is left. */
    static final double FLOOR_OF_MEAN = 0.01;

    /** Scatter of the factors of the ranges. */
    static final double FACTOR_SIGMA = 0.1;

    private static final double FACTOR_WEIGHT = 1 / (FACTOR_SIGMA * FACTOR_SIGMA);
    private static final int ROUNDS = 3;

    /** The bins of an object that take part, with their weights. */
    static final class Target {
        private final int[] bins;
        private final int[] rangeOf;
        private final int ranges;
        private final double[] flux;
        private final double[] weight;

        Target(Binned object, Collection<Range> compared) {
            int[] taken = new int[object.grid().size()];
            int[] inRange = new int[taken.length];
            double[] values = new double[taken.length];
            double[] weights = new double[taken.length];
            int count = 0;
            int range = 0;
            for (Range one : compared) {
                double least = FLOOR_OF_MEAN * object.mean(one);
                for (int k = object.grid().from(one); k < object.grid().to(one); k++) {
                    double y = object.flux(k);
                    double w =
                            1
                                    / (Math.pow(object.sigma(k), 2)
                                            + Math.pow(FLOOR * y, 2)
                                            + least * least);
                    if (w > 0 && Double.isFinite(w)) {
                        taken[count] = k;
                        inRange[count] = range;
                        values[count] = y;
                        weights[count] = w;
                        count++;
                    }
                }
                range++;
            }
            bins = Arrays.copyOf(taken, count);
            rangeOf = Arrays.copyOf(inRange, count);
            flux = Arrays.copyOf(values, count);
            weight = Arrays.copyOf(weights, count);
            ranges = range;
        }

        /** The fluxes of a standard in the bins that take part; NaN where it is not covered. */
        double[] of(Binned standard) {
            return Arrays.stream(bins).mapToDouble(standard::flux).toArray();
        }
    }

    /** Scales by least squares under given factors, and what is left. */
    private static final class Sums {
        private double ff;
        private double gg;
        private double fg;
        private double fy;
        private double gy;
        private double yy;
        private int count;

        static Sums of(Target object, double[] first, double[] second, double[] factor) {
            Sums sums = new Sums();
            boolean two = second.length > 0;
            for (int k = 0; k < object.bins.length; k++) {
                double f = factor[object.rangeOf[k]] * first[k];
                double g = two ? factor[object.rangeOf[k]] * second[k] : 0;
                if (Double.isNaN(f + g)) {
                    continue;
                }
                double w = object.weight[k];
                double y = object.flux[k];
                sums.ff += w * f * f;
                sums.gg += w * g * g;
                sums.fg += w * f * g;
                sums.fy += w * f * y;
                sums.gy += w * g * y;
                sums.yy += w * y * y;
                sums.count++;
            }
            return sums;
        }

        double a(boolean two) {
            return two ? (fy * gg - gy * fg) / (ff * gg - fg * fg) : fy / ff;
        }

        double b(boolean two) {
            return two ? (gy * ff - fy * fg) / (ff * gg - fg * fg) : 0;
        }

        double chiSquare(double a, double b) {
            return Math.max(0, yy - a * fy - b * gy);
        }
    }

    /** One standard; empty if its scale is not positive. */
    static Optional<ScaleFit> one(Target object, double[] standard) {
        return fit(object, standard, new double[0], ROUNDS);
    }

    /** The sum of two standards; empty if a scale is not positive. */
    static Optional<ScaleFit> two(Target object, double[] first, double[] second) {
        return fit(object, first, second, ROUNDS);
    }

    /** The sum of two standards with all factors 1, for a first look. */
    static Optional<ScaleFit> rough(Target object, double[] first, double[] second) {
        return fit(object, first, second, 0);
    }

    private static Optional<ScaleFit> fit(
            Target object, double[] first, double[] second, int rounds) {
        boolean two = second.length > 0;
        double[] factor = new double[object.ranges];
        Arrays.fill(factor, 1);
        for (int round = 0; true; round++) {
            Sums sums = Sums.of(object, first, second, factor);
            double a = sums.a(two);
            double b = sums.b(two);
            if (!(a > 0) || (two && !(b > 0))) {
                return Optional.empty();
            }
            if (round == rounds) {
                double chiSquare = sums.chiSquare(a, b);
                for (double one : factor) {
                    chiSquare += FACTOR_WEIGHT * (one - 1) * (one - 1);
                }
                return Optional.of(new ScaleFit(a, b, chiSquare, sums.count));
            }
            refine(object, first, second, a, b, factor);
        }
    }

    /** The best factors for given scales. */
    private static void refine(
            Target object, double[] first, double[] second, double a, double b, double[] factor) {
        double[] my = new double[object.ranges];
        double[] mm = new double[object.ranges];
        boolean two = second.length > 0;
        for (int k = 0; k < object.bins.length; k++) {
            double m = a * first[k] + (two ? b * second[k] : 0);
            if (!Double.isNaN(m)) {
                my[object.rangeOf[k]] += object.weight[k] * m * object.flux[k];
                mm[object.rangeOf[k]] += object.weight[k] * m * m;
            }
        }
        for (int r = 0; r < factor.length; r++) {
            factor[r] = (my[r] + FACTOR_WEIGHT) / (mm[r] + FACTOR_WEIGHT);
        }
    }
}
