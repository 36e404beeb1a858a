package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.Activity;
import emberline.place.GravityClass;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.PublishedType;
import emberline.place.TypeEstimate;
import emberline.spectrum.Candidate;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class GatheredEvidenceTest {

    private static Placement placement(GravityVerdict gravity) {
        return new Placement(
                Optional.of(TypeEstimate.normal(12, 0.6)),
                "",
                new PublishedType(Optional.empty(), "", List.of(), List.of()),
                gravity,
                new Activity(Optional.empty(), List.of(), ""),
                List.of());
    }

    private static GatheredEvidence gathered(String... cells) {
        Map<String, String> row = new LinkedHashMap<>();
        for (int i = 0; i < cells.length; i += 2) {
            row.put(cells[i], cells[i + 1]);
        }
        return GatheredEvidence.of(
                        new Candidate("x", 1, List.of(), row),
                        placement(GravityVerdict.notJudged("", List.of())),
                        List.of())
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

    @Test
    void theVerdictBecomesThePosterior() {
        GravityVerdict verdict =
                new GravityVerdict(
                        Optional.of(GravityClass.VL_G),
                        OptionalDouble.of(0.1),
                        OptionalDouble.of(0.3),
                        OptionalDouble.of(0.6),
                        "",
                        List.of());
        Evidence evidence =
                GatheredEvidence.of(
                                new Candidate("x", 1, List.of(), Map.of()),
                                placement(verdict),
                                List.of())
                        .orElseThrow()
                        .evidence();
        assertEquals(0.6, evidence.type().probability(GravityClass.VL_G), 1e-9);
        assertEquals(12, evidence.type().quantile(0.5), 0.01);
        assertEquals(1.0 / 3, evidence.gravityPrior().get(GravityClass.INT_G), 1e-9);
    }
}
