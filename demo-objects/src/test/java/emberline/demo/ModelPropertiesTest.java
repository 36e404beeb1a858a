package emberline.demo;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurement.Measured;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What every astronomer knows of the sequence must hold in the model. */
class ModelPropertiesTest {

    private static final Bench BENCH = new Bench();

    @ParameterizedTest
    @ValueSource(strings = {"burgasser2006/h2o-j", "burgasser2006/h2o-h", "reid2001/h2o-b"})
    void waterDeepensFromMidMToLateT(String index) {
        double before = Double.POSITIVE_INFINITY;
        for (int type = 6; type <= 28; type += 2) {
            double value = BENCH.valueOfDwarf(type, "FLD-G", "prism", index);
            assertTrue(value < before, index + " at type " + type + " is " + value);
            before = value;
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"burgasser2006/ch4-h", "burgasser2006/ch4-k", "burgasser2006/ch4-j"})
    void methaneDeepensThroughTheTDwarfs(String index) {
        double before = Double.POSITIVE_INFINITY;
        for (int type = 20; type <= 28; type++) {
            double value = BENCH.valueOfDwarf(type, "FLD-G", "prism", index);
            assertTrue(value < before, index + " at type " + type + " is " + value);
            before = value;
        }
    }

    @ParameterizedTest
    @ValueSource(doubles = {8, 9, 10, 11, 12, 13})
    void potassiumAndIronHydrideAreWeakAndVanadiumOxideStrongAtLowGravity(double type) {
        assertTrue(ratioVeryLowToField(type, "prism", "allers2013/ki_j") < 0.99);
        assertTrue(ratioVeryLowToField(type, "prism", "allers2013/feh_z") < 0.95);
        assertTrue(ratioVeryLowToField(type, "prism", "allers2013/vo_z") > 1.02);
        assertTrue(ratioVeryLowToField(type, "cross", "morelli2020/ew_ki_1.169") < 0.75);
        assertTrue(ratioVeryLowToField(type, "cross", "morelli2020/ew_ki_1.252") < 0.75);
    }

    private static double ratioVeryLowToField(double type, String instrument, String feature) {
        return BENCH.valueOfDwarf(type, "VL-G", instrument, feature)
                / BENCH.valueOfDwarf(type, "FLD-G", instrument, feature);
    }

    @Test
    void titaniumOxidePeaksInLateMAndIsGoneInMidL() {
        double m8 = BENCH.valueOfDwarf(8, "FLD-G", "red", "lepine2003/tio7");
        assertTrue(m8 < 0.75, "M8: " + m8);
        assertEquals(1, BENCH.valueOfDwarf(16, "FLD-G", "red", "lepine2003/tio7"), 0.12, "L6");
    }

    @Test
    void lithiumLineShowsOnlyWhereThereIsLithium() {
        SurveyObject young = SurveyObject.made("", 9, "VL-G", 1, 0);
        SurveyObject old = SurveyObject.made("", 9, "VL-G", 0, 0);
        ModelGrid grid = BENCH.model().grid();
        int line = (int) Math.round(grid.place(0.670972));
        int beside = (int) Math.round(grid.place(0.6735));
        double[] with = BENCH.model().flux(young);
        double[] without = BENCH.model().flux(old);
        assertEquals(Math.exp(-1), with[line] / without[line], 0.02, "depth of exp(-1)");
        assertEquals(1, with[beside] / without[beside], 0.01, "nothing beside the line");
    }

    @Test
    void reddeningDimsTheBlueMore() {
        SurveyObject clear = SurveyObject.made("", 6, "FLD-G", 0, 0);
        SurveyObject dusty = SurveyObject.made("", 6, "FLD-G", 0, 5);
        ModelGrid grid = BENCH.model().grid();
        int blue = (int) grid.place(1.0);
        int red = (int) grid.place(2.2);
        double[] bright = BENCH.model().flux(clear);
        double[] dim = BENCH.model().flux(dusty);
        double magnitudes = -2.5 * Math.log10(dim[blue] / bright[blue]);
        assertEquals(5 * 0.404, magnitudes, 0.01, "A(1 micron) = 0.404 A_V");
        assertTrue(dim[red] / bright[red] > dim[blue] / bright[blue]);
    }

    @Test
    void aGiantHasWeakAlkaliLinesAndStrongCarbonMonoxide() {
        Measured dwarf = measured("", "morelli2020/ew_ki_1.252");
        Measured giant = measured("giant", "morelli2020/ew_ki_1.252");
        assertTrue(giant.value() < 0.5 * dwarf.value());
        assertTrue(
                measured("giant", "ramirez1997/ew_co_2.29").value()
                        > 1.3 * measured("", "ramirez1997/ew_co_2.29").value());
    }

    private static Measured measured(String recipe, String feature) {
        Instrument cross = Instrument.named("cross");
        SurveyObject object = SurveyObject.made(recipe, 6, "FLD-G", 0, 0);
        ObservedSpectrum seen = BENCH.observer().noiseless(BENCH.model().flux(object), cross);
        return BENCH.measure(seen.microns(), seen.fluxes(), seen.sigmas(), cross.resolvingPower())
                .measured(feature)
                .orElseThrow();
    }

    @Test
    void anUnknownRecipeIsRefused() {
        SurveyObject odd = SurveyObject.made("comet", 6, "", 0, 0);
        IllegalStateException thrown =
                assertThrows(IllegalStateException.class, () -> BENCH.model().flux(odd));
        assertTrue(thrown.getMessage().contains("comet"), thrown.getMessage());
    }
}
