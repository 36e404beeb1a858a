package emberline.place;

/**
 * The lower (Cholesky) factor of a covariance matrix. Matrices here are a positive definite and a
 * semidefinite one together; a pivot that rounding made too small is kept at a share of its
 * diagonal element, so that very large noise beside small scatter makes no infinite numbers.
 */
public final class LowerFactor {

    private static final double LEAST_VARIANCE = 1e-14;
    private static final double LEAST_SHARE = 1e-12;

    private final double[] lower;
    private final int size;
    private final double logDeterminant;

    private LowerFactor(double[] lower, int size) {
        this.lower = lower;
        this.size = size;
        double sum = 0;
        for (int row = 0; row < size; row++) {
            sum += Math.log(lower[row * size + row]);
        }
        this.logDeterminant = 2 * sum;
    }

    /**
     * Factors a matrix.
     *
     * @param covariance the matrix row by row, of which the lower triangle is read; used up
     * @param size number of its rows
     * @return the factor
     */
    public static LowerFactor of(double[] covariance, int size) {
        double[] a = covariance;
        for (int row = 0; row < size; row++) {
            int start = row * size;
            double least = Math.max(LEAST_VARIANCE, LEAST_SHARE * a[start + row]);
            for (int col = 0; col < row; col++) {
                int other = col * size;
                a[start + col] =
                        (a[start + col] - product(a, start, a, other, col)) / a[other + col];
            }
            double pivot = a[start + row] - product(a, start, a, start, row);
            a[start + row] = Math.sqrt(Math.max(pivot, least));
        }
        return new LowerFactor(a, size);
    }

    /** The sum of products of two runs of numbers, in four sums that do not wait for each other. */
    private static double product(double[] a, int fromA, double[] b, int fromB, int length) {
        double one = 0;
        double two = 0;
        double three = 0;
        double four = 0;
        int k = 0;
        for (; k + 3 < length; k += 4) {
            one += a[fromA + k] * b[fromB + k];
            two += a[fromA + k + 1] * b[fromB + k + 1];
            three += a[fromA + k + 2] * b[fromB + k + 2];
            four += a[fromA + k + 3] * b[fromB + k + 3];
        }
        for (; k < length; k++) {
            one += a[fromA + k] * b[fromB + k];
        }
        return one + two + (three + four);
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
        for (int row = 0; row < size; row++) {
            int start = row * size;
            vector[row] =
                    (vector[row] - product(lower, start, vector, 0, row)) / lower[start + row];
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
        for (int row = size - 1; row >= 0; row--) {
            double sum = vector[row];
            for (int k = row + 1; k < size; k++) {
                sum -= lower[k * size + row] * vector[k];
            }
            vector[row] = sum / lower[row * size + row];
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
        double[] coloured = new double[size];
        for (int row = 0; row < size; row++) {
            coloured[row] = product(lower, row * size, vector, 0, row + 1);
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
        whiten(vector);
        return product(vector, 0, vector, 0, size);
    }
}
