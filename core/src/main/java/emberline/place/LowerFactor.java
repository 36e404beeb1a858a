package emberline.place;

/**
 * The lower (Cholesky) factor of a covariance matrix. Matrices here are a positive definite and a
 * semidefinite one together; a pivot that rounding made too small is kept at a share of its
 * diagonal element, so that very large noise beside small scatter makes no infinite numbers.
 */
public final class LowerFactor {

    private static final double LEAST_VARIANCE = 1e-14;
    private static final double LEAST_SHARE = 1e-12;

    /** The columns of the factor, each from its diagonal element on; what is before is no part. */
    private final double[][] columns;

    private final double logDeterminant;

    private LowerFactor(double[][] columns) {
        this.columns = columns;
        double sum = 0;
        for (int k = 0; k < columns.length; k++) {
            sum += Math.log(columns[k][k]);
        }
        this.logDeterminant = 2 * sum;
    }

    /**
     * Factors a matrix. All inner loops add runs of numbers of equal place, which a compiler turns
     * into operations on several at once.
     *
     * @param covariance the rows of the matrix, of which each is read from the diagonal on; used up
     * @return the factor
     */
    public static LowerFactor of(double[][] covariance) {
        double[][] a = covariance;
        for (int row = 0; row < a.length; row++) {
            double[] own = a[row];
            double least = Math.max(LEAST_VARIANCE, LEAST_SHARE * own[row]);
            int k = 0;
            for (; k + 3 < row; k += 4) {
                subtractFour(own, row, a[k], a[k + 1], a[k + 2], a[k + 3]);
            }
            for (; k < row; k++) {
                subtract(own, row, a[k][row], a[k]);
            }
            double pivot = Math.sqrt(Math.max(own[row], least));
            own[row] = pivot;
            for (int j = row + 1; j < own.length; j++) {
                own[j] /= pivot;
            }
        }
        return new LowerFactor(a);
    }

    private static void subtractFour(
            double[] from, int start, double[] a, double[] b, double[] c, double[] d) {
        double byA = a[start];
        double byB = b[start];
        double byC = c[start];
        double byD = d[start];
        for (int j = start; j < from.length; j++) {
            from[j] -= byA * a[j] + byB * b[j] + byC * c[j] + byD * d[j];
        }
    }

    private static void subtract(double[] from, int start, double weight, double[] a) {
        for (int j = start; j < from.length; j++) {
            from[j] -= weight * a[j];
        }
    }

    /**
     * The logarithm of the determinant of the matrix.
     *
     * @return natural logarithm
     */
    public double logDeterminant() {
        return logDeterminant;
    }

    /**
     * Solves the triangle for a vector: what had the covariance of the matrix becomes independent,
     * of sigma 1.
     *
     * @param vector right-hand side, replaced by the solution
     * @return the same array
     */
    public double[] whiten(double[] vector) {
        for (int k = 0; k < vector.length; k++) {
            vector[k] /= columns[k][k];
            subtract(vector, k + 1, vector[k], columns[k]);
        }
        return vector;
    }

    /**
     * Solves the transposed triangle.
     *
     * @param vector right-hand side, replaced by the solution
     * @return the same array
     */
    public double[] unwhiten(double[] vector) {
        for (int k = vector.length - 1; k >= 0; k--) {
            double sum = vector[k];
            for (int j = k + 1; j < vector.length; j++) {
                sum -= columns[k][j] * vector[j];
            }
            vector[k] = sum / columns[k][k];
        }
        return vector;
    }

    /**
     * The triangle times a vector: independent numbers of sigma 1 get the covariance of the matrix.
     *
     * @param vector the vector; left as it is
     * @return a new vector
     */
    public double[] colour(double[] vector) {
        double[] coloured = new double[vector.length];
        for (int k = 0; k < vector.length; k++) {
            subtract(coloured, k, -vector[k], columns[k]);
        }
        return coloured;
    }

    /**
     * Chi-square of a vector.
     *
     * @param vector the vector, used up
     * @return its squared length in units of sigma
     */
    public double chiSquare(double[] vector) {
        double sum = 0;
        for (double one : whiten(vector)) {
            sum += one * one;
        }
        return sum;
    }
}
