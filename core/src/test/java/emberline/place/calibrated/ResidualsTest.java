package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurement.Measured;
import emberline.place.calibrated.TrainingSet.Dwarf;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

/** One L0 of intermediate gravity beside loci that can be reckoned by hand. */
class ResidualsTest {

    /** At L0 and intermediate gravity 3.15 and 1; with noise of 0.3 the sigma of both is 0.5. */
    private final List<Locus> loci =
            List.of(
                    Invented.locus("rising", 2, 0.1, 0.3, 0.4),
                    Invented.locus("falling", 2, -0.1, 0, 0.4),
                    Invented.locus("missing", 0, 0, 0, 1));

    private Residuals of(double rising, double falling) {
        Map<String, Measured> values =
                Map.of(
                        "rising", new Measured(rising, 0.3),
                        "falling", new Measured(falling, 0.3));
        return new Residuals(
                loci, new Dwarf(Invented.row("one", 10, "INT-G", "B", values), 10, 0.5, 0.8));
    }

    @Test
    void productsAreInSigmaOfScatterAndNoiseAndWeighted() {
        Residuals residuals = of(3.15 + 0.5, 1 - 1.0);
        assertEquals(0.8, residuals.product(0, 0), 1e-12);
        assertEquals(0.8 * 1 * -2, residuals.product(0, 1), 1e-12);
        assertEquals(0.8 * 4, residuals.product(1, 1), 1e-12);
    }

    @Test
    void residualsAreCutAtThreeSigma() {
        Residuals residuals = of(100, -100);
        assertEquals(0.8 * 9, residuals.product(0, 0), 1e-12);
        assertEquals(-0.8 * 9, residuals.product(0, 1), 1e-12);
    }

    /** An error of 0.35 subclasses moves by 0.07 sigma, one of 0.2 in gravity by 0.12. */
    @Test
    void errorsOfLabelsMoveFeaturesTogether() {
        Residuals residuals = of(3, 1);
        assertEquals(0.8 * (0.07 * 0.07 + 0.12 * 0.12), residuals.productOfLabels(0, 0), 1e-12);
        assertEquals(-0.8 * 0.07 * 0.07, residuals.productOfLabels(0, 1), 1e-12);
    }

    @Test
    void whatWasNotMeasuredHasNoResidual() {
        Residuals residuals = of(3, 1);
        assertTrue(residuals.hasBoth(0, 1));
        assertFalse(residuals.hasBoth(0, 2));
        assertFalse(residuals.hasBoth(2, 1));
    }
}
