package emberline.place.pair;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.place.Blend;
import emberline.place.TypeEstimate;
import emberline.place.pair.PairVerdict.Strength;
import emberline.prepare.PreparedSpectrum;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

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
}
