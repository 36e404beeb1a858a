package emberline.judge.plan;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.judge.Aim;
import emberline.judge.Judge;
import emberline.judge.Judging;
import emberline.place.GravityClass;
import emberline.place.calibrated.Calibration;
import emberline.place.calibrated.FeatureNoise;
import emberline.place.calibrated.Forecast;
import emberline.place.calibrated.TypePrior;
import emberline.place.calibrated.TypePriors;
import emberline.spectrum.SpectralType;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

class SignalPlannerTest {

    private static final TypePrior PRIOR = TypePriors.FLAT.load();
    private static final Forecast FORECAST =
            new Forecast(Calibration.standard(), PRIOR, FeatureNoise.standard());

    private static SignalPlan plan(
            String type, GravityClass gravity, double resolution, PlanAim aim, Double... signals) {
        Judging judging =
                aim == PlanAim.GRAVITY
                        ? Judging.withDefaults()
                        : Judging.withDefaults().withAims(Map.of(Aim.valueOf(aim.name()), 1.0));
        return new SignalPlanner(FORECAST, new Judge(judging), PRIOR)
                .plan(
                        new PlanQuestion(
                                new Forecast.Setting(
                                        SpectralType.parse(type).orElseThrow().number(),
                                        gravity,
                                        resolution),
                                aim,
                                0.95,
                                List.of(signals),
                                60,
                                1));
    }

    @Tag("slow")
    @Test
    void moreSignalMakesGravitySurerAndTheTypeSharper() {
        SignalPlan plan = plan("L1", GravityClass.VL_G, 120, PlanAim.GRAVITY, 3.0, 10.0, 40.0);
        for (int k = 1; k < plan.steps().size(); k++) {
            SignalPlan.Step before = plan.steps().get(k - 1);
            SignalPlan.Step after = plan.steps().get(k);
            assertTrue(after.medianProbability() > before.medianProbability(), "step " + k);
            assertTrue(after.shareSure() >= before.shareSure(), "step " + k);
            assertTrue(after.typeSigma() < before.typeSigma(), "step " + k);
        }
        assertTrue(plan.steps().get(0).medianProbability() < 0.95);
        double needed = plan.signalNeeded().orElseThrow();
        assertTrue(needed > 3 && needed < 40, "needed " + needed);
        assertTrue(plan.words().contains("95% sure"), plan.words());
    }

    @Tag("slow")
    @Test
    void whatNoiseDoesNotLimitIsSaidSo() {
        SignalPlan plan = plan("L3", GravityClass.FLD_G, 120, PlanAim.SUBSTELLAR, 20.0, 200.0);
        assertTrue(plan.signalNeeded().isEmpty());
        assertTrue(plan.words().contains("differ by more than the noise"), plan.words());
        assertTrue(plan.words().contains("What tells more"), plan.words());
    }

    @Test
    void aCoolDwarfIsSubstellarAtOnce() {
        SignalPlan plan = plan("T5", GravityClass.FLD_G, 120, PlanAim.SUBSTELLAR, 10.0, 100.0);
        assertEquals(10, plan.signalNeeded().orElseThrow(), 0);
        assertTrue(plan.words().contains("or less"), plan.words());
    }

    @Tag("slow")
    @Test
    void theSamePlanTwice() {
        assertEquals(
                plan("M8", GravityClass.INT_G, 120, PlanAim.GRAVITY, 10.0, 30.0),
                plan("M8", GravityClass.INT_G, 120, PlanAim.GRAVITY, 10.0, 30.0));
    }

    @Test
    void whatCannotBePlannedIsRefused() {
        IllegalArgumentException late =
                assertThrows(
                        IllegalArgumentException.class,
                        () -> plan("T6", GravityClass.FLD_G, 120, PlanAim.GRAVITY, 10.0));
        assertTrue(late.getMessage().contains("M5 to L7"), late.getMessage());
        IllegalArgumentException aim =
                assertThrows(IllegalArgumentException.class, () -> PlanAim.parse("pairs"));
        assertTrue(aim.getMessage().contains("gravity, substellar, young, coolest"));
    }

