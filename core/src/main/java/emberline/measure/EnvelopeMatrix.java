package emberline.measure;

import java.util.Optional;

/**
 * A symmetric matrix of which each row is stored from its first non-zero element to the diagonal.
 * Covariances of window means are of this kind once the windows are sorted: windows far apart share
 * no pixel.
 */
final class EnvelopeMatrix {

    /** A pivot below this share of its diagonal element counts as zero. */
    private static final double SINGULAR = 1e-9;

    /** A pivot below minus this share of its diagonal element makes the factor useless. */
    private static final double NEGATIVE = 1e-5;

    /** A correlation that is lost with a row without pivot may not be above this. */
    private static final double LOST = 1e-4;

    private final int[] start;
    private final double[][] rows;

    /**
     * A matrix from its rows.
     *
     * @param start column of the first stored element of each row, at most the row's own number
     * @param rows elements from there to the diagonal; kept, not copied
     */
    EnvelopeMatrix(int[] start, double[][] rows) {
        this.start = start;
        this.rows = rows;
    }

    int size() {
        return rows.length;
    }

    double get(int i, int j) {
        int row = Math.max(i, j);
        int column = Math.min(i, j);
        return column < start[row] ? 0 : rows[row][column - start[row]];
    }

    /**
     * The lower Cholesky factor. Rows that depend on earlier ones, as windows on few pixels do, get
     * a zero on the diagonal, so that the product still returns this matrix.
     *
     * <p>Where many rows nearly depend on each other, each small pivot multiplies the rounding of
     * those before it, until the factor has nothing to do with the matrix. This happens where there
     * are more windows than pixels below them, whatever the noise; {@link OrthogonalFactor} has the
     * factor then.
     *
     * @return a lower-triangular matrix with the same envelope, of which the product with its
     *     transpose returns all correlations within 0.0001; empty where rounding spoils it or this
     *     matrix is no covariance
     */
    Optional<EnvelopeMatrix> cholesky() {
        double[][] factor = new double[rows.length][];
        for (int j = 0; j < rows.length; j++) {
            double[] row = rows[j].clone();
            int from = start[j];
            double own = rows[j][j - from];
            for (int i = from; i < j; i++) {
                double pivot = factor[i][i - start[i]];
                double rest = row[i - from] - dot(row, from, factor[i], start[i], i);
                if (pivot == 0) {
                    if (rest * rest > LOST * LOST * own * rows[i][i - start[i]]) {
                        return Optional.empty();
                    }
                    row[i - from] = 0;
                } else {
                    row[i - from] = rest / pivot;
                }
            }
            double rest = own - dot(row, from, row, from, j);
            if (!(rest >= -NEGATIVE * own)) {
                return Optional.empty();
            }
            row[j - from] = rest > SINGULAR * own ? Math.sqrt(rest) : 0;
            factor[j] = row;
        }
        return Optional.of(new EnvelopeMatrix(start, factor));
    }

    /**
     * The lower factor of this matrix from vectors of which it holds the products.
     *
     * @param vectors the rows of a matrix B with B B^T equal to this matrix
     * @return a lower-triangular matrix with the same envelope
     */
    EnvelopeMatrix factorFrom(OrthogonalFactor.Strip[] vectors) {
        return new EnvelopeMatrix(start, OrthogonalFactor.of(vectors, start));
    }

    /** Sum of products of two rows over the columns below {@code end} that both store. */
    private static double dot(double[] a, int startA, double[] b, int startB, int end) {
        double sum = 0;
        for (int k = Math.max(startA, startB); k < end; k++) {
            sum += a[k - startA] * b[k - startB];
        }
        return sum;
    }

    /**
     * One row of this lower-triangular matrix times columns of numbers, plus a mean. The result
     * takes the place of the column of the same number, so that a product is made in place from the
     * last row to the first.
     *
     * @param columns for each row of the matrix one number a draw; where the row has no weight it
     *     may be null
     * @param count how many draws
     * @param row which row
     * @param mean what is added
     */
    void multiplyRow(double[][] columns, int count, int row, double mean) {
        double[] out = columns[row];
        double[] weights = rows[row];
        double own = weights[row - start[row]];
        for (int n = 0; n < count; n++) {
            out[n] = mean + own * out[n];
        }
        int[] others = new int[row - start[row]];
        int size = 0;
        for (int k = 0; k < others.length; k++) {
            if (weights[k] != 0) {
                others[size++] = k;
            }
        }
        int k = 0;
        for (; k + 3 < size; k += 4) {
            addFour(columns, count, row, others, k);
        }
        for (; k < size; k++) {
            double weight = weights[others[k]];
            double[] column = columns[start[row] + others[k]];
            for (int n = 0; n < count; n++) {
                out[n] += weight * column[n];
            }
        }
    }

    /** Adds four weighted columns at once, which saves going over the sum four times. */
    private void addFour(double[][] columns, int count, int row, int[] others, int at) {
        double[] out = columns[row];
        double a = rows[row][others[at]];
        double b = rows[row][others[at + 1]];
        double c = rows[row][others[at + 2]];
        double d = rows[row][others[at + 3]];
        double[] columnA = columns[start[row] + others[at]];
        double[] columnB = columns[start[row] + others[at + 1]];
        double[] columnC = columns[start[row] + others[at + 2]];
        double[] columnD = columns[start[row] + others[at + 3]];
        for (int n = 0; n < count; n++) {
            out[n] += a * columnA[n] + b * columnB[n] + c * columnC[n] + d * columnD[n];
        }
    }

    /** The first column that a row stores. */
    int start(int row) {
        return start[row];
    }
}
