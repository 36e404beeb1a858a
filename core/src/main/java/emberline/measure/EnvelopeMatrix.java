package emberline.measure;

import java.util.Arrays;

/**
 * A symmetric matrix of which each row is stored from its first non-zero element to the diagonal.
 * Covariances of window means are of this kind once the windows are sorted: windows far apart share
 * no pixel.
 */
final class EnvelopeMatrix {

    /** A pivot below this share of its diagonal element counts as zero. */
    private static final double SINGULAR = 1e-9;

    /** A pivot below minus this share of its diagonal element is no matter of rounding. */
    private static final double NEGATIVE = 1e-5;

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
     * @return a lower-triangular matrix with the same envelope
     * @throws IllegalStateException if the matrix is no covariance: a pivot is negative by more
     *     than rounding can make it
     */
    EnvelopeMatrix cholesky() {
        double[][] factor = new double[rows.length][];
        for (int j = 0; j < rows.length; j++) {
            double[] row = rows[j].clone();
            int from = start[j];
            for (int i = from; i < j; i++) {
                double pivot = factor[i][i - start[i]];
                if (pivot == 0) {
                    row[i - from] = 0;
                    continue;
                }
                row[i - from] = (row[i - from] - dot(row, from, factor[i], start[i], i)) / pivot;
            }
            double rest = row[j - from] - dot(row, from, row, from, j);
            if (!(rest >= -NEGATIVE * rows[j][j - from])) {
                throw new IllegalStateException(
                        "covariance of "
                                + rows.length
                                + " window means: row "
                                + j
                                + " has the pivot "
                                + rest
                                + " on the diagonal element "
                                + rows[j][j - from]
                                + "; expected none below zero: check the correlation of the noise"
                                + " of neighbouring pixels");
            }
            row[j - from] = rest > SINGULAR * rows[j][j - from] ? Math.sqrt(rest) : 0;
            factor[j] = row;
        }
        return new EnvelopeMatrix(start, factor);
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
     * This lower-triangular matrix times columns of numbers, plus a mean, for chosen rows.
     *
     * @param columns for each row of the matrix as many numbers as there are draws
     * @param mean what is added to each row
     * @param row which row
     * @param out as many numbers as there are draws; overwritten
     */
    void multiplyRow(double[][] columns, double mean, int row, double[] out) {
        Arrays.fill(out, mean);
        for (int k = start[row]; k <= row; k++) {
            double weight = rows[row][k - start[row]];
            if (weight != 0) {
                double[] column = columns[k];
                for (int n = 0; n < out.length; n++) {
                    out[n] += weight * column[n];
                }
            }
        }
    }

    /** The first column that a row stores. */
    int start(int row) {
        return start[row];
    }
}
