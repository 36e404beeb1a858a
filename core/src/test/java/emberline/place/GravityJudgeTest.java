package emberline.place;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.GravityThreshold;
import emberline.measure.GivenMeasurements;
import emberline.measure.Measurements;
import emberline.place.calibrated.CalibratedType;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Which of the two witnesses of gravity is heard, and the limits of the published scores. */
class GravityJudgeTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();
    private static final Measurements NOTHING = GivenMeasurements.of(Map.of(), 1);

    private final GravityScorer scorer = new GravityScorer(CATALOGUE);
    private final GravityJudge judge = new GravityJudge(CATALOGUE);

    /** A posterior with 0.2 for field, 0.3 for intermediate and 0.5 for very low gravity. */
    private static CalibratedType calibrated(double separationSigma) {
        TypePosterior posterior =
                TypePosterior.of(
                        12,
                        0.1,
                        Map.of(
                                GravityClass.FLD_G, new double[] {2, 0},
                                GravityClass.INT_G, new double[] {0, 3},
                                GravityClass.VL_G, new double[] {4, 1}));
        return new CalibratedType(Optional.of(posterior), "", List.of(), separationSigma, 0);
    }

    private GravityVerdict verdict(double type, double separationSigma) {
        return judge.judge(NOTHING, TypeEstimate.normal(type, 0.5), calibrated(separationSigma), 1);
    }

    @Test
    void thePosteriorIsHeardWhereItCanTell() {
        GravityVerdict verdict = verdict(12, 2);
        assertEquals(Optional.of(GravityClass.VL_G), verdict.gravityClass());
        assertEquals(0.2, verdict.pFieldGravity().orElseThrow(), 1e-12);
        assertEquals(0.3, verdict.pIntermediateGravity().orElseThrow(), 1e-12);
        assertEquals(0.5, verdict.pVeryLowGravity().orElseThrow(), 1e-12);
        assertEquals("", verdict.reason());
        assertTrue(verdict.byScores().isEmpty());
    }

    @Test
    void whereItCannotTheScoresStandAlone() {
        GravityVerdict verdict = verdict(12, 1.9);
        assertTrue(verdict.gravityClass().isEmpty());
        assertTrue(verdict.reason().startsWith("only 0 of 4 scored"), verdict.reason());
        assertTrue(verdict.reason().contains("by 1.9 sigma only"), verdict.reason());
        GravityVerdict without =
                judge.judge(NOTHING, TypeEstimate.normal(12, 0.5), CalibratedType.none("few"), 1);
        assertTrue(!without.reason().contains("sigma"), without.reason());
        assertEquals(4, without.scores().size());
    }

    @ParameterizedTest
    @CsvSource({"4.9, false", "5, true", "17.5, true", "17.6, false"})
    void outsideTheCalibratedTypesGravityIsNotJudged(double type, boolean judged) {
        GravityVerdict verdict = verdict(type, 5);
        assertEquals(judged, verdict.gravityClass().isPresent());
        assertEquals(!judged, verdict.reason().contains("lies outside M5 to L7"));
    }

    private static GravityThreshold limit(String feature, double type) {
        return CATALOGUE.gravityThresholds().stream()
                .filter(t -> t.feature().equals(feature) && t.typeNumber() == type)
                .findFirst()
                .orElseThrow();
    }

    /** Limits are printed for whole types; between them they are interpolated. */
    @ParameterizedTest
    @CsvSource({"10, 0", "10.25, 0.25", "10.5, 0.5", "11, 1"})
    void limitsLieBetweenThoseOfTheNeighbouringTypes(double type, double share) {
        GravityVerdict verdict = scorer.judge(NOTHING, TypeEstimate.normal(type, 0.5), 1, false);
        for (GravityScore score : verdict.scores()) {
            GravityThreshold at = limit(score.feature().id(), 10);
            GravityThreshold next = limit(score.feature().id(), 11);
            assertEquals(
                    (1 - share) * at.intermediate() + share * next.intermediate(),
                    score.intermediateThreshold().orElseThrow(),
                    1e-12);
            assertEquals(
                    (1 - share) * at.veryLow() + share * next.veryLow(),
                    score.veryLowThreshold().orElseThrow(),
                    1e-12);
        }
    }

    /** Half a subclass beyond the printed types the limits of the last one are used. */
    @Test
    void beyondThePrintedTypesTheLastLimitsHoldForHalfASubclass() {
        GravityVerdict early = scorer.judge(NOTHING, TypeEstimate.normal(5.5, 1), 1, false);
        List<GravityScore> possible =
                early.scores().stream().filter(s -> s.intermediateThreshold().isPresent()).toList();
        assertTrue(!possible.isEmpty(), "some begin at M6");
        for (GravityScore score : possible) {
            assertEquals(
                    limit(score.feature().id(), 6).intermediate(),
                    score.intermediateThreshold().orElseThrow());
        }
        GravityVerdict earlier = scorer.judge(NOTHING, TypeEstimate.normal(5.4, 1), 1, false);
        assertTrue(earlier.reason().contains("outside M6 to L7"), earlier.reason());
    }

    /** A value at a limit has the score of lower gravity, whichever side that is on. */
    @Test
    void valuesAtALimitBelongToLowerGravity() {
        for (int wanted = 1; wanted <= 2; wanted++) {
            Map<String, Double> values = new HashMap<>();
            for (GravityThreshold threshold : CATALOGUE.gravityThresholds()) {
                if (threshold.typeNumber() == 10) {
                    values.put(
                            threshold.feature(),
                            wanted == 1 ? threshold.intermediate() : threshold.veryLow());
                }
            }
            GravityVerdict verdict =
                    scorer.judge(
                            GivenMeasurements.of(values, 0.01),
                            TypeEstimate.normal(10, 0.5),
                            1,
                            false);
            for (GravityScore score : verdict.scores()) {
                assertEquals(wanted, score.score().orElseThrow(), score.feature().id());
                assertEquals("", score.reason());
            }
            assertEquals(
                    Optional.of(wanted == 1 ? GravityClass.INT_G : GravityClass.VL_G),
                    verdict.byScores());
            assertTrue(verdict.pOfClass().isEmpty(), "no probabilities were asked for");
        }
    }
}
