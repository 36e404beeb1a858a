package emberline.place;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The factor against the decomposition of Commons Math. */
class LowerFactorTest {

    private static RealMatrix covariance(int size, Random random) {
        double[][] some = new double[size][size + 2];
        for (double[] row : some) {
            for (int k = 0; k < row.length; k++) {
                row[k] = random.nextGaussian();
            }
        }
        RealMatrix matrix = new Array2DRowRealMatrix(some);
        return matrix.multiply(matrix.transpose());
    }

    /** What is before the diagonal is not read. */
    private static double[][] rows(RealMatrix matrix) {
        double[][] rows = matrix.getData();
        for (int row = 0; row < rows.length; row++) {
            Arrays.fill(rows[row], 0, row, Double.NaN);
        }
        return rows;
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, 5, 8, 13, 41})
    void itAgreesWithAGeneralDecomposition(int size) {
        Random random = new Random(size);
        RealMatrix matrix = covariance(size, random);
        double[] vector = random.doubles(size, -2, 2).toArray();
        CholeskyDecomposition known = new CholeskyDecomposition(matrix);
        LowerFactor factor = LowerFactor.of(rows(matrix));
        assertEquals(Math.log(known.getDeterminant()), factor.logDeterminant(), 1e-8);
        assertArrayEquals(known.getL().operate(vector), factor.colour(vector), 1e-9);
        assertArrayEquals(vector, factor.whiten(factor.colour(vector)), 1e-8);
        assertArrayEquals(
                known.getSolver().solve(new ArrayRealVector(vector)).toArray(),
                factor.unwhiten(factor.whiten(vector.clone())),
                1e-6);
        double chiSquare =
                new ArrayRealVector(vector)
                        .dotProduct(known.getSolver().solve(new ArrayRealVector(vector)));
        assertEquals(chiSquare, factor.chiSquare(vector.clone()), 1e-8 * (1 + chiSquare));
    }

    @ParameterizedTest
    @ValueSource(doubles = {1, 1e20, 1e-6})
    void aSingularMatrixGivesNumbers(double scale) {
        double[][] ones = {{scale, scale, scale}, {0, scale, scale}, {0, 0, scale}};
        LowerFactor factor = LowerFactor.of(ones);
        assertTrue(Double.isFinite(factor.logDeterminant()));
        assertTrue(Double.isFinite(factor.chiSquare(new double[] {scale, -scale, scale})));
    }
}
