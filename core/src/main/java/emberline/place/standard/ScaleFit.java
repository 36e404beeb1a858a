package emberline.place.standard;

import emberline.place.standard.CommonGrid.Binned;
import java.util.Optional;

/**
 * A fit of scales by least squares. The noise of the scaled standards enters the weights, so the
 * fit is repeated with the scales found before.
 *
 * @param a scale of the first standard, positive
 * @param b scale of the second, positive; 0 for a single one
 * @param chiSquare weighted sum of squares
 * @param bins number of bins in common
 */
record ScaleFit(double a, double b, double chiSquare, int bins) {

    private static final int ROUNDS = 3;

    /** One standard; empty if the scale is not positive. */
    static Optional<ScaleFit> one(Binned object, Binned first) {
        return fit(object, first, null);
    }

    /** The sum of two standards; empty if a scale is not positive. */
    static Optional<ScaleFit> two(Binned object, Binned first, Binned second) {
        return fit(object, first, second);
    }

    private static Optional<ScaleFit> fit(Binned object, Binned first, Binned second) {
        double a = 0;
        double b = 0;
        for (int round = 0; round < ROUNDS; round++) {
            Sums sums = sums(object, first, second, a, b);
            double determinant = sums.aa * sums.bb - sums.ab * sums.ab;
            if (second == null) {
                a = sums.ay / sums.aa;
            } else {
                a = (sums.ay * sums.bb - sums.by * sums.ab) / determinant;
                b = (sums.by * sums.aa - sums.ay * sums.ab) / determinant;
            }
            if (!(a > 0) || (second != null && !(b > 0))) {
                return Optional.empty();
            }
        }
        Sums sums = sums(object, first, second, a, b);
        return Optional.of(new ScaleFit(a, b, sums.chiSquare, sums.bins));
    }

    private static final class Sums {
        double aa;
        double ab;
        double bb;
        double ay;
        double by;
        double chiSquare;
        int bins;
    }

    private static Sums sums(Binned object, Binned first, Binned second, double a, double b) {
        Sums sums = new Sums();
        for (int k = 0; k < object.flux().length; k++) {
            double y = object.flux()[k];
            double f = first.flux()[k];
            double g = second == null ? 0 : second.flux()[k];
            double floor = StandardComparison.FLOOR * y;
            double variance =
                    object.sigma()[k] * object.sigma()[k]
                            + Math.pow(a * first.sigma()[k], 2)
                            + (second == null ? 0 : Math.pow(b * second.sigma()[k], 2))
                            + floor * floor;
            double weight = 1 / variance;
            if (Double.isNaN(y + f + g) || !(weight > 0) || Double.isInfinite(weight)) {
                continue;
            }
            sums.aa += weight * f * f;
            sums.ab += weight * f * g;
            sums.bb += weight * g * g;
            sums.ay += weight * f * y;
            sums.by += weight * g * y;
            sums.chiSquare += weight * Math.pow(y - a * f - b * g, 2);
            sums.bins++;
        }
        return sums;
    }
}
