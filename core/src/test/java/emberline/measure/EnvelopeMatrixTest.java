package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class EnvelopeMatrixTest {

    private static final int SIZE = 30;

    /** Windows of some pixels each, as rows of a matrix. */
    private static RealMatrix windows(long seed) {
        Random random = new Random(seed);
        RealMatrix windows = new Array2DRowRealMatrix(SIZE, 3 * SIZE);
        for (int row = 0; row < SIZE; row++) {
            for (int k = 0; k < 8; k++) {
                windows.setEntry(row, 2 * row + k, random.nextDouble());
            }
        }
        return windows;
    }

    private static EnvelopeMatrix of(RealMatrix full) {
        int size = full.getRowDimension();
        int[] start = new int[size];
        double[][] rows = new double[size][];
        for (int i = 0; i < size; i++) {
            while (full.getEntry(i, start[i]) == 0 && start[i] < i) {
                start[i]++;
            }
            rows[i] = new double[i - start[i] + 1];
            for (int j = start[i]; j <= i; j++) {
                rows[i][j - start[i]] = full.getEntry(i, j);
            }
        }
        return new EnvelopeMatrix(start, rows);
    }

    private static RealMatrix lower(EnvelopeMatrix factor) {
        RealMatrix lower = new Array2DRowRealMatrix(factor.size(), factor.size());
        for (int i = 0; i < factor.size(); i++) {
            for (int j = 0; j <= i; j++) {
                lower.setEntry(i, j, factor.get(i, j));
            }
        }
        return lower;
    }

    private static void assertClose(RealMatrix expected, RealMatrix actual) {
        assertTrue(
                expected.subtract(actual).getNorm() < 1e-11 * expected.getNorm(),
                () -> "differs by " + expected.subtract(actual).getNorm());
    }

    /** The factor against that of Apache Commons Math, and its product against the matrix. */
    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3})
    void theFactorTimesItsTransposeIsTheMatrix(long seed) {
        RealMatrix windows = windows(seed);
        RealMatrix full = windows.multiply(windows.transpose());
        RealMatrix lower = lower(of(full).cholesky().orElseThrow());
        assertClose(full, lower.multiply(lower.transpose()));
        assertClose(new CholeskyDecomposition(full).getL(), lower);
    }

    /** A product made in place, row by row, against Apache Commons Math. */
    @Test
    void multiplyingInPlaceIsMultiplying() {
        RealMatrix windows = windows(6);
        windows.setRow(7, windows.getRow(5));
        EnvelopeMatrix factor = of(windows.multiply(windows.transpose())).cholesky().orElseThrow();
        RealMatrix columns = windows(7).getSubMatrix(0, SIZE - 1, 0, 4);
        double[][] inPlace = columns.getData();
        for (int row = SIZE - 1; row >= 0; row--) {
            factor.multiplyRow(inPlace, 5, row, row);
        }
        RealMatrix expected = lower(factor).multiply(columns);
        for (int row = 0; row < SIZE; row++) {
            for (int n = 0; n < 5; n++) {
                expected.addToEntry(row, n, row);
            }
        }
        assertClose(expected, new Array2DRowRealMatrix(inPlace));
    }

    /** Windows that follow from others have no noise of their own. */
    @Test
    void dependentRowsAreReturnedToo() {
        RealMatrix windows = windows(4);
        windows.setRow(7, windows.getRow(5));
        windows.setRowVector(12, windows.getRowVector(10).add(windows.getRowVector(11)));
        windows.setRow(20, new double[3 * SIZE]);
        RealMatrix full = windows.multiply(windows.transpose());
        EnvelopeMatrix factor = of(full).cholesky().orElseThrow();
        for (int row : new int[] {7, 12, 20}) {
            assertEquals(0, factor.get(row, row));
        }
        RealMatrix lower = lower(factor);
        assertClose(full, lower.multiply(lower.transpose()));
    }

    /** Three numbers cannot be correlated by 0.9, 0 and 0.9. */
    @Test
    void whatIsNoCovarianceHasNoFactor() {
        EnvelopeMatrix none =
                of(
                        new Array2DRowRealMatrix(
                                new double[][] {{1, 0.9, 0}, {0.9, 1, 0.9}, {0, 0.9, 1}}));
        assertTrue(none.cholesky().isEmpty());
    }

    private static OrthogonalFactor.Strip[] strips(RealMatrix vectors) {
        OrthogonalFactor.Strip[] strips = new OrthogonalFactor.Strip[vectors.getRowDimension()];
        for (int row = 0; row < strips.length; row++) {
            double[] all = vectors.getRow(row);
            int from = 0;
            while (from < all.length && all[from] == 0) {
                from++;
            }
            int to = all.length;
            while (to > from && all[to - 1] == 0) {
                to--;
            }
            strips[row] = new OrthogonalFactor.Strip(from, Arrays.copyOfRange(all, from, to));
        }
        return strips;
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3})
    void theFactorFromTheVectorsIsTheCholeskyFactor(long seed) {
        RealMatrix windows = windows(seed);
        RealMatrix full = windows.multiply(windows.transpose());
        assertClose(
                lower(of(full).cholesky().orElseThrow()),
                lower(of(full).factorFrom(strips(windows))));
    }

    /**
     * Five hundred overlapping windows on few pixels: rounding spoils the Cholesky factor, and the
     * factor from the vectors still returns the matrix.
     */
    @Tag("slow")
    @ParameterizedTest
    @ValueSource(ints = {7, 60, 200})
    void moreWindowsThanPixelsHaveAFactor(int pixels) {
        Random random = new Random(pixels);
        RealMatrix windows = new Array2DRowRealMatrix(500, pixels);
        double[] starts = random.doubles(500, 0, pixels - 1).sorted().toArray();
        for (int row = 0; row < 500; row++) {
            double end = starts[row] + 0.3 + pixels / 20.0 * random.nextDouble();
            for (int pixel = (int) starts[row]; pixel < Math.min(pixels, end); pixel++) {
                double overlap = Math.min(end, pixel + 1) - Math.max(starts[row], pixel);
                windows.setEntry(row, pixel, overlap / (end - starts[row]));
            }
        }
        RealMatrix full = windows.multiply(windows.transpose());
        EnvelopeMatrix matrix = of(full);
        assertTrue(matrix.cholesky().isEmpty(), "no case of the weakness of Cholesky");
        RealMatrix lower = lower(matrix.factorFrom(strips(windows)));
        assertClose(full, lower.multiply(lower.transpose()));
    }
}
