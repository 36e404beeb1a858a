package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.Measurement.Measured;
import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/** Objects made of the product's own loci, whose type and gravity are therefore known. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class CalibratedWitnessTest {

    private final Calibration calibration = Calibration.standard();
    private final CalibratedWitness witness =
            new CalibratedWitness(calibration, TypePriors.FLAT.load());

    private Map<String, Measured> perfect(double type, double lowGravity, double noise) {
        Map<String, Measured> values = new LinkedHashMap<>();
        for (Locus locus : calibration.loci()) {
            if (locus.feature().startsWith("burgasser") || locus.feature().startsWith("allers")) {
                values.put(
                        locus.feature(),
                        new Measured(
                                locus.mean(type, lowGravity), noise * locus.scatter(type) + 1e-9));
            }
        }
        return values;
    }

    private CalibratedType place(Map<String, Measured> values) {
        return witness.witness(Sample.of(calibration, values));
    }

    private TypeEstimate type(Map<String, Measured> values) {
        return place(values).posterior().orElseThrow().estimate();
    }

    @Test
    void anObjectOnTheLociIsPlacedWhereItIs() {
        for (double type = 5; type <= 28; type += 1.5) {
            assertEquals(type, type(perfect(type, 0, 0.1)).typeNumber(), 0.25, "type " + type);
        }
    }

    @Test
    void gravityIsFoundWithTheType() {
        for (double type = 7; type <= 15; type += 2) {
            for (GravityClass gravity : GravityClass.values()) {
                double lowGravity = GravityScale.centre(gravity);
                CalibratedType placed = place(perfect(type, lowGravity, 0.1));
                double probability = placed.posterior().orElseThrow().probability(gravity);
                assertTrue(probability > 0.8, type + " " + gravity + ": " + probability);
                assertTrue(placed.gravitySeparationSigma() > 2);
            }
        }
    }

    @Test
    void noiseWidensTheIntervals() {
        double before = 0;
        for (double noise : new double[] {0.1, 3, 10}) {
            TypeEstimate type = type(perfect(12, 0, noise));
            assertTrue(type.sigmaSubclass() > before, "noise " + noise);
            before = type.sigmaSubclass();
        }
        assertTrue(before > 1, "ten times the scatter: " + before);
    }

    @Test
    void oneBadFeatureIsSetAside() {
        Map<String, Measured> values = perfect(12, 0, 0.5);
        double clean = type(values).typeNumber();
        String bad = "burgasser2006/h2o-j";
        values.put(bad, new Measured(values.get(bad).value() + 0.6, values.get(bad).oneSigma()));
        CalibratedType placed = place(values);
        assertEquals(clean, placed.posterior().orElseThrow().estimate().typeNumber(), 0.25);
        List<String> aside =
                placed.contributions().stream()
                        .filter(Contribution::setAside)
                        .map(Contribution::feature)
                        .toList();
        assertEquals(List.of(bad), aside);
    }

    @Test
    void tooLittleIsSaidToBeTooLittle() {
        Map<String, Measured> values = perfect(12, 0, 0.5);
        values.keySet().removeIf(id -> !id.startsWith("burgasser2006/h2o-j"));
        CalibratedType placed = place(values);
        assertTrue(placed.posterior().isEmpty());
        assertTrue(placed.reason().startsWith("only 1 of the "), placed.reason());
    }

    /** A broad posterior follows the prior; a sharp one does not. */
    @Test
    void thePriorMattersWhereTheSpectrumSaysLittle() {
        CalibratedWitness volume = new CalibratedWitness(calibration, TypePriors.MAGNITUDE.load());
        Map<String, Measured> noisy = perfect(14, 0, 30);
        Map<String, Measured> sharp = perfect(14, 0, 0.1);
        assertTrue(
                typeBy(volume, noisy) < type(noisy).typeNumber() - 0.5,
                "a sample limited in J holds few late types");
        assertEquals(type(sharp).typeNumber(), typeBy(volume, sharp), 0.3);
    }

    private double typeBy(CalibratedWitness witness, Map<String, Measured> values) {
        return witness.witness(Sample.of(calibration, values))
                .posterior()
                .orElseThrow()
                .estimate()
                .typeNumber();
    }
}
