package emberline.place.calibrated;

import emberline.place.GravityClass;
import emberline.place.LowerFactor;
import java.util.Arrays;

/**
 * The normal likelihood of a sample around one knot. The covariance of the knot, scatter and noise
 * together, is taken for the types between its neighbours; the mean runs linearly between knots, so
 * a few triangular solutions serve all types and gravities there. Where the sigma of features is
 * widened the factor of the covariance stays: its rows are stretched.
 */
final class KnotLikelihood {

    private static final int HERE = 1;

    private final Sample sample;
    private final int knot;
    private final LowerFactor factor;
    private final double[] inflation;
    private final double logDeterminant;
    private final int size;

    /**
     * Whitened residual of field gravity, and whitened gravity shift, at three knots, once they are
     * asked for.
     */
    private final double[][] residual = new double[3][];

    private final double[][] shift = new double[3][];

    private KnotLikelihood(Sample sample, int knot, LowerFactor factor, double[] inflation) {
        this.sample = sample;
        this.knot = knot;
        this.factor = factor;
        this.inflation = inflation.clone();
        this.size = sample.size();
        double sum = factor.logDeterminant();
        for (double one : inflation) {
            sum += 2 * Math.log(one);
        }
        this.logDeterminant = sum;
    }

    /**
     * Prepares a knot.
     *
     * @param sample the values
     * @param knot index of the knot
     * @return the likelihood with sigmas as they are
     */
    static KnotLikelihood at(Sample sample, int knot) {
        double[] as = new double[sample.size()];
        Arrays.fill(as, 1);
        LowerFactor factor = LowerFactor.of(covariance(sample, knot));
        return new KnotLikelihood(sample, knot, factor, as);
    }

    /**
     * The likelihood with wider sigmas.
     *
     * @param factors factor on the sigma of each feature, 1 for one that fits
     * @return a new likelihood
     */
    KnotLikelihood widened(double[] factors) {
        return new KnotLikelihood(sample, knot, factor, factors);
    }

    /** Whitens residual and shift of this knot or of a neighbour. */
    private void solve(int side) {
        int at = Math.max(0, Math.min(TypeKnots.COUNT - 1, knot + side - HERE));
        double[] difference = new double[size];
        double[] ofGravity = new double[size];
        for (int f = 0; f < size; f++) {
            Locus locus = sample.locus(f);
            difference[f] = (sample.value(f) - locus.mean(at, 0)) / inflation[f];
            ofGravity[f] = locus.shift(at) / inflation[f];
        }
        residual[side] = factor.whiten(difference);
        shift[side] = factor.whiten(ofGravity);
    }

    private void solveIfNew(int side) {
        if (residual[side] == null) {
            solve(side);
        }
    }

    private static double[][] covariance(Sample sample, int knot) {
        int size = sample.size();
        double[] scatter = new double[size];
        for (int f = 0; f < size; f++) {
            scatter[f] = sample.locus(f).scatter(knot);
        }
        double[][] matrix = new double[size][size];
        for (int f = 0; f < size; f++) {
            for (int g = f; g < size; g++) {
                matrix[f][g] =
                        scatter[f] * scatter[g] * sample.correlation(f, g) + sample.noise(f, g);
            }
        }
        return matrix;
    }

    /**
     * The likelihood at one type.
     *
     * @param stepsFromKnot distance of the type from this knot in steps of the knots, -1 to 1
     * @return the likelihood there, for every gravity
     */
    AtType at(double stepsFromKnot) {
        int side = stepsFromKnot < 0 ? 0 : 2;
        double part = Math.abs(stepsFromKnot);
        solveIfNew(HERE);
        if (part > 0) {
            solveIfNew(side);
        } else {
            side = HERE;
        }
        double squares = 0;
        double products = 0;
        double shifts = 0;
        for (int f = 0; f < size; f++) {
            double rest = residual[HERE][f] + part * (residual[side][f] - residual[HERE][f]);
            double ofGravity = shift[HERE][f] + part * (shift[side][f] - shift[HERE][f]);
            squares += rest * rest;
            products += rest * ofGravity;
            shifts += ofGravity * ofGravity;
        }
        return new AtType(squares, products, shifts, logDeterminant);
    }

    /**
     * The likelihood at one type, which is normal in gravity: products of whitened vectors.
     *
     * @param squares of the residual at field gravity with itself
     * @param products of that residual with the gravity shift
     * @param shifts of the gravity shift with itself
     * @param logDeterminant logarithm of the determinant of the covariance
     */
    record AtType(double squares, double products, double shifts, double logDeterminant) {

        /**
         * The logarithm of the likelihood of a gravity class, its objects being spread normally.
         *
         * @param gravity the class
         * @return log likelihood, up to a constant of the sample
         */
        double logLikelihood(GravityClass gravity) {
            double centre = GravityScale.centre(gravity);
            double variance = Math.pow(GravityScale.spread(gravity), 2);
            double chiSquare = squares - 2 * centre * products + centre * centre * shifts;
            double along = products - centre * shifts;
            double wider = 1 + variance * shifts;
            return -0.5
                    * (chiSquare
                            - variance * along * along / wider
                            + Math.log(wider)
                            + logDeterminant);
        }
    }

    /**
     * How far very low gravity stands apart from field gravity at this knot.
     *
     * @return distance in sigma of scatter and noise
     */
    double gravitySeparationSigma() {
        solveIfNew(HERE);
        double sum = 0;
        for (double one : shift[HERE]) {
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
        for (int side = 0; side < residual.length; side++) {
            solveIfNew(side);
        }
        double[] slope = new double[size];
        double[] rest = new double[size];
        for (int f = 0; f < size; f++) {
            double before = residual[0][f] - lowGravity * shift[0][f];
            double after = residual[2][f] - lowGravity * shift[2][f];
            double here = residual[HERE][f] - lowGravity * shift[HERE][f];
            slope[f] = (before - after) / (2 * TypeKnots.STEP);
            rest[f] = here + stepsFromKnot * (after - before) / 2;
        }
        double information = 0;
        for (int f = 0; f < size; f++) {
            information += slope[f] * slope[f];
        }
        // the stretching of the rows cancels in the products
        double[] slopeBack = factor.unwhiten(slope.clone());
        double[] restRaw = factor.colour(rest);
        double[] slopeRaw = factor.colour(slope);
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
}
