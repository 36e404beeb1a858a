package emberline.demo;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurements;
import java.util.List;
import java.util.OptionalDouble;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Objects that are more than a dwarf of solar metallicity at rest. */
class OtherObjectsTest {

    private static final Bench BENCH = new Bench();

    private static double value(Measurements measurements, String feature) {
        return measurements.measured(feature).orElseThrow().value();
    }

    /**
     * CaH1 of the nearest published subdwarfs is 0.43 (esdM6.5), 0.49 (esdM5.5) and 0.56 (sdM4.5)
     * in Lodieu et al. 2017, A&amp;A 598, A92; the limits of zeta are those of Lépine et al. 2007.
     */
    @ParameterizedTest
    @CsvSource({"sd, 6, 0.5, 0.825, 0.43, 0.60", "esd, 7, 0.2, 0.5, 0.38, 0.50"})
    void subdwarfsHaveWeakTiOForTheirStrongCaH(
            String recipe, double type, double low, double high, double cahLow, double cahHigh) {
        Measurements subdwarf = BENCH.measureRecipe(recipe, type, "red");
        double zeta = value(subdwarf, "lepine2007/zeta");
        assertTrue(zeta > low && zeta < high, "zeta " + zeta);
        double cah1 = value(subdwarf, "reid1995/cah1");
        assertTrue(cah1 > cahLow && cah1 < cahHigh, "CaH1 " + cah1);
        Measurements dwarf = BENCH.measureDwarf(type, "FLD-G", "red");
        assertTrue(value(dwarf, "lepine2007/zeta") > 0.825);
    }

    /**
     * Na I 8189 of 28 members of Upper Scorpius of M6 to M8.5 is 0.87 to 0.98, median 0.91, of
     * field dwarfs 0.79 to 0.85 (Slesnick et al. 2006, AJ 131, 3016, table 1).
     */
    @ParameterizedTest
    @ValueSource(doubles = {6, 7, 8})
    void sodiumOfYoungDwarfsIsAsWeakAsInUpperScorpius(double type) {
        String index = "slesnick2006/na-8190";
        double young = value(BENCH.measureDwarf(type, "VL-G", "red"), index);
        assertTrue(young > 0.87 && young < 0.95, "young " + young);
        double old = value(BENCH.measureDwarf(type, "FLD-G", "red"), index);
        assertTrue(old < 0.86, "old " + old);
    }

    @Test
    void aPairIsTheSumOfTwoAtOneDistance() {
        SurveyObject single = SurveyObject.made("", 15, "FLD-G", 0, 0);
        SurveyObject pair =
                new SurveyObject(
                        "", "", OptionalDouble.of(15), "FLD-G", OptionalDouble.of(25), 0, 0, null);
        ModelGrid grid = BENCH.model().grid();
        // M_J of L5 and T5 are 13.48 and 14.81 in magnitudes.csv
        double[] sum = BENCH.model().flux(pair);
        double[] primary = JBand.scaled(BENCH.model().flux(single), grid, 13.48);
        double[] secondary =
                JBand.scaled(
                        BENCH.model().flux(SurveyObject.made("", 25, "FLD-G", 0, 0)), grid, 14.81);
        for (double micron : new double[] {1.0, 1.27, 1.6, 2.2}) {
            int i = (int) grid.place(micron);
            assertEquals(primary[i] + secondary[i], sum[i], 1e-9 * sum[i]);
        }
    }

    @Test
    void aRadialVelocityMovesALine() {
        ModelGrid grid = new ModelGrid();
        double[] flux = new double[grid.size()];
        int line = (int) grid.place(1.25);
        flux[line] = 1;
        double[] moved = DopplerShift.of(flux, 300);
        double mean = 0;
        double light = 0;
        for (int i = 0; i < moved.length; i++) {
            mean += moved[i] * grid.micron(i);
            light += moved[i];
        }
        assertEquals(1, light, 1e-9);
        assertEquals(grid.micron(line) * (1 + 300 / 299_792.458), mean / light, 1e-6);
        assertArrayEquals(flux, DopplerShift.of(flux, 0));
    }

    @Test
    void everyRecipeAndOpacityNamesASourceThatIsListed() {
        List<String> keys =
                DemoTable.named("sources.csv").rows().stream().map(row -> row.text("key")).toList();
        assertEquals(keys.size(), new TreeSet<>(keys).size());
        for (String table : List.of("recipes.csv", "opacities.csv")) {
            for (DemoTable.Row row : DemoTable.named(table).rows()) {
                assertTrue(keys.contains(row.text("source")), table + ": " + row.text("source"));
            }
        }
    }

    @Test
    void theSurveyHoldsWhatItPromises() {
        List<SurveyObject> sorted =
                SurveyObject.all().stream().filter(o -> o.list().equals("candidates")).toList();
        List<Double> dwarfs =
                sorted.stream()
                        .filter(SurveyObject::isDwarf)
                        .filter(object -> object.pairTypeNumber().isEmpty())
                        .map(object -> object.typeNumber().orElseThrow())
                        .sorted()
                        .toList();
        assertEquals(5, dwarfs.get(0), "M5");
        assertEquals(28, dwarfs.get(dwarfs.size() - 1), "T8");
        for (int i = 1; i < dwarfs.size(); i++) {
            double step = dwarfs.get(i) - dwarfs.get(i - 1);
            assertTrue(step <= 1.5, "from " + dwarfs.get(i - 1) + " to " + dwarfs.get(i));
        }
        List<String> seen = Exposure.all().stream().map(Exposure::object).toList();
        assertEquals(
                3, sorted.stream().filter(o -> !seen.contains(o.name())).count(), "photometry");
        assertEquals(3, sorted.stream().filter(o -> o.pairTypeNumber().isPresent()).count());
    }
}
