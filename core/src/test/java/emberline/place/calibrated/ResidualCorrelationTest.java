package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurement.Measured;
import emberline.place.calibrated.TrainingSet.Dwarf;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.stat.correlation.PearsonsCorrelation;
import org.junit.jupiter.api.Test;

/** Correlations of invented residuals, of which 35% is kept and less where dwarfs are few. */
class ResidualCorrelationTest {

    private static final double KEPT = 0.35;

    /** What is kept of a correlation of so many dwarfs. */
    private static double kept(int pairs) {
        return KEPT * (pairs - 12) / (pairs + 20);
    }

    private static List<Locus> loci(double slope, int count) {
        List<Locus> loci = new ArrayList<>();
        for (int k = 0; k < count; k++) {
            loci.add(Invented.locus("f" + k, -10 * slope, slope, 0, 1));
        }
        return loci;
    }

    /** An L0 that stands off the loci by so many sigma; not-a-number: not measured. */
    private static Dwarf dwarf(double... residuals) {
        Map<String, Measured> values = new LinkedHashMap<>();
        for (int k = 0; k < residuals.length; k++) {
            if (!Double.isNaN(residuals[k])) {
                values.put("f" + k, new Measured(residuals[k], 0));
            }
        }
        return Invented.dwarf(10, 1, values);
    }

    private static List<Dwarf> same(int count, double... residuals) {
        List<Dwarf> dwarfs = new ArrayList<>();
        for (int k = 0; k < count; k++) {
            dwarfs.add(dwarf(residuals));
        }
        return dwarfs;
    }

    /** Each dwarf has a mirror image, so that the means are nought as Pearson's takes them. */
    @Test
    void correlationsArePearsonsShrunk() {
        Random random = new Random(4);
        List<Dwarf> dwarfs = new ArrayList<>();
        double[][] data = new double[400][];
        for (int k = 0; k < data.length; k += 2) {
            double common = 0.5 * random.nextGaussian();
            double one = 0.5 * random.nextGaussian() + common;
            double two = 0.5 * random.nextGaussian() - common;
            double three = 0.5 * random.nextGaussian();
            data[k] = new double[] {one, two, three};
            data[k + 1] = new double[] {-one, -two, -three};
            dwarfs.add(dwarf(data[k]));
            dwarfs.add(dwarf(data[k + 1]));
        }
        double[][] expected =
                new PearsonsCorrelation(data)
                        .getCorrelationMatrix()
                        .scalarMultiply(kept(400))
                        .getData();
        double[][] found = ResidualCorrelation.of(loci(0, 3), dwarfs);
        assertTrue(expected[0][1] < -0.1, "the invented dwarfs are correlated");
        for (int a = 0; a < 3; a++) {
            expected[a][a] = 1;
            assertArrayEquals(expected[a], found[a], 1e-9);
        }
    }

    @Test
    void moreThanTwelveDwarfsInCommonAreNeeded() {
        assertEquals(0, ResidualCorrelation.of(loci(0, 2), same(12, 1, 1))[0][1], 1e-12);
        assertEquals(kept(13), ResidualCorrelation.of(loci(0, 2), same(13, 1, 1))[0][1], 1e-12);
        List<Dwarf> apart = new ArrayList<>(same(40, 1, Double.NaN));
        apart.addAll(same(40, Double.NaN, 1));
        assertEquals(0, ResidualCorrelation.of(loci(0, 2), apart)[0][1], 1e-12);
        apart.addAll(same(30, 1, 0.5));
        assertEquals(kept(30), ResidualCorrelation.of(loci(0, 2), apart)[0][1], 1e-12);
    }

    @Test
    void noCorrelationIsTakenAsComplete() {
        List<Dwarf> many = same(5000, 1, -1);
        assertEquals(-KEPT * 0.95, ResidualCorrelation.of(loci(0, 2), many)[0][1], 1e-9);
    }

    /** Independent objects whose types are published 0.35 subclasses too late or too early. */
    @Test
    void errorsOfTypesAreNoCorrelationOfObjects() {
        List<Dwarf> independent = new ArrayList<>();
        List<Dwarf> alike = new ArrayList<>();
        for (int k = 0; k < 80; k++) {
            double ofType = (k & 1) == 0 ? 0.35 : -0.35;
            double one = (k & 2) == 0 ? 1 : -1;
            double two = (k & 4) == 0 ? 1 : -1;
            independent.add(dwarf(one + ofType, two + ofType));
            alike.add(dwarf(one + ofType, one + ofType));
        }
        assertEquals(0, ResidualCorrelation.of(loci(1, 2), independent)[0][1], 1e-9);
        assertEquals(kept(80), ResidualCorrelation.of(loci(1, 2), alike)[0][1], 1e-9);
        assertTrue(
                ResidualCorrelation.of(loci(0, 2), independent)[0][1] > 0.02,
                "it is the slope of the loci that explains it");
    }

    /** Labels explain 49/50 of the variance of one feature, but three tenths are left to it. */
    @Test
    void someVarianceIsLeftToTheObjects() {
        List<Locus> loci =
                List.of(Invented.locus("f0", -10, 1, 0, 1), Invented.locus("f1", 0, 0, 0, 1));
        double root = 0.35 / Math.sqrt(0.98);
        double expected = kept(52) * 0.5 / Math.sqrt(0.3);
        List<Dwarf> dwarfs = new ArrayList<>();
        for (int k = 0; k < 52; k++) {
            dwarfs.add(dwarf(root, k % 4 == 0 ? -0.4 : 0.4));
        }
        assertEquals(expected, ResidualCorrelation.of(loci, dwarfs)[0][1], 1e-9);
        List<Locus> swapped =
                List.of(Invented.locus("f0", 0, 0, 0, 1), Invented.locus("f1", -10, 1, 0, 1));
        List<Dwarf> mirrored = new ArrayList<>();
        for (int k = 0; k < 52; k++) {
            mirrored.add(dwarf(k % 4 == 0 ? -0.4 : 0.4, root));
        }
        assertEquals(expected, ResidualCorrelation.of(swapped, mirrored)[0][1], 1e-9);
    }

    /**
     * Five features that all go against each other cannot be: the one negative eigenvalue of the
     * matrix becomes 0.05, and the diagonal is made one again.
     */
    @Test
    void theMatrixIsMadePositiveDefinite() {
        double[][] found =
                ResidualCorrelation.of(loci(2, 5), same(5000, 0.01, 0.01, 0.01, 0.01, 0.01));
        double other = 1 + KEPT * 0.95;
        double diagonal = other * 0.8 + 0.05 / 5;
        double beside = (-other / 5 + 0.05 / 5) / diagonal;
        for (int a = 0; a < 5; a++) {
            for (int b = 0; b < 5; b++) {
                assertEquals(a == b ? 1 : beside, found[a][b], 1e-9, a + ", " + b);
            }
        }
        double[] eigenvalues =
                new EigenDecomposition(new Array2DRowRealMatrix(found)).getRealEigenvalues();
        assertEquals(0.05 / diagonal, eigenvalues[4], 1e-9);
    }
}
