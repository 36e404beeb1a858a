package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.judge.EvolutionGrid.Column;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class EvolutionGridTest {

    private static final Map<EvolutionGrid.Name, EvolutionGrid> GRIDS = EvolutionGrid.all();
    private static final EvolutionGrid MERGED = GRIDS.get(EvolutionGrid.Name.MERGED);

    private static double at(EvolutionGrid grid, Column column, double ageMyr, double mass) {
        return grid.on(column, new double[] {Math.log10(ageMyr)}, new double[] {Math.log10(mass)})[
                0][0];
    }

    /**
     * Rows of the grids of Baraffe et al. 2015 as a second public source quotes them from the
     * authors' tables.
     */
    @ParameterizedTest
    @CsvSource({
        "0.05, 100, 2525, -3.15",
        "0.05, 1000, 1383, -4.523",
        "0.075, 100, 2839, -2.81",
        "0.075, 1000, 2243, -3.67",
        "0.075, 10000, 2037, -3.89",
        "0.08, 100, 2879, ",
        "0.08, 1000, 2400, ",
        "0.08, 10000, 2345, ",
        "0.09, 1000, 2648, "
    })
    void nodesAreThePublishedOnes(double mass, double ageMyr, double teff, Double logL) {
        double found = Math.pow(10, at(MERGED, Column.LOG_TEFF, ageMyr, mass));
        assertEquals(teff, found, 0.01 * teff);
        if (logL != null) {
            assertEquals(logL, at(MERGED, Column.LOG_L, ageMyr, mass), 0.01);
        }
    }

    /** Every row of the table comes back: 1% in temperature, 0.01 dex in luminosity. */
    @Test
    void everyNodeIsReproduced() {
        List<Integer> rows =
                JudgeTable.rows(
                        "evolution.csv",
                        row -> {
                            EvolutionGrid grid =
                                    GRIDS.get(EvolutionGrid.Name.valueOf(row.getField("grid")));
                            double age = JudgeTable.number(row, "age_myr");
                            double mass = JudgeTable.number(row, "mass_msun");
                            double teff = JudgeTable.number(row, "teff_k");
                            double found = Math.pow(10, at(grid, Column.LOG_TEFF, age, mass));
                            assertEquals(teff, found, 0.01 * teff, row.toString());
                            assertEquals(
                                    JudgeTable.number(row, "log_l"),
                                    at(grid, Column.LOG_L, age, mass),
                                    0.01,
                                    row.toString());
                            return 1;
                        });
        assertEquals(1186, rows.size());
    }

    /**
     * With every second age removed, the removed nodes come back within 3% in temperature and 0.05
     * dex in luminosity; three of 754 do not, and are named: the two masses that settle on hydrogen
     * burning between 1 and 2 Gyr, and the end of deuterium burning.
     */
    @Test
    void removedAgesComeBack() {
        EvolutionGrid thinned = MERGED.thinned();
        double[] ages = MERGED.logAgeMyr();
        double[] masses = MERGED.logMassMsun();
        double[][] teff = MERGED.on(Column.LOG_TEFF, ages, masses);
        double[][] teffThin = thinned.on(Column.LOG_TEFF, ages, masses);
        double[][] logL = MERGED.on(Column.LOG_L, ages, masses);
        double[][] logLThin = thinned.on(Column.LOG_L, ages, masses);
        List<String> beyond = new ArrayList<>();
        for (int a = 0; a < ages.length; a++) {
            for (int m = 0; m < masses.length; m++) {
                double byTeff = Math.abs(Math.pow(10, teffThin[a][m] - teff[a][m]) - 1);
                double byLogL = Math.abs(logLThin[a][m] - logL[a][m]);
                assertTrue(byTeff < 0.04 && byLogL < 0.065, a + " " + m);
                if (byTeff > 0.03 || byLogL > 0.05) {
                    beyond.add(
                            Math.round(Math.pow(10, ages[a]))
                                    + " Myr "
                                    + Math.round(1000 * Math.pow(10, masses[m])) / 1000.0);
                }
            }
        }
        assertEquals(List.of("50 Myr 0.02", "1500 Myr 0.07", "1500 Myr 0.072"), beyond);
    }

    /** Depletion boundaries that were computed from the original tracks by another script. */
    @ParameterizedTest
    @CsvSource({"50, 0.1030", "112, 0.0687", "200, 0.0598", "625, 0.0549", "1000, 0.0544"})
    void halfOfTheLithiumIsLeftAtTheBoundary(double ageMyr, double mass) {
        double below = EvolutionGrid.lithiumLeft(at(MERGED, Column.LITHIUM, ageMyr, 0.93 * mass));
        double above = EvolutionGrid.lithiumLeft(at(MERGED, Column.LITHIUM, ageMyr, 1.07 * mass));
        assertTrue(below > 0.5 && above < 0.5, below + " " + above);
    }

    @Test
    void aMonotoneCurveNeverOvershoots() {
        double[] x = {0, 1, 2, 3, 4};
        double[] y = {0, 0, 1, 1, 5};
        MonotoneCurve curve = new MonotoneCurve(x, y);
        double last = 0;
        for (double t = 0; t <= 4; t += 0.01) {
            double value = curve.at(t);
            assertTrue(value >= last - 1e-12, "falls at " + t);
            last = value;
        }
        assertEquals(1, curve.at(2.5), 1e-12);
        assertEquals(9, curve.at(5), 1e-12);
    }

    /**
     * Steps 1 and 2 over widths 1 and 2: the slope between them is (5 + 4) / (5 / 1 + 4 / 2) = 9/7
     * by the harmonic mean of Fritsch and Butland. The Hermite cubic half way up the first step is
     * 1/2 + (1 - 9/7) / 8; beyond the ends it goes on along the outermost steps.
     */
    @Test
    void slopesAreHarmonicMeans() {
        MonotoneCurve curve = new MonotoneCurve(new double[] {0, 1, 3}, new double[] {0, 1, 5});
        assertEquals(0.5 + (1 - 9.0 / 7) / 8, curve.at(0.5), 1e-12);
        assertEquals(1, curve.at(1), 1e-12);
        // t = 1/4 on the second step: 27/32 of 1, 5/32 of 5, slopes 9/7 and 2 times width 2
        assertEquals(
                27.0 / 32 + 25.0 / 32 + 2 * 9.0 / 7 * 9 / 64 - 2 * 2 * 3.0 / 64,
                curve.at(1.5),
                1e-12);
        assertEquals(-1, curve.at(-1), 1e-12);
        assertEquals(9, curve.at(5), 1e-12);
        assertEquals(5, curve.at(3), 1e-12);
    }

    /** Depletion is kept as log10 of minus its natural logarithm, cut where all or none is left. */
    @Test
    void lithiumLeftFollowsFromTheColumn() {
        assertEquals(Math.exp(-1), EvolutionGrid.lithiumLeft(0), 1e-12);
        assertEquals(1, EvolutionGrid.lithiumLeft(-3));
        assertEquals(Math.exp(-0.01), EvolutionGrid.lithiumLeft(-2), 1e-12);
        assertEquals(1, EvolutionGrid.lithiumLeft(at(MERGED, Column.LITHIUM, 100, 0.02)));
        assertEquals(0, EvolutionGrid.lithiumLeft(at(MERGED, Column.LITHIUM, 5000, 0.1)), 1e-6);
        assertEquals("DUSTY00", EvolutionGrid.Name.DUSTY00.label());
    }
}
