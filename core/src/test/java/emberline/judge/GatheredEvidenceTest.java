package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurement;
import emberline.measure.line.LineMeasurement;
import emberline.measure.line.LineReport;
import emberline.measure.line.RadialVelocity;
import emberline.place.Activity;
import emberline.place.ActivityLevel;
import emberline.place.GravityClass;
import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.place.calibrated.CalibratedType;
import emberline.place.calibrated.TypePrior;
import emberline.place.calibrated.TypePriors;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
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

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

    private static LineReport report(Measurement lithium) {
        return new LineReport(
                List.of(
                        LineMeasurement.of(
                                CATALOGUE.feature("morelli2020/ew_ki_1.252").orElseThrow(),
                                new Measurement.Measured(5, 0.1)),
                        LineMeasurement.of(
                                CATALOGUE.feature("emberline2026/ew_lii_0.6708").orElseThrow(),
                                lithium)),
                new RadialVelocity(
                        new Measurement.NotMeasured(Measurement.Why.TOO_COARSE, ""),
                        1,
                        List.of(),
                        List.of()));
    }

    private static LithiumTest lithium(Map<String, String> row, LineReport... reports) {
        return GatheredEvidence.of(
                        new Candidate("x", 1, List.of(), row),
                        placement(GravityVerdict.notJudged("", List.of())),
                        List.of(reports),
                        PRIOR)
                .orElseThrow()
                .evidence()
                .lithium();
    }

    /** Three sigma and the 0.7 angstrom that bands feign; the deepest of several spectra counts. */
    @Test
    void lithiumComesFromTheLinesUnlessStated() {
        LineReport unseen = report(new Measurement.Measured(0.1, 0.2));
        LineReport deeper = report(new Measurement.Measured(0.1, 0.1));
        LineReport seen = report(new Measurement.Measured(4, 0.2));
        LineReport none =
                report(new Measurement.NotMeasured(Measurement.Why.NOT_COVERED, "not there"));
        assertEquals(
                new LithiumTest(LithiumTest.Outcome.SEEN, 0, true),
                lithium(Map.of(), unseen, seen));
        for (List<LineReport> order :
                List.of(List.of(unseen, deeper, none), List.of(deeper, none, unseen))) {
            LithiumTest found = lithium(Map.of(), order.toArray(new LineReport[0]));
            assertEquals(LithiumTest.Outcome.NOT_SEEN, found.outcome());
            assertEquals(1.0, found.limitAngstrom(), 1e-12);
            assertTrue(found.measured());
        }
        assertEquals(LithiumTest.unknown(), lithium(Map.of(), none));
        assertEquals(LithiumTest.notSeen(0), lithium(Map.of("lithium", "No"), seen));
        assertEquals(LithiumTest.seen(), lithium(Map.of("lithium", "YES"), unseen));
    }

    private static Halpha halpha(List<Finding> findings, ActivityLevel... levels) {
        Placement plain = placement(GravityVerdict.notJudged("", List.of()));
        Placement active =
                new Placement(
                        plain.type(),
                        plain.typeReason(),
                        plain.published(),
                        plain.calibrated(),
                        plain.reddening(),
                        plain.gravity(),
                        plain.metallicity(),
                        new Activity(Optional.empty(), List.of(levels), ""),
                        plain.kind(),
                        plain.kin(),
                        plain.pair(),
                        plain.photometric(),
                        findings);
        return evidence(active).halpha();
    }

    private static ActivityLevel level(double logRatio, boolean limit) {
        return new ActivityLevel(
                CATALOGUE.sources().get(0),
                logRatio,
                limit ? OptionalDouble.empty() : OptionalDouble.of(0.1));
    }

    /** A limit below -5 is quiet; any emission is emission; a flare or accretion goes before. */
    @Test
    void hAlphaIsWhatTheLevelsShow() {
        assertEquals(Halpha.UNKNOWN, halpha(List.of()));
        assertEquals(Halpha.UNKNOWN, halpha(List.of(), level(-4.9, true), level(-5, true)));
        assertEquals(Halpha.NO_EMISSION, halpha(List.of(), level(-5.1, true), level(-4.9, true)));
        assertEquals(
                Halpha.EMISSION,
                halpha(
                        List.of(Finding.note("pair-weak", "another")),
                        level(-5.1, true),
                        level(-4, false)));
        assertEquals(
                Halpha.ABOVE_SATURATION,
                halpha(
                        List.of(Finding.note("halpha-above-saturation", "strong")),
                        level(-3, false)));
    }

    @Test
    void aParallaxNeedsAPositiveError() {
        GatheredEvidence zero = gathered("parallax_mas", "50", "parallax_mas_err", "0");
        assertEquals("parallax-without-error", zero.findings().get(0).code());
        assertTrue(zero.evidence().astrometry().parallaxSigmaMas().isEmpty());
        GatheredEvidence age = gathered("age", "1..5Myr");
        assertTrue(age.evidence().age().isEmpty());
        assertTrue(
                age.findings().get(0).text().startsWith("column age was not used: age '1..5Myr'"),
                age.findings().toString());
        assertEquals(
                "column lithium: expected yes or no but was 'maybe'",
                gathered("lithium", "maybe").findings().get(0).text());
    }
}
