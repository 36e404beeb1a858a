package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.place.calibrated.CalibratedType;
import emberline.place.calibrated.TypePrior;
import emberline.place.calibrated.TypePriors;
import emberline.spectrum.Candidate;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class GatheredEvidenceTest {

    private static final TypePrior PRIOR = TypePriors.FLAT.load();

    private static Placement placement(GravityVerdict gravity) {
        return placement(gravity, CalibratedType.none(""));
    }

    private static Placement placement(GravityVerdict gravity, CalibratedType calibrated) {
        return Placement.known(TypeEstimate.normal(12, 0.6), gravity, "").with(calibrated);
    }

    private static GatheredEvidence gathered(String... cells) {
        Map<String, String> row = new LinkedHashMap<>();
        for (int i = 0; i < cells.length; i += 2) {
            row.put(cells[i], cells[i + 1]);
        }
        return GatheredEvidence.of(
                        new Candidate("x", 1, List.of(), row),
                        placement(GravityVerdict.notJudged("", List.of())),
                        List.of(),
                        PRIOR)
                .orElseThrow();
    }

    @Test
    void theListIsRead() {
        GatheredEvidence all =
                gathered(
                        "h_mag",
                        "12.5",
                        "h_mag_err",
                        "0.03",
                        "w2_mag",
                        "11",
                        "mag_system",
                        "mko",
                        "parallax_mas",
                        "50",
                        "parallax_mas_err",
                        "1",
                        "pmra_masyr",
                        "100",
                        "pmdec_masyr",
                        "0",
                        "age",
                        "THA",
                        "lithium",
                        "yes");
        Evidence evidence = all.evidence();
        assertEquals(List.of(), all.findings());
        assertEquals(new Magnitude(12.5, 0.03), evidence.photometry().get(MagnitudeBand.H_MKO));
        assertEquals(new Magnitude(11, 0.1), evidence.photometry().get(MagnitudeBand.W2));
        assertEquals(50, evidence.astrometry().parallaxMas().orElseThrow());
        assertEquals("THA", evidence.age().orElseThrow().text());
        assertEquals(LithiumTest.Outcome.SEEN, evidence.lithium().outcome());
        assertTrue(evidence.gravityPrior().isEmpty());
    }

    @Test
    void whatCannotBeUsedIsSaid() {
        GatheredEvidence odd =
                gathered("j_mag", "13", "parallax_mas", "50", "age", "ancient", "lithium", "maybe");
        List<String> codes = odd.findings().stream().map(f -> f.code()).toList();
        assertEquals(
                List.of(
                        "lithium-unusable",
                        "mag-system-assumed",
                        "parallax-without-error",
                        "age-unusable"),
                codes);
        assertTrue(odd.evidence().photometry().containsKey(MagnitudeBand.J_2MASS));
        assertTrue(odd.evidence().astrometry().parallaxMas().isEmpty());
        assertTrue(
                gathered("j_mag", "13", "mag_system", "AB")
                        .findings()
                        .get(0)
                        .text()
                        .contains("expected 2MASS or MKO"));
    }

    private static GravityVerdict verdict(double field, double intermediate, double veryLow) {
        return new GravityVerdict(
                Optional.of(GravityClass.VL_G),
                OptionalDouble.of(field),
                OptionalDouble.of(intermediate),
                OptionalDouble.of(veryLow),
                "",
                List.of(),
                Optional.empty());
    }

    private static Evidence evidence(Placement placement) {
        return GatheredEvidence.of(
                        new Candidate("x", 1, List.of(), Map.of()), placement, List.of(), PRIOR)
                .orElseThrow()
                .evidence();
    }

    @Test
    void scoresComeWithoutAPrior() {
        Evidence evidence = evidence(placement(verdict(0.1, 0.3, 0.6)));
        assertEquals(0.6, evidence.type().probability(GravityClass.VL_G), 1e-9);
        assertEquals(12, evidence.type().quantile(0.5), 0.01);
        assertEquals(1.0 / 3, evidence.gravityPrior().get(GravityClass.INT_G), 1e-9);
    }

    /** The joint posterior goes in as it is, with the prior that is in it. */
    @Test
    void thePosteriorComesWithItsPrior() {
        TypePosterior joint =
                NormalType.posterior(
                        14,
                        0.3,
                        Map.of(
                                GravityClass.FLD_G, 0.2,
                                GravityClass.INT_G, 0.3,
                                GravityClass.VL_G, 0.5));
        CalibratedType calibrated = CalibratedType.none("").with(joint);
        GravityVerdict ofJoint =
                verdict(
                        joint.probability(GravityClass.FLD_G),
                        joint.probability(GravityClass.INT_G),
                        joint.probability(GravityClass.VL_G));
        Evidence told = evidence(placement(ofJoint, calibrated));
        assertEquals(14, told.type().quantile(0.5), 0.05);
        assertEquals(
                PRIOR.density(14, GravityClass.VL_G),
                told.gravityPrior().get(GravityClass.VL_G),
                1e-9);
        Evidence byScores = evidence(placement(verdict(0.9, 0.1, 0), calibrated));
        assertEquals(14, byScores.type().quantile(0.5), 0.05);
        assertEquals(0.9, byScores.type().probability(GravityClass.FLD_G), 1e-9);
        assertEquals(1.0 / 3, byScores.gravityPrior().get(GravityClass.VL_G), 1e-9);
        Evidence unjudged =
                evidence(placement(GravityVerdict.notJudged("", List.of()), calibrated));
        assertTrue(unjudged.gravityPrior().isEmpty());
    }
}
