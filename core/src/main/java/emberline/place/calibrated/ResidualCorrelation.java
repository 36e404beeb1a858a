package emberline.place.calibrated;

import emberline.measure.Measurement.Measured;
import emberline.place.calibrated.TrainingSet.Dwarf;
import java.util.List;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * How the residuals of features about their loci go together: an object with too much water for its
 * type shows it in every water index. One matrix for all types, from standardised residuals, shrunk
 * towards independence.
 */
final class ResidualCorrelation {

    /**
     * What is kept of the correlations found. Chosen by cross-validation: a few hundred dwarfs do
     * not determine thousands of correlations, and their errors cost more than they tell.
     */
    private static final double KEPT = 0.25;

    /** Residuals are cut at this many sigma. */
    private static final double CUT = 3;

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
        double[][] residuals = new double[dwarfs.size()][];
        for (int d = 0; d < residuals.length; d++) {
            residuals[d] = residuals(loci, dwarfs.get(d));
        }
        double[][] matrix = new double[size][size];
        for (int a = 0; a < size; a++) {
            matrix[a][a] = 1;
            for (int b = 0; b < a; b++) {
                matrix[a][b] = KEPT * correlation(residuals, dwarfs, a, b);
                matrix[b][a] = matrix[a][b];
            }
        }
        return positiveDefinite(matrix);
    }

    private static double[] residuals(List<Locus> loci, Dwarf dwarf) {
        double[] residuals = new double[loci.size()];
        for (int i = 0; i < residuals.length; i++) {
            Locus locus = loci.get(i);
            residuals[i] =
                    dwarf.row()
                            .feature(locus.feature())
                            .map(value -> residual(locus, value, dwarf))
                            .orElse(Double.NaN);
        }
        return residuals;
    }

    private static double residual(Locus locus, Measured value, Dwarf dwarf) {
        double sigma = Math.hypot(locus.scatter(dwarf.typeNumber()), value.oneSigma());
        double residual =
                (value.value() - locus.mean(dwarf.typeNumber(), dwarf.lowGravity())) / sigma;
        return Math.max(-CUT, Math.min(CUT, residual));
    }

    private static double correlation(double[][] residuals, List<Dwarf> dwarfs, int a, int b) {
        double aa = 0;
        double bb = 0;
        double ab = 0;
        int pairs = 0;
        for (int d = 0; d < residuals.length; d++) {
            double one = residuals[d][a];
            double two = residuals[d][b];
            if (!Double.isNaN(one) && !Double.isNaN(two)) {
                double weight = dwarfs.get(d).weight();
                aa += weight * one * one;
                bb += weight * two * two;
                ab += weight * one * two;
                pairs++;
            }
        }
        if (pairs <= FEWEST_PAIRS) {
            return 0;
        }
        double sure = (pairs - FEWEST_PAIRS) / (pairs + HALF_PAIRS);
        return sure * ab / Math.sqrt(aa * bb);
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
