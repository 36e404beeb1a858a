package emberline.measure;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Formula.Continuum;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Formulas on window functionals that are numbers chosen by hand. */
class FormulasTest {

    /** Rows 0 to 8; a formula sees some of them. */
    private static final double[] Y = {2, 3, 5, 0.7, 1.1, 4, 0.02, 0.001, 6};

    private static Continuum sum(int[] rows, double... weights) {
        return new Continuum(rows, weights);
    }

    private static LinearRatio ratio() {
        return new LinearRatio(sum(new int[] {0, 2}, 2, 3), sum(new int[] {1, 5}, 1, 0.5));
    }

    private static LinearRatio single() {
        return new LinearRatio(sum(new int[] {8}, 2), sum(new int[] {1}, 3));
    }

    private static PowerProduct powers() {
        return new PowerProduct(new int[] {0, 1, 2}, new double[] {1, -1, 2});
    }

    private static EquivalentWidth width() {
        // C = (y4 + y5) / 2 at the centre; over half the window it grows by 0.05 (y5 - y4)
        return new EquivalentWidth(
                0.01,
                new int[] {6, 7, 3, 0, 1},
                new int[] {4, 5},
                new double[] {0.5, 0.5},
                new double[] {-0.05, 0.05});
    }

    private static Composite shortfall() {
        return new Composite(
                List.of(single(), powers()), Composite.shortfall(List.of(0.1, 0.02, 0.003)));
    }

    static List<Formula> all() {
        return List.of(
                ratio(),
                single(),
                powers(),
                new Magnitude(sum(new int[] {0, 2}, 2, 3), sum(new int[] {1}, 1)),
                width(),
                new Composite(List.of(ratio(), powers()), Composite.ratio()),
                new Composite(
                        List.of(ratio(), powers(), single()),
                        Composite.sum(new double[] {2, -1, 0.5})),
                shortfall());
    }

    @Test
    void valuesAreThoseOfTheDefinitions() {
        assertEquals((2 * 2 + 3 * 5) / (3 + 0.5 * 4), ratio().value(Y), 1e-12);
        assertEquals(12.0 / 9, single().value(Y), 1e-12);
        assertEquals(2.0 / 3 * 25, powers().value(Y), 1e-12);
        assertEquals(-2.5 * Math.log10(19.0 / 3), all().get(3).value(Y), 1e-12);
        // C = 2.55, slope 0.145 / 2.55; moments 0.02, 0.001, 0.7, 2, 3 of the line
        double s = 0.145 / 2.55;
        double integral = 0.02 - s * 0.001 + s * s * 0.7 - s * s * s * 2 + s * s * s * s * 3;
        assertEquals(1e4 * (0.01 - integral / 2.55), width().value(Y), 1e-9);
        assertEquals(3.8 / (50.0 / 3), all().get(5).value(Y), 1e-12);
        assertEquals(2 * 3.8 - 50.0 / 3 + 2.0 / 3, all().get(6).value(Y), 1e-12);
        double b = 50.0 / 3;
        assertEquals(
                (1 - 4.0 / 3) / (1 - (0.1 + 0.02 * b + 0.003 * b * b)),
                shortfall().value(Y),
                1e-12);
    }

    /** Against central differences of the value, row by row. */
    @ParameterizedTest
    @MethodSource("all")
    void gradientsAreDerivatives(Formula formula) {
        double[] gradient = formula.gradient(Y);
        assertEquals(formula.rows().length, gradient.length);
        double[] byRow = new double[Y.length];
        for (int k = 0; k < gradient.length; k++) {
            byRow[formula.rows()[k]] += gradient[k];
        }
        for (int row = 0; row < Y.length; row++) {
            double step = 1e-6;
            double[] more = Y.clone();
            double[] less = Y.clone();
            more[row] += step;
            less[row] -= step;
            double slope = (formula.value(more) - formula.value(less)) / (2 * step);
            assertEquals(slope, byRow[row], 1e-5 * Math.max(1, Math.abs(slope)), "row " + row);
        }
    }

    /** Many draws at once are as many single values; what was in the array before is gone. */
    @ParameterizedTest
    @MethodSource("all")
    void manyDrawsAreManyValues(Formula formula) {
        int count = 7;
        double[][] draws = new double[Y.length][count];
        double[] out = new double[count + 1];
        java.util.Arrays.fill(out, 99);
        for (int n = 0; n < count; n++) {
            for (int row = 0; row < Y.length; row++) {
                draws[row][n] = Y[row] * (1 + 0.01 * n * (row + 1));
            }
        }
        formula.values(draws, count, out);
        for (int n = 0; n < count; n++) {
            double[] one = new double[Y.length];
            for (int row = 0; row < Y.length; row++) {
                one[row] = draws[row][n];
            }
            double value = formula.value(one);
            assertEquals(value, out[n], 1e-12 * Math.max(1, Math.abs(value)), "draw " + n);
        }
        assertEquals(99, out[count], "beyond the draws that were asked for");
    }

    /** What a formula divides by must stand clear of zero; a mean to the first power need not. */
    @Test
    void continuaAreWhatIsDividedBy() {
        assertEquals(5, ratio().continua().get(0).value(Y), 1e-12);
        assertEquals(
                List.of(3.0, 5.0),
                powers().continua().stream().map(continuum -> continuum.value(Y)).toList());
        assertEquals(
                List.of(3.0, 19.0),
                all().get(3).continua().stream().map(continuum -> continuum.value(Y)).toList());
        assertEquals(2.55, width().continua().get(0).value(Y), 1e-12);
        assertEquals(3, all().get(5).continua().size());
        assertTrue(ratio().divisors().isEmpty() && all().get(6).divisors().isEmpty());
    }

    /** A ratio divides by its second part; a shortfall by one less its polynomial there. */
    @Test
    void divisorsAreFormulasOfTheirOwn() {
        Formula ofRatio = all().get(5).divisors().get(0);
        assertEquals(50.0 / 3, ofRatio.value(Y), 1e-12);
        Formula ofShortfall = shortfall().divisors().get(0);
        double b = 50.0 / 3;
        assertEquals(1 - 0.1 - 0.02 * b - 0.003 * b * b, ofShortfall.value(Y), 1e-12);
        gradientsAreDerivatives(ofRatio);
        gradientsAreDerivatives(ofShortfall);
        Composite nested = new Composite(List.of(shortfall(), single()), Composite.ratio());
        assertEquals(2, nested.divisors().size());
        double[] out = new double[1];
        double[][] draws = new double[Y.length][];
        for (int row = 0; row < Y.length; row++) {
            draws[row] = new double[] {Y[row]};
        }
        ofShortfall.values(draws, 1, out);
        assertArrayEquals(new double[] {ofShortfall.value(Y)}, out, 1e-12);
    }

    /** A continuum that changes by more than 0.3 over half the window gives no width. */
    @Test
    void aSteepContinuumGivesNoWidth() {
        for (double change : new double[] {0.3, -0.3, 0.31, -0.31}) {
            EquivalentWidth width =
                    new EquivalentWidth(
                            0.01,
                            new int[] {0},
                            new int[] {1},
                            new double[] {1},
                            new double[] {change});
            double[] y = {0.01, 1};
            double[] out = new double[1];
            width.values(new double[][] {{0.01}, {1}}, 1, out);
            boolean steep = Math.abs(change) > 0.3;
            assertEquals(steep, Double.isNaN(width.value(y)), "value at " + change);
            assertEquals(steep, Double.isNaN(out[0]), "draw at " + change);
        }
    }
}
