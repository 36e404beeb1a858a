package emberline.place.reddening;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.measure.GivenMeasurements;
import emberline.measure.Measurements;
import emberline.place.calibrated.CalibratedWitness;
import emberline.place.calibrated.Calibration;
import emberline.place.calibrated.StandardLoci;
import emberline.place.calibrated.TypePriors;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Objects whose features leave their loci with extinction in a known way. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class ReddeningShapeTest {

    private static final double TYPE = 8;
    private static final double ANY = Double.NEGATIVE_INFINITY;

    private final ReddeningFitter fitter =
            new ReddeningFitter(
                    new CalibratedWitness(Calibration.standard(), TypePriors.FLAT.load()));

    /** Features of an M8 that are off by a part of their scatter for each magnitude too many. */
    private Measurements off(double magnitudes) {
        return GivenMeasurements.of(StandardLoci.at(TYPE, 0.4 * magnitudes), 1e-4);
    }

    @ParameterizedTest
    @ValueSource(doubles = {3, 5.1, 11.75})
    void theExtinctionThatLeadsBackToTheLociIsFound(double avMag) {
        ReddeningFit fit = fitter.fit(av -> off(avMag - av), ANY).orElseThrow();
        assertEquals(avMag, fit.avMag(), 0.15, fit.toString());
        assertTrue(fit.lo68Mag() < fit.avMag() && fit.avMag() < fit.hi68Mag(), fit.toString());
        assertTrue(fit.lo95Mag() < fit.lo68Mag() && fit.hi68Mag() < fit.hi95Mag());
        assertTrue(fit.hi95Mag() - fit.lo95Mag() < 4 && fit.hi95Mag() > avMag, fit.toString());
        assertTrue(fit.logGain() > 2, fit.toString());
        assertEquals(TYPE, fit.posterior().estimate().typeNumber(), 0.6);
    }

    @Test
    void withoutExtinctionNothingIsGained() {
        ReddeningFit fit = fitter.fit(this::off, ANY).orElseThrow();
        assertEquals(0, fit.lo95Mag(), 0.05);
        assertTrue(fit.avMag() < 1, fit.toString());
        assertTrue(fit.logGain() < 0, "what was tried in vain counts against it");
    }

    /** Where extinction changes nothing all of 0 to 15 are as probable, in cells of 0.1. */
    @Test
    void whatExtinctionDoesNotTouchTellsNothingOfIt() {
        ReddeningFit fit = fitter.fit(av -> off(0), ANY).orElseThrow();
        assertEquals(0, fit.logGain(), 1e-9);
        assertEquals(7.5, fit.avMag(), 1e-9);
        assertEquals(-0.05 + 0.16 * 15.1, fit.lo68Mag(), 1e-9);
        assertEquals(-0.05 + 0.84 * 15.1, fit.hi68Mag(), 1e-9);
        assertEquals(-0.05 + 0.025 * 15.1, fit.lo95Mag(), 1e-9);
        assertEquals(-0.05 + 0.975 * 15.1, fit.hi95Mag(), 1e-9);
    }

    @Test
    void whatCannotBePlacedGetsNoExtinction() {
        assertTrue(fitter.fit(av -> GivenMeasurements.of(Map.of(), 1), ANY).isEmpty());
    }

    /** A gain that no extinction reaches ends the search after its first nine trials. */
    @Test
    void whatIsOutOfReachIsNotLookedFor() {
        AtomicInteger trials = new AtomicInteger();
        Optional<ReddeningFit> none =
                fitter.fit(
                        av -> {
                            trials.incrementAndGet();
                            return off(av);
                        },
                        15);
        assertTrue(none.isEmpty());
        assertEquals(9, trials.get());
    }

    /** A gain that is reached changes nothing, even where the best place lies between trials. */
    @ParameterizedTest
    @ValueSource(doubles = {1, 3, 5.1, 11.75})
    void whatIsWithinReachIsFoundAsIfNothingWereAsked(double avMag) {
        ReddeningFit all = fitter.fit(av -> off(avMag - av), ANY).orElseThrow();
        ReddeningFit asked = fitter.fit(av -> off(avMag - av), all.logGain()).orElseThrow();
        assertEquals(all.avMag(), asked.avMag());
        assertEquals(all.logGain(), asked.logGain());
    }
}
