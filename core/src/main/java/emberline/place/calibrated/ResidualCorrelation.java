package emberline.place.calibrated;

import emberline.place.calibrated.TrainingSet.Dwarf;
import java.util.List;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * How the residuals of features about their loci go together: an object with too much water for its
 * type shows it in every water index. One matrix for all types, from standardised residuals,
 * cleared of what the errors of published types and gravities put into all of them at once, and
 * shrunk towards independence.
 */
final class ResidualCorrelation {

    /**
     * What is kept of the correlations found. Chosen by cross-validation: a few hundred dwarfs do
     * not determine thousands of correlations, and their errors cost more than they tell.
     */
    private static final double KEPT = 0.35;

    /** Smallest share of the variance of a feature that is left to the objects. */
    private static final double LEAST_OWN = 0.3;

    /** No correlation is taken as stronger. */
    private static final double MOST = 0.95;

    /** Pairs of features need more spectra in common than this. */
    private static final double FEWEST_PAIRS = 12;

    /** Pairs with this many more spectra than the fewest count half. */
    private static final double HALF_PAIRS = 20;

    /** Smallest eigenvalue that is left, so that no combination of features is taken as exact. */
    private static final double LEAST_EIGENVALUE = 0.05;

    private ResidualCorrelation() {}

    /**
     * The correlation matrix of the residuals.
     *
     * @param loci the loci
     * @param dwarfs dwarfs of known type
     * @return symmetric positive definite matrix with ones on the diagonal, in the order of the
     *     loci
     */
    static double[][] of(List<Locus> loci, List<Dwarf> dwarfs) {
        int size = loci.size();
        Residuals[] ofDwarf = new Residuals[dwarfs.size()];
        for (int d = 0; d < ofDwarf.length; d++) {
            ofDwarf[d] = new Residuals(loci, dwarfs.get(d));
        }
        double[][] matrix = new double[size][size];
        for (int a = 0; a < size; a++) {
            matrix[a][a] = 1;
            for (int b = 0; b < a; b++) {
                matrix[a][b] = KEPT * correlation(ofDwarf, a, b);
                matrix[b][a] = matrix[a][b];
            }
        }
        return positiveDefinite(matrix);
    }

    /**
     * The correlation of two residuals, less what the errors of labels make of it: an object whose
     * published type is too late stands off all loci at once, which says nothing about objects.
     */
    private static double correlation(Residuals[] ofDwarf, int a, int b) {
        double aa = 0;
        double bb = 0;
        double ab = 0;
        double labelsOfA = 0;
        double labelsOfB = 0;
        int pairs = 0;
        for (Residuals one : ofDwarf) {
            if (one.hasBoth(a, b)) {
                aa += one.product(a, a);
                bb += one.product(b, b);
                ab += one.product(a, b) - one.productOfLabels(a, b);
                labelsOfA += one.productOfLabels(a, a);
                labelsOfB += one.productOfLabels(b, b);
                pairs++;
            }
        }
        if (pairs <= FEWEST_PAIRS) {
            return 0;
        }
        double sure = (pairs - FEWEST_PAIRS) / (pairs + HALF_PAIRS);
        double ofA = Math.max(aa - labelsOfA, LEAST_OWN * aa);
        double ofB = Math.max(bb - labelsOfB, LEAST_OWN * bb);
        return Math.max(-MOST, Math.min(MOST, sure * ab / Math.sqrt(ofA * ofB)));
    }

    private static double[][] positiveDefinite(double[][] matrix) {
        EigenDecomposition parts = new EigenDecomposition(new Array2DRowRealMatrix(matrix));
        double[] values = parts.getRealEigenvalues();
        int size = matrix.length;
        double[][] mended = new double[size][size];
        for (int e = 0; e < size; e++) {
            double value = Math.max(values[e], LEAST_EIGENVALUE);
            double[] vector = parts.getEigenvector(e).toArray();
            for (int a = 0; a < size; a++) {
                for (int b = 0; b < size; b++) {
                    mended[a][b] += value * vector[a] * vector[b];
                }
            }
        }
        double[][] scaled = new double[size][size];
        for (int a = 0; a < size; a++) {
            for (int b = 0; b < size; b++) {
                scaled[a][b] = mended[a][b] / Math.sqrt(mended[a][a] * mended[b][b]);
            }
        }
        return scaled;
    }
}
