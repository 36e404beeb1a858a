package emberline.place.pair;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.GivenMeasurements;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.place.Blend;
import emberline.place.TypeEstimate;
import emberline.place.pair.PairVerdict.Strength;
import emberline.prepare.PreparedSpectrum;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class PairJudgeTest {

    private static final String L6 = "2MASS J15150083+4847416";
    private static final String L8 = "DENIS-P 025503.3-470049.0";
    private static final String T45 = "2MASS J05591915-1404489";

    private static final Measurer MEASURER =
            new Measurer(FeatureCatalogue.standard(), Measuring.withDefaults());
    private final PairJudge judge = new PairJudge(FeatureCatalogue.standard());

    private PairVerdict verdict(PreparedSpectrum prepared, double type) {
        return judge.judge(MEASURER.measure(prepared), TypeEstimate.normal(type, 0.7), 3);
    }

    @Test
    void aBlendOfLAndTIsACandidate() throws Exception {
        PairVerdict blend = verdict(Blend.of(L6, "L6", T45, "T4", 100, 1), 19);
        assertEquals(Strength.CANDIDATE, blend.strength().orElseThrow(), blend.toString());
        assertTrue(blend.criteriaMet() >= 3 && blend.criteriaJudged() <= 6);
        assertTrue(blend.pPair().orElseThrow() > 0.5, blend.toString());
        assertEquals("pair-candidate", blend.findings().get(0).code());
    }

    @Test
    void singleObjectsAreNone() throws Exception {
        PairVerdict l8 = verdict(Blend.single(L8, 100, 1), 18);
        assertEquals(Strength.NONE, l8.strength().orElseThrow(), l8.toString());
        assertTrue(l8.pPair().orElseThrow() < 0.3, l8.toString());
        assertTrue(l8.findings().isEmpty());
    }

    @Test
    void outsideTheRangeOfTypesItIsNotJudged() throws Exception {
        PairVerdict verdict = verdict(Blend.single(L6, 100, 1), 12);
        assertTrue(verdict.strength().isEmpty());
        assertTrue(verdict.reason().startsWith("not judged: type L2"), verdict.reason());
    }

    @Test
    void tooFewCriteriaAreNotJudged() throws Exception {
        PreparedSpectrum noise = Blend.single(L8, 0.1, 1);
        PairVerdict verdict = verdict(noise, 18);
        assertTrue(verdict.strength().isEmpty());
        assertTrue(verdict.reason().contains("criteria"), verdict.reason());
    }

    @Test
    void theSameSeedGivesTheSameProbability() throws Exception {
        Measurements blend = MEASURER.measure(Blend.of(L6, "L6", T45, "T4", 20, 1));
        TypeEstimate type = TypeEstimate.normal(19, 0.7);
        assertEquals(judge.judge(blend, type, 9).pPair(), judge.judge(blend, type, 9).pPair());
    }

    /** Values that meet the criteria of some planes and not those of the others, at type T0. */
    private static Map<String, Double> meeting(Set<Integer> planes) {
        Map<String, Double> values = new HashMap<>();
        values.put("burgasser2006/h2o-j", 0.455);
        values.put("burgasser2006/h2o-k", planes.contains(1) ? 0.60 : 0.56);
        values.put("burgasser2006/ch4-h", 0.70);
        values.put("burgasser2006/ch4-k", planes.contains(2) ? 0.50 : 0.40);
        values.put("burgasser2006/k-j", planes.contains(3) ? 0.30 : 0.20);
        values.put("burgasser2006/h2o-h", 0.70);
        values.put("burgasser2010/h-dip", planes.contains(4) ? 0.45 : 0.52);
        values.put("burgasser2010/h2o-j-over-h2o-h", planes.contains(5) ? 0.90 : 1.00);
        values.put("burgasser2010/h2o-j-over-ch4-k", planes.contains(6) ? 0.60 : 0.80);
        return values;
    }

    private PairVerdict given(Map<String, Double> values, double type) {
        return judge.judge(GivenMeasurements.of(values, 0.01), TypeEstimate.normal(type, 0.5), 1);
    }

    private static Optional<Boolean> met(PairVerdict verdict, int plane) {
        return verdict.criteria().stream()
                .filter(c -> c.plane().number() == plane)
                .findFirst()
                .orElseThrow()
                .met();
    }

    /** Three of the six make a candidate, two a weak one (Burgasser et al. 2010). */
    @Test
    void theNumberOfCriteriaMetIsTheStrength() {
        List<Set<Integer>> sets =
                List.of(
                        Set.of(),
                        Set.of(4),
                        Set.of(1, 6),
                        Set.of(2, 3, 5),
                        Set.of(1, 2, 3, 4),
                        Set.of(1, 2, 3, 4, 5, 6));
        for (Set<Integer> planes : sets) {
            PairVerdict verdict = given(meeting(planes), 20);
            assertEquals(planes.size(), verdict.criteriaMet(), planes.toString());
            assertEquals(6, verdict.criteriaJudged());
            for (int plane = 1; plane <= 6; plane++) {
                assertEquals(Optional.of(planes.contains(plane)), met(verdict, plane));
            }
            String strength =
                    planes.size() >= 3 ? "candidate" : planes.size() == 2 ? "weak" : "none";
            assertEquals(strength, verdict.strength().orElseThrow().word());
        }
        assertEquals("pair-weak", given(meeting(Set.of(1, 6)), 20).findings().get(0).code());
    }

    /**
     * The limit lines between their printed vertices, by hand: 0.4 of the way from (0.325, 0.5) to
     * (0.65, 0.7) lies 0.58, and so on. The corner of plane 5 is at T1.5.
     */
    @ParameterizedTest
    @CsvSource({
        "1, burgasser2006/h2o-j, 0.455, 20, burgasser2006/h2o-k, 0.58, true",
        "2, burgasser2006/ch4-h, 0.70, 20, burgasser2006/ch4-k, 0.45625, true",
        "3, burgasser2006/ch4-h, 0.72, 20, burgasser2006/k-j, 0.275, true",
        "4, burgasser2006/h2o-h, 0.60, 20, burgasser2010/h-dip, 0.49, false",
        "5, burgasser2006/h2o-j, 0.455, 20, burgasser2010/h2o-j-over-h2o-h, 0.925, false",
        "5, burgasser2006/h2o-j, 0.455, 22, burgasser2010/h2o-j-over-h2o-h, 0.90625, false",
        "6, burgasser2006/h2o-j, 0.455, 20, burgasser2010/h2o-j-over-ch4-k, 0.675, false",
        "6, burgasser2006/h2o-j, 0.455, 23, burgasser2010/h2o-j-over-ch4-k, 0.775, false"
    })
    void pairsLieOnTheirSideOfTheLimit(
            int plane,
            String xFeature,
            double x,
            double type,
            String yFeature,
            double limit,
            boolean pairsAbove) {
        for (double off : new double[] {-0.002, 0.002}) {
            Map<String, Double> values = meeting(Set.of());
            values.put(xFeature, x);
            values.put(yFeature, limit + off);
            assertEquals(
                    Optional.of(pairsAbove == off > 0), met(given(values, type), plane), "" + off);
        }
    }

    @Test
    void outsideALimitLineACriterionIsNotMet() {
        Map<String, Double> all = meeting(Set.of(1, 2, 3, 4, 5, 6));
        assertEquals(Optional.of(true), met(given(all, 18.5), 5), "the line begins at L8.5");
        assertEquals(Optional.of(false), met(given(all, 18.4), 5));
        assertEquals(Optional.of(false), met(given(all, 23.6), 5), "and ends at T3.5");
        all.put("burgasser2006/h2o-h", 0.49);
        assertEquals(Optional.of(false), met(given(all, 20), 4));
        all.put("burgasser2006/h2o-h", 0.88);
        assertEquals(Optional.of(false), met(given(all, 20), 4));
        all.put("burgasser2006/h2o-h", 0.875);
        assertEquals(Optional.of(true), met(given(all, 20), 4));
    }

    /** The criteria are printed for composite types L7 to T4, both included. */
    @ParameterizedTest
    @CsvSource({"16.9, false", "17, true", "24, true", "24.1, false"})
    void typesFromL7ToT4AreJudged(double type, boolean judged) {
        assertEquals(judged, given(meeting(Set.of()), type).strength().isPresent());
    }

    @Test
    void threeCriteriaMustBeJudged() {
        Map<String, Double> values = meeting(Set.of(1, 2, 3));
        values.keySet().removeIf(id -> id.startsWith("burgasser2010"));
        assertEquals(Optional.of(Strength.CANDIDATE), given(values, 20).strength());
        values.remove("burgasser2006/h2o-k");
        PairVerdict two = given(values, 20);
        assertTrue(two.strength().isEmpty());
        assertTrue(two.reason().contains("only 2 of 6"), two.reason());
        assertTrue(two.pPair().isEmpty());
    }

    /** Without noise a draw is the object itself; with a type that may be any, it is not. */
    @Test
    void withoutNoiseTheProbabilityIsThatOfTheVerdict() throws Exception {
        Measurements blend = MEASURER.measure(Blend.of(L6, "L6", T45, "T4", 1e6, 1));
        Measurements single = MEASURER.measure(Blend.single(L8, 1e6, 1));
        assertEquals(1, judge.judge(blend, TypeEstimate.normal(19, 1e-4), 3).pPair().orElseThrow());
        assertEquals(
                0, judge.judge(single, TypeEstimate.normal(18, 1e-4), 3).pPair().orElseThrow());
    }
}
