package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Against hand calculation on the rows of the tables beside the class. */
class AgeEvidenceTest {

    private final AgeEvidence age = new AgeEvidence(JudgeNumbers.standard());

    /** Shares of FLD-G, INT-G and VL-G as gravity-by-age.csv has them; level beyond its ends. */
    @Test
    void classesByAgeAreThoseOfTheTable() {
        assertArrayEquals(new double[] {0.077, 0.292, 0.631}, age.classShares(44), 1e-9);
        assertArrayEquals(new double[] {0.027, 0.081, 0.892}, age.classShares(10), 1e-12);
        assertArrayEquals(new double[] {0.9735, 0.026, 0.0005}, age.classShares(5000), 1e-12);
        // half way between 140 and 200 Myr in log age
        assertArrayEquals(
                new double[] {(0.153 + 0.366) / 2, (0.593 + 0.616) / 2, (0.254 + 0.018) / 2},
                age.classShares(Math.sqrt(140 * 200)),
                1e-12);
        assertEquals(
                0.292 + 0.631,
                AgeEvidence.youngSequence(new double[] {0.077, 0.292, 0.631}),
                1e-12);
    }

    private static double normal(double off, double sigma) {
        return Math.exp(-off * off / 2 / sigma / sigma) / sigma / Math.sqrt(2 * Math.PI);
    }

    /** L2 in velocities.csv: FIELD 31.2 (13.7, 60.5), YOUNG 20.3 (14.0, 23.8), 2% outliers. */
    @Test
    void velocitiesChangeFromYoungToFieldWithTheLogOfTheAge() {
        double fieldSigma = Math.log(60.5 / 13.7) / 2;
        double youngSigma = Math.log(23.8 / 14.0) / 2;
        double field = normal(Math.log(40 / 31.2), fieldSigma);
        double young = 0.98 * normal(Math.log(40 / 20.3), youngSigma) + 0.02 * field;
        assertEquals(field, age.velocity(40, 0, 12, 5000), 1e-12);
        assertEquals(field, age.velocity(40, 0, 12, 2000), 1e-12);
        assertEquals(young, age.velocity(40, 0, 12, 150), 1e-12);
        assertEquals(young, age.velocity(40, 0, 12, 20), 1e-12);
        assertEquals((field + young) / 2, age.velocity(40, 0, 12, Math.sqrt(150 * 2000)), 1e-12);
        assertEquals(
                normal(Math.log(40 / 31.2), Math.hypot(fieldSigma, 0.3)),
                age.velocity(40, 0.3, 12, 5000),
                1e-12);
    }

    /** The row of a type is the last that begins at or before it; T2 has 29.8 (15.2, 50.6). */
    @ParameterizedTest
    @CsvSource({"9.9, 43.1, 17.5, 75.8", "10, 31.2, 13.7, 60.5", "22, 29.8, 15.2, 50.6"})
    void theRowOfTheTypeIsUsed(double type, double median, double p16, double p84) {
        assertEquals(
                normal(Math.log(50 / median), Math.log(p84 / p16) / 2),
                age.velocity(50, 0, type, 5000),
                1e-12);
    }

    /** Subdwarfs have 216.8 (117.9, 338.9); the odds are cut at 10 000. */
    @Test
    void fastObjectsAreRatherMetalPoor() {
        double poor = normal(Math.log(100 / 216.8), Math.log(338.9 / 117.9) / 2);
        double field = normal(Math.log(100 / 31.2), Math.log(60.5 / 13.7) / 2);
        assertEquals(poor / field, age.metalPoorFactor(100, 0, 12), 1e-9);
        assertEquals(1e4, age.metalPoorFactor(8000, 0, 22), 1e-6);
    }

    /** Lifetimes are known from M4 to M7; 0.75 subclasses beyond them still count. */
    @Test
    void hAlphaCountsWhereLifetimesAreKnown() {
        assertTrue(age.halphaCounts(Halpha.EMISSION, 7.75));
        assertFalse(age.halphaCounts(Halpha.EMISSION, 7.8));
        assertFalse(age.halphaCounts(Halpha.NO_EMISSION, 3.2));
        assertTrue(age.halphaCounts(Halpha.NO_EMISSION, 3.25));
        assertTrue(age.halphaCounts(Halpha.ABOVE_SATURATION, 15));
        assertFalse(age.halphaCounts(Halpha.UNKNOWN, 5));
    }

    /** Of active objects 95% are left when young, half way to 10% at the lifetime, 8 Gyr at M7. */
    @Test
    void activityFadesAtItsLifetime() {
        assertEquals(0.525, age.halpha(Halpha.EMISSION, 7, 8000), 1e-12);
        assertEquals(0.475, age.halpha(Halpha.NO_EMISSION, 7, 8000), 1e-12);
        assertEquals(0.525, age.halpha(Halpha.EMISSION, 4.4, 4500), 1e-12);
        assertEquals(0.525, age.halpha(Halpha.EMISSION, 4.6, 7000), 1e-12);
        assertEquals(0.1 + 0.85 / 17, age.halpha(Halpha.EMISSION, 7, 16_000), 1e-12);
        assertEquals(0.3, age.halpha(Halpha.ABOVE_SATURATION, 12, 20));
        assertEquals(0.01, age.halpha(Halpha.ABOVE_SATURATION, 12, 20.1));
    }
}
