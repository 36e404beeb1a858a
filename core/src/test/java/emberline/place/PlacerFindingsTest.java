package emberline.place;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.GivenMeasurements;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.place.calibrated.CalibratedType;
import emberline.place.kind.KindVerdict;
import emberline.place.kind.ObjectKind;
import emberline.spectrum.Finding;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/** What is said of types, gravity classes and kinds, at the limits where it is said. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class PlacerFindingsTest {

    private final FeatureCatalogue catalogue = FeatureCatalogue.standard();
    private final Measurements nothing = GivenMeasurements.of(Map.of(), 1);

    private static CalibratedType placed() {
        Map<GravityClass, double[]> weights = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            weights.put(gravity, new double[] {1, 2, 1});
        }
        return new CalibratedType(
                Optional.of(TypePosterior.of(10, 0.5, weights)), "", List.of(), 0, 0);
    }

    private static List<String> codes(List<Finding> findings) {
        return findings.stream().map(Finding::code).toList();
    }

    private List<Finding> ofType(Optional<TypeEstimate> relations, CalibratedType loci) {
        PublishedType published =
                new PublishedType(
                        relations, "", List.of(), List.of(Finding.note("own", "of relations")));
        return Placer.ofType(nothing, Optional.of(TypeEstimate.normal(10, 0.4)), published, loci);
    }

    /** Sigmas of 0.4 and 0.3 are 0.5 together: one subclass is the limit. */
    @Test
    void witnessesDisagreeBeyondTwoOfTheirJointSigma() {
        for (double side : new double[] {-1, 1}) {
            TypeEstimate near = TypeEstimate.normal(10 + side * 0.99, 0.3);
            assertEquals(List.of("own"), codes(ofType(Optional.of(near), placed())));
            TypeEstimate far = TypeEstimate.normal(10 + side * 1.25, 0.3);
            List<Finding> findings = ofType(Optional.of(far), placed());
            assertEquals(List.of("own", "witnesses-disagree"), codes(findings));
            assertTrue(findings.get(1).text().contains(": 2.5 of"), findings.get(1).text());
        }
        assertEquals(List.of("own"), codes(ofType(Optional.empty(), placed())));
    }

    @Test
    void aTypeByRelationsOnlyIsSaidToBe() {
        List<Finding> findings =
                ofType(
                        Optional.of(TypeEstimate.normal(15, 0.3)),
                        CalibratedType.none("too little measured"));
        assertEquals(List.of("own", "published-relations-only"), codes(findings));
        assertEquals("too little measured", findings.get(1).text());
        PublishedType none = new PublishedType(Optional.empty(), "", List.of(), List.of());
        assertTrue(Placer.ofType(nothing, Optional.empty(), none, placed()).isEmpty());
    }

    private GravityScore score(boolean isScored) {
        return new GravityScore(
                catalogue.feature("allers2013/feh_z").orElseThrow(),
                new Measured(1, 0.1),
                isScored ? OptionalInt.of(2) : OptionalInt.empty(),
                OptionalDouble.empty(),
                OptionalDouble.empty(),
                true,
                "");
    }

    private static GravityVerdict verdict(
            double p, List<GravityScore> scores, Optional<GravityClass> byScores) {
        return new GravityVerdict(
                Optional.of(GravityClass.VL_G),
                OptionalDouble.of(1 - p),
                OptionalDouble.of(0),
                OptionalDouble.of(p),
                "",
                scores,
                byScores);
    }

    @Test
    void aGravityClassIsUnsureBelowSevenTenths() {
        assertTrue(Placer.ofGravity(verdict(0.7, List.of(), Optional.empty()), placed()).isEmpty());
        List<Finding> unsure =
                Placer.ofGravity(verdict(0.69, List.of(), Optional.empty()), placed());
        assertEquals(List.of("gravity-class-unsure"), codes(unsure));
        assertEquals("VL-G is given with a probability of 0.69 only", unsure.get(0).text());
        assertTrue(
                Placer.ofGravity(GravityVerdict.notJudged("no type", List.of()), placed())
                        .isEmpty());
    }

    @Test
    void oneScoredFeatureWithoutPosteriorIsTooFew() {
        CalibratedType none = CalibratedType.none("too little");
        GravityVerdict one = verdict(0.9, List.of(score(true), score(false)), Optional.empty());
        assertEquals(List.of("gravity-by-one-feature"), codes(Placer.ofGravity(one, none)));
        assertTrue(Placer.ofGravity(one, placed()).isEmpty());
        GravityVerdict two = verdict(0.9, List.of(score(true), score(true)), Optional.empty());
        assertTrue(Placer.ofGravity(two, none).isEmpty());
    }

    @Test
    void scoresThatGiveAnotherClassAreNamed() {
        GravityVerdict other = verdict(0.9, List.of(), Optional.of(GravityClass.INT_G));
        List<Finding> findings = Placer.ofGravity(other, placed());
        assertEquals(List.of("gravity-scores-differ"), codes(findings));
        assertEquals("the published scores give INT-G, the posterior VL-G", findings.get(0).text());
        GravityVerdict same = verdict(0.9, List.of(), Optional.of(GravityClass.VL_G));
        assertTrue(Placer.ofGravity(same, placed()).isEmpty());
    }

    private static KindVerdict kind(double pLateDwarf) {
        return new KindVerdict(
                Map.of(ObjectKind.LATE_DWARF, pLateDwarf, ObjectKind.GIANT, 1 - pLateDwarf),
                "H",
                "");
    }

    @Test
    void onlyWhatMayBeALateDwarfGetsAType() {
        assertTrue(KindGate.refusal(kind(0.35)).isEmpty());
        assertEquals("kind: giant (p 0.66)", KindGate.refusal(kind(0.34)).orElseThrow());
        KindVerdict unknown = KindVerdict.notJudged("too noisy");
        assertTrue(KindGate.refusal(unknown).isEmpty());
        assertEquals(List.of("kind-not-judged"), codes(KindGate.findings(unknown, true)));
        assertTrue(KindGate.findings(unknown, false).isEmpty());
        assertTrue(KindGate.findings(kind(0.9), true).isEmpty());
        assertEquals(List.of("kind-unsure"), codes(KindGate.findings(kind(0.89), true)));
        assertEquals(List.of("kind-unsure"), codes(KindGate.findings(kind(0.35), true)));
        List<Finding> none = KindGate.findings(kind(0.34), true);
        assertEquals(List.of("not-a-late-dwarf"), codes(none));
        assertTrue(none.get(0).text().contains("a probability of 0.66"), none.get(0).text());
    }
}