    @Test
    void interpolatesBetweenSteps() {
        PlanQuestion question =
                new PlanQuestion(
                        new Forecast.Setting(11, GravityClass.VL_G, 120),
                        PlanAim.GRAVITY,
                        0.9,
                        List.of(10.0, 40.0),
                        60,
                        1);
        SignalPlan plan =
                new SignalPlan(
                        question,
                        40,
                        List.of(
                                new SignalPlan.Step(10, 0.8, 0, java.util.OptionalDouble.of(0), 1),
                                new SignalPlan.Step(40, 1.0, 1, java.util.OptionalDouble.of(0), 1)),
                        "");
        assertEquals(20, plan.signalNeeded().orElseThrow(), 1e-9);
    }

    private static PlanQuestion question(double type, PlanAim aim, double sure, int draws) {
        return new PlanQuestion(
                new Forecast.Setting(type, GravityClass.VL_G, 120),
                aim,
                sure,
                List.of(10.0, 40.0, 160.0),
                draws,
                1);
    }

    private static SignalPlan planned(String otherStep, double... medians) {
        List<SignalPlan.Step> steps = new ArrayList<>();
        double signal = 10;
        for (double median : medians) {
            steps.add(new SignalPlan.Step(signal, median, 0.8, OptionalDouble.empty(), 0.4));
            signal *= 4;
        }
        return new SignalPlan(question(11, PlanAim.GRAVITY, 0.9, 20), 40, steps, otherStep);
    }

    /** Sure at every greater signal, not at one that is followed by a relapse. */
    @Test
    void theSignalNeededHoldsFromThereOn() {
        assertEquals(10, planned("", 0.9, 0.95, 0.99).signalNeeded().orElseThrow());
        assertEquals(80, planned("", 0.95, 0.8, 1).signalNeeded().orElseThrow(), 1e-9);
        assertTrue(planned("", 0.95, 0.95, 0.89).signalNeeded().isEmpty());
    }

    @Test
    void thePlanSaysWhatItFound() {
        assertEquals(
                "At a median signal-to-noise of 10 a pixel or less half of such spectra make the"
                        + " answer 90% sure; at 160 it is 80 of 100.",
                planned("", 0.9, 0.95, 0.99).words());
        assertEquals(
                "At a median signal-to-noise of 80 a pixel half of such spectra make the answer 90%"
                        + " sure; at 160 it is 80 of 100.",
                planned("", 0.5, 0.8, 1).words());
        String open =
                "No signal-to-noise up to 160 makes the answer 90% sure: the median probability"
                        + " stays at 0.70, since objects of one type differ by more than the noise.";
        assertEquals(open, planned("", 0.5, 0.6, 0.7).words());
        assertEquals(
                open + " What tells more: a parallax.",
                planned("a parallax", 0.5, 0.6, 0.7).words());
    }

    @Test
    void questionsOffTheRangesAreRefused() {
        for (double sure : new double[] {0.5, 1}) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class,
                            () -> question(11, PlanAim.GRAVITY, sure, 20));
            assertTrue(
                    refused.getMessage()
                            .endsWith("expected one above 0.5 and below 1, such as 0.95"),
                    refused.getMessage());
        }
        IllegalArgumentException few =
                assertThrows(
                        IllegalArgumentException.class,
                        () -> question(11, PlanAim.GRAVITY, 0.9, 19));
        assertEquals("19 draws: expected at least 20", few.getMessage());
        assertEquals(25, question(25, PlanAim.YOUNG, 0.9, 20).setting().typeNumber());
        assertEquals(PlanAim.COOLEST, PlanAim.parse(" Coolest "));
        assertEquals("younger than 150 Myr or not", PlanAim.YOUNG.question());
    }
}
