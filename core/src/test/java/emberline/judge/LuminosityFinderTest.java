package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class LuminosityFinderTest {

    private static final Evidence L2 = Evidence.ofType(12, 0.5, Optional.empty());

    private final LuminosityFinder finder =
            new LuminosityFinder(new PropertyRelations(), JudgeNumbers.standard());

    private Optional<LuminosityFinder.Measured> found(
            double pc, double sigma, Map<MagnitudeBand, Magnitude> magnitudes) {
        return finder.find(
                L2.withPhotometry(magnitudes),
                new DistanceEstimate(Estimate.normal(pc, sigma), "parallax"));
    }

    /**
     * M_H 13 is the origin of the polynomials of relations.csv: log L -4.40444 with rms 0.026 on
     * the field, -4.38044 with 0.030 on the young sequence; 0.05 dex are added to either.
     */
    @Test
    void hGivesTheLuminosityOfTheRelation() {
        LuminosityFinder.Measured measured =
                found(
                                100,
                                10,
                                Map.of(
                                        MagnitudeBand.H_2MASS, new Magnitude(18, 0.05),
                                        MagnitudeBand.J_2MASS, new Magnitude(19, 0.05)))
                        .orElseThrow();
        assertEquals(MagnitudeBand.H_2MASS, measured.band());
        assertEquals(13, measured.absoluteMag(), 1e-9);
        double mag = Math.hypot(0.05, 5 / Math.log(10) * 0.1);
        assertEquals(mag, measured.absoluteSigma(), 1e-9);
        assertEquals(-4.40444, measured.field().value(), 1e-4);
        assertEquals(-4.38044, measured.young().value(), 1e-4);
        assertEquals(
                Math.sqrt(0.026 * 0.026 + 0.05 * 0.05 + 0.16 * mag * mag),
                measured.field().sigmaDex(),
                1e-9);
        assertEquals(measured.young(), measured.on(Sequence.YOUNG));
        assertEquals(measured.field(), measured.on(Sequence.FIELD));
    }

    /** H of M_H 18.5 lies beyond its relation, 17.9; J at 18 is still within 18.1 of the field. */
    @Test
    void aBandBeyondItsRelationIsPassedOver() {
        assertEquals(
                MagnitudeBand.J_2MASS,
                found(
                                10,
                                0.1,
                                Map.of(
                                        MagnitudeBand.H_2MASS, new Magnitude(18.5, 0.05),
                                        MagnitudeBand.J_2MASS, new Magnitude(18, 0.05)))
                        .orElseThrow()
                        .band());
        assertTrue(
                found(10, 0.1, Map.of(MagnitudeBand.H_2MASS, new Magnitude(18.5, 0.05))).isEmpty());
        assertTrue(found(10, 0.1, Map.of()).isEmpty());
    }

    /**
     * 84% alone, 15% as pairs up to 0.3 dex brighter, 1% astray by 0.5 dex: shares of areas, with a
     * normal curve of 2.5066 sigma; a pair at its mean of -0.15 dex.
     */
    @Test
    void theCurveAllowsForPairsAndMistakes() {
        double[] curve = finder.curve(new LuminosityFinder.LogL(-4, 0.05));
        double sum = 0;
        double first = 0;
        for (int i = 0; i < curve.length; i++) {
            double logL = -9 + 0.02 * i;
            sum += curve[i] * 0.02;
            first += curve[i] * 0.02 * logL;
        }
        double root = Math.sqrt(2 * Math.PI);
        assertEquals(root, sum, 1e-3);
        assertEquals(-4 - 0.15 * 0.15, first / sum, 1e-3);
        // at the mean: pairs of 0.025, 0.075, 0.125 and 0.175 dex lie 0.5 to 3.5 sigma off
        double pairs = Math.exp(-0.125) + Math.exp(-1.125) + Math.exp(-3.125) + Math.exp(-6.125);
        assertEquals(0.84 / 0.05 + 0.01 / 0.5 + 0.15 / 6 / 0.05 * pairs, curve[250], 1e-3);
        assertEquals(0.01 / 0.5 * Math.exp(-2), curve[300], 1e-9);
    }

    /** Half on either sequence: the mean of both, with their scatter and their difference. */
    @Test
    void sequencesAreMixed() {
        Estimate mixed =
                PropertyFinder.measured(
                        new LuminosityFinder.Measured(
                                MagnitudeBand.H_2MASS,
                                13,
                                0.1,
                                new LuminosityFinder.LogL(-4.4, 0.1),
                                new LuminosityFinder.LogL(-4.2, 0.1)),
                        0.5);
        assertEquals(-4.3, mixed.median(), 1e-9);
        assertEquals(Math.hypot(0.1, 0.1), mixed.sigma(), 1e-9);
    }

    private static double at(PropertyRelations.Quantity quantity, Sequence sequence) {
        PropertyRelations relations = new PropertyRelations();
        return (quantity == PropertyRelations.Quantity.BC
                        ? relations.at(quantity, MagnitudeBand.H_2MASS, sequence, 12)
                        : relations.at(quantity, sequence, 12))
                .orElseThrow()
                .at(12);
    }

    /** Of L2 alone the relation itself; a quarter on the young sequence moves a quarter there. */
    @Test
    void propertiesByTypeMixTheSequences() {
        PropertyFinder properties = new PropertyFinder(new PropertyRelations());
        TypeMix sharp = new TypeMix(Evidence.ofType(12, 0.01, Optional.empty()));
        for (double young : new double[] {0, 0.25, 1}) {
            double teff =
                    (1 - young) * at(PropertyRelations.Quantity.TEFF, Sequence.FIELD)
                            + young * at(PropertyRelations.Quantity.TEFF, Sequence.YOUNG);
            Estimate found =
                    properties.byType(PropertyRelations.Quantity.TEFF, sharp, young).orElseThrow();
            assertEquals(teff, found.median(), 2, "K, young " + young);
            double correction =
                    (1 - young) * at(PropertyRelations.Quantity.BC, Sequence.FIELD)
                            + young * at(PropertyRelations.Quantity.BC, Sequence.YOUNG);
            assertEquals(
                    correction,
                    properties
                            .bolometricCorrections(sharp, young)
                            .get(MagnitudeBand.H_2MASS)
                            .median(),
                    0.01,
                    "mag, young " + young);
        }
        TypeMix late = new TypeMix(Evidence.ofType(33, 0.01, Optional.empty()));
        assertTrue(properties.bolometricCorrections(late, 0).isEmpty(), "no relation at Y3");
        assertTrue(properties.absoluteMagnitudes(late).isEmpty());
    }
}
