package emberline.place;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.kind.KindVerdict;
import emberline.place.kind.ObjectKind;
import emberline.spectrum.Finding;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Types, gravity classes and kinds as values, and what they say. */
class TypeEstimateTest {

    @Test
    void normalErrorsHaveSymmetricIntervals() {
        TypeEstimate type = TypeEstimate.normal(12, 0.5);
        assertEquals(11.5, type.lo68());
        assertEquals(12.5, type.hi68());
        assertEquals(12 - 0.979981992, type.lo95(), 1e-9);
        assertEquals(12 + 0.979981992, type.hi95(), 1e-9);
    }

    /** One colon beyond one subclass, two beyond two. */
    @ParameterizedTest
    @CsvSource({"13.5, 1, L3.5", "13.5, 1.01, L3.5:", "22, 2, T2:", "22, 2.01, T2::"})
    void doubtIsMarked(double type, double sigma, String code) {
        assertEquals(code, TypeEstimate.normal(type, sigma).code());
    }

    @Test
    void intervalsOutOfOrderAreRefused() {
        double[][] wrong = {
            {12, 0, 12, 12, 12, 12},
            {12, 1, 12.1, 13, 10, 14},
            {12, 1, 11, 11.9, 10, 14},
            {12, 1, 11, 13, 11.1, 14},
            {12, 1, 11, 13, 10, 12.9},
        };
        for (double[] w : wrong) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class,
                            () -> new TypeEstimate(w[0], w[1], w[2], w[3], w[4], w[5]));
            assertEquals(
                    "type " + w[0] + " +- " + w[1] + ": expected ordered intervals",
                    refused.getMessage());
        }
    }

    /** Weights 1, 0 and 3 in cells of width 2 about 1, 3 and 5. */
    @Test
    void quantilesLieInCellsOfPositiveWeight() {
        CellQuantiles cells = new CellQuantiles(new double[] {1, 3, 5}, new double[] {1, 0, 3}, 2);
        assertEquals(0, cells.at(0), 1e-12);
        assertEquals(1, cells.at(0.125), 1e-12);
        assertEquals(2, cells.at(0.25), 1e-12);
        assertEquals(5, cells.at(0.625), 1e-12);
        assertEquals(6, cells.at(1), 1e-12);
        assertEquals(6, cells.at(1.1), 1e-12, "beyond all weight");
    }

    @ParameterizedTest
    @CsvSource({"4.9, false", "5, true", "17.5, true", "17.6, false"})
    void gravityIsJudgedFromM5ToL7(double type, boolean judged) {
        assertEquals(judged, GravityRange.contains(type));
        assertEquals("M5 to L7", GravityRange.words());
    }

    @Test
    void aVerdictKnowsTheProbabilityOfItsClass() {
        GravityVerdict verdict =
                new GravityVerdict(
                        Optional.of(GravityClass.INT_G),
                        OptionalDouble.of(0.3),
                        OptionalDouble.of(0.6),
                        OptionalDouble.of(0.1),
                        "",
                        List.of(),
                        Optional.empty());
        assertEquals(0.3, verdict.probability(GravityClass.FLD_G).orElseThrow());
        assertEquals(0.6, verdict.pOfClass().orElseThrow());
        assertEquals(0.1, verdict.probability(GravityClass.VL_G).orElseThrow());
        GravityVerdict none = GravityVerdict.notJudged("too noisy", List.of());
        assertTrue(none.pOfClass().isEmpty());
        assertEquals("too noisy", none.reason());
    }

    private static KindVerdict kind(double pDwarf) {
        return new KindVerdict(
                Map.of(ObjectKind.LATE_DWARF, pDwarf, ObjectKind.GIANT, 1 - pDwarf), "JHK", "");
    }

    /** A type from 0.35 on, without a caution from 0.9 on. */
    @Test
    void theKindDecidesWhetherThereIsAType() {
        assertTrue(KindGate.refusal(kind(0.35)).isEmpty());
        assertEquals("kind: giant (p 0.66)", KindGate.refusal(kind(0.34)).orElseThrow());
        assertTrue(KindGate.refusal(KindVerdict.notJudged("no spectrum")).isEmpty());
        assertEquals(List.of(), KindGate.findings(kind(0.9), true));
        Finding unsure = KindGate.findings(kind(0.35), true).get(0);
        assertEquals("kind-unsure", unsure.code());
        assertTrue(unsure.text().contains("only 0.35"), unsure.text());
        Finding other = KindGate.findings(kind(0.34), true).get(0);
        assertEquals("not-a-late-dwarf", other.code());
        assertTrue(other.text().contains("0.66 (most probable: giant)"), other.text());
        KindVerdict open = KindVerdict.notJudged("too short");
        Finding notJudged = KindGate.findings(open, true).get(0);
        assertEquals("kind-not-judged", notJudged.code());
        assertTrue(notJudged.text().endsWith("too short"), notJudged.text());
        assertEquals(List.of(), KindGate.findings(open, false));
        assertFalse(open.kind().isPresent());
    }

    @Test
    void posteriorsThatCannotBeMadeAreRefused() {
        double[] one = {1, 2};
        Map<GravityClass, double[]> missing = Map.of(GravityClass.FLD_G, one);
        Map<GravityClass, double[]> uneven =
                Map.of(
                        GravityClass.FLD_G, one,
                        GravityClass.INT_G, one,
                        GravityClass.VL_G, new double[] {1});
        for (Map<GravityClass, double[]> weights : List.of(missing, uneven)) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class,
                            () -> TypePosterior.of(0, 0.1, weights));
            assertTrue(refused.getMessage().contains("as many as grid points"), "lengths");
        }
        Map<GravityClass, double[]> good =
                Map.of(GravityClass.FLD_G, one, GravityClass.INT_G, one, GravityClass.VL_G, one);
        assertThrows(IllegalArgumentException.class, () -> TypePosterior.of(0, 0, good));
        double[] none = {0, 0};
        IllegalArgumentException empty =
                assertThrows(
                        IllegalArgumentException.class,
                        () ->
                                TypePosterior.of(
                                        0,
                                        0.1,
                                        Map.of(
                                                GravityClass.FLD_G, none,
                                                GravityClass.INT_G, none,
                                                GravityClass.VL_G, none)));
        assertEquals(
                "weights with the sum 0.0: expected a positive finite sum", empty.getMessage());
        TypePosterior here = TypePosterior.of(0, 0.1, good);
        assertEquals(1.0 / 9, here.probability(0, GravityClass.INT_G), 1e-12);
        assertEquals(2.0 / 3, here.probability(1), 1e-12);
        assertEquals(1.0 / 3, here.probability(GravityClass.VL_G), 1e-12);
        assertThrows(
                IllegalArgumentException.class,
                () ->
                        TypePosterior.mixture(
                                List.of(here, TypePosterior.of(1, 0.1, good)), List.of(1.0, 1.0)));
    }
}
