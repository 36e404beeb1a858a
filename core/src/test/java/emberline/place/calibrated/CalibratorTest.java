package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertNotSame;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement.Measured;
import emberline.place.reference.ReferenceRow;
import emberline.place.reference.ReferenceTable;
import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Thirty invented dwarfs from M5 on, half a subclass apart, with features that run straight. */
class CalibratorTest {

    private static final int OBJECTS = 30;

    private final FeatureCatalogue catalogue = FeatureCatalogue.standard();
    private final List<String> features = new ArrayList<>();
    private Calibrator.Outcome outcome;
    private Calibrator.Outcome spoilt;

    /** One test, since learning takes longest. */
    @Test
    void whatIsLearnedAndHowUnseenObjectsArePlaced() {
        learn();
        assertAll(
                this::aLocusNeedsTwelveSpectra,
                this::theLociAreThoseOfTheObjects,
                this::everySpectrumIsPlacedNearItsType,
                this::theErrorOfLabelsIsFittedAndGoesEverywhere,
                this::objectsAreDealtIntoTenEvenFolds,
                this::noCalibrationHasSeenWhatItPlaces);
    }

    private void learn() {
        Map<String, List<TrainingSet.Point>> anchors = RelationAnchors.of(catalogue);
        LocusFeatures.standard().stream()
                .filter(id -> !anchors.containsKey(id))
                .limit(5)
                .forEach(features::add);
        outcome = new Calibrator(table(0), catalogue).calibrate();
        spoilt = new Calibrator(table(0.5), catalogue).calibrate();
    }

    private static double type(int k) {
        return 5 + 0.55 * k;
    }

    /** Every sixth has a second spectrum; the values of object 20 are off by {@code off}. */
    private ReferenceTable table(double off) {
        Random random = new Random(8);
        List<ReferenceRow> rows = new ArrayList<>();
        for (int k = 0; k < OBJECTS; k++) {
            for (int spectrum = 0; spectrum < (k % 6 == 0 ? 2 : 1); spectrum++) {
                Map<String, Measured> values = new LinkedHashMap<>();
                for (int f = 0; f < 3; f++) {
                    double value = 1 + (0.05 + 0.01 * f) * type(k) + 0.03 * random.nextGaussian();
                    values.put(features.get(f), new Measured(value + (k == 20 ? off : 0), 0.01));
                }
                if (k < 11) {
                    values.put(features.get(3), new Measured(1, 0.01));
                }
                if (k % 3 == 0) {
                    values.put(features.get(4), new Measured(1, 0.01));
                }
                rows.add(Invented.row("dwarf " + k, type(k), "", "A", values));
            }
        }
        return new ReferenceTable(features, rows);
    }

    private void aLocusNeedsTwelveSpectra() {
        List<String> found = outcome.calibration().loci().stream().map(Locus::feature).toList();
        // the fourth has 13 spectra of 11 objects, the last 15 of 10: enough in all
        assertEquals(features, found);
        Calibration without = outcome.withoutGroup().get("dwarf 0");
        List<String> left = without.loci().stream().map(Locus::feature).toList();
        assertTrue(left.containsAll(features.subList(0, 3)), left.toString());
        assertTrue(!left.contains(features.get(3)), "ten or eleven spectra are left: " + left);
    }

    private void theLociAreThoseOfTheObjects() {
        for (int f = 0; f < 3; f++) {
            for (double type = 7; type < 21; type += 2) {
                Calibration.Expected expected =
                        outcome.calibration().expected(features.get(f), type, 0).orElseThrow();
                assertEquals(1 + (0.05 + 0.01 * f) * type, expected.mean(), 0.04);
                assertTrue(expected.scatter() > 0.003 && expected.scatter() < 0.06);
            }
        }
    }

    private void everySpectrumIsPlacedNearItsType() {
        assertEquals(OBJECTS + 5, outcome.unseen().size());
        double squares = 0;
        for (Calibrator.Unseen one : outcome.unseen()) {
            double found = one.placed().posterior().orElseThrow().estimate().typeNumber();
            double off = found - one.row().typeNumber().orElseThrow();
            squares += off * off;
            assertTrue(Math.abs(off) < 2, one.row().object() + " off by " + off);
        }
        assertTrue(Math.sqrt(squares / outcome.unseen().size()) < 0.7);
    }

    /** Types without error: the narrowest core that is tried, and not the one to start with. */
    private void theErrorOfLabelsIsFittedAndGoesEverywhere() {
        LabelError error = outcome.calibration().labelError();
        assertNotEquals(new LabelError(0.5, 1.5, 0.1), error);
        assertTrue(error.coreSubclass() < 0.5, error.toString());
        outcome.withoutGroup().values().forEach(c -> assertEquals(error, c.labelError()));
    }

    /** Each fold spans the sequence: objects next to each other are dealt to different folds. */
    private void objectsAreDealtIntoTenEvenFolds() {
        IdentityHashMap<Calibration, Integer> sizes = new IdentityHashMap<>();
        outcome.withoutGroup().values().forEach(c -> sizes.merge(c, 1, Integer::sum));
        assertEquals(OBJECTS, outcome.withoutGroup().size());
        assertEquals(Calibrator.FOLDS, sizes.size());
        sizes.values().forEach(size -> assertEquals(OBJECTS / Calibrator.FOLDS, size));
        for (int k = 0; k + 1 < OBJECTS; k++) {
            assertNotSame(without(outcome, k), without(outcome, k + 1));
        }
        assertSame(without(outcome, 7), without(outcome, 17));
    }

    private static Calibration without(Calibrator.Outcome of, int object) {
        return of.withoutGroup().get("dwarf " + object);
    }

    /** An object that is far off spoils all calibrations but the one that has not seen it. */
    private void noCalibrationHasSeenWhatItPlaces() {
        String feature = features.get(0);
        double at = type(20);
        for (int k = 0; k < OBJECTS; k++) {
            double clean = without(outcome, k).expected(feature, at, 0).orElseThrow().scatter();
            double other = without(spoilt, k).expected(feature, at, 0).orElseThrow().scatter();
            if (k % 10 == 0) {
                assertEquals(clean, other, 0, "fold of object 20, object " + k);
            } else {
                assertTrue(other > clean, "object " + k);
            }
        }
    }
}
