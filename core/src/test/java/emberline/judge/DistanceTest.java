package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.GravityClass;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class DistanceTest {

    private final Judge judge = new Judge(Judging.withDefaults());

    private static OptionalDouble of(double value) {
        return OptionalDouble.of(value);
    }

    private static Evidence type(double number) {
        return Evidence.ofType(number, 0.3, Optional.empty());
    }

    @Test
    void aGoodParallaxIsItsInverse() {
        DistanceEstimate distance =
                judge.judge(type(12).withAstrometry(Astrometry.ofParallax(50, 0.05)))
                        .properties()
                        .distance()
                        .orElseThrow();
        assertEquals("parallax", distance.method());
        assertEquals(20, distance.pc().median(), 0.01);
        assertEquals(0.02, distance.pc().sigma(), 0.001);
    }

    /**
     * Even in volume: the mode lies where d^2 exp(-(1/d - p)^2 / 2s^2) has it; beyond the inverse.
     */
    @Test
    void theVolumeMakesAWeakParallaxFarther() {
        DistanceEstimate distance =
                judge.judge(type(12).withAstrometry(Astrometry.ofParallax(10, 1)))
                        .properties()
                        .distance()
                        .orElseThrow();
        double sum = 0;
        double half = 0;
        double total = 0;
        for (int pass = 0; pass < 2; pass++) {
            sum = 0;
            for (double d = 60; d < 250; d += 0.01) {
                double off = 1000 / d - 10;
                sum += d * d * Math.exp(-off * off / 2);
                if (pass == 1 && sum >= total / 2) {
                    half = d;
                    break;
                }
            }
            total = pass == 0 ? sum : total;
        }
        assertEquals(half, distance.pc().median(), 0.3);
        assertTrue(distance.pc().median() > 101);
    }

    @Test
    void photometryGivesTheModulusOfTheType() {
        Judgement judgement =
                judge.judge(
                        type(12).withPhotometry(
                                        Map.of(MagnitudeBand.W2, new Magnitude(12.22, 0.02))));
        DistanceEstimate distance = judgement.properties().distance().orElseThrow();
        assertEquals("photometry (W2)", distance.method());
        // M_W2 of L2 is 10.22 in the published table of the sequence: 25.1 pc; 16% and the type
        assertEquals(25.1, distance.pc().median(), 0.5);
        assertEquals(0.17, distance.relativeSigma(), 0.02);
    }

    @Test
    void aWeakParallaxOnlyWeighsThePhotometry() {
        Evidence photometric =
                type(12).withPhotometry(Map.of(MagnitudeBand.W2, new Magnitude(12.22, 0.02)));
        double alone = judge.judge(photometric).properties().distance().orElseThrow().pc().median();
        Judgement both = judge.judge(photometric.withAstrometry(Astrometry.ofParallax(30, 8)));
        DistanceEstimate distance = both.properties().distance().orElseThrow();
        assertEquals("photometry (W2) and parallax", distance.method());
        assertTrue(distance.pc().median() > alone);
        assertTrue(both.findings().stream().anyMatch(f -> f.code().equals("parallax-weak")));
        assertTrue(
                judge.judge(type(12).withAstrometry(Astrometry.ofParallax(-3, 8)))
                        .properties()
                        .distance()
                        .isEmpty());
    }

    /** A young L dwarf is fainter in J than a field object of its type, so it is nearer. */
    @Test
    void lowGravityHasItsOwnSequence() {
        Map<MagnitudeBand, Magnitude> j = Map.of(MagnitudeBand.J_2MASS, new Magnitude(15, 0.05));
        double field =
                judge.judge(
                                Evidence.ofType(14, 0.2, Optional.of(GravityClass.FLD_G))
                                        .withPhotometry(j))
                        .properties()
                        .distance()
                        .orElseThrow()
                        .pc()
                        .median();
        double young =
                judge.judge(
                                Evidence.ofType(14, 0.2, Optional.of(GravityClass.VL_G))
                                        .withPhotometry(j))
                        .properties()
                        .distance()
                        .orElseThrow()
                        .pc()
                        .median();
        assertTrue(young < 0.9 * field, young + " against " + field);
    }

    /**
     * Worked example of 2MASS J0355+1133 (Gaia DR3 with the radial velocity of Blake et al. 2010),
     * computed by an independent script: U, V, W -5.408, -26.761, -15.576, v_tan 29.084 km/s.
     */
    @Test
    void spaceVelocityOfAKnownMember() {
        Evidence evidence =
                Evidence.ofType(13, 0.5, Optional.of(GravityClass.VL_G))
                        .withAstrometry(
                                new Astrometry(
                                        of(58.8474),
                                        of(11.5622),
                                        of(109.1381),
                                        of(0.4833),
                                        of(223.182),
                                        of(-631.303),
                                        of(11.92)))
                        .withPhotometry(Map.of(MagnitudeBand.H_2MASS, new Magnitude(12.53, 0.03)));
        Judgement judgement = judge.judge(evidence);
        Kinematics motion = judgement.properties().kinematics().orElseThrow();
        assertEquals(29.084, motion.vtanKms(), 0.02);
        Kinematics.Space space = motion.space().orElseThrow();
        assertEquals(-5.408, space.uKms(), 0.02);
        assertEquals(-26.761, space.vKms(), 0.02);
        assertEquals(-15.576, space.wKms(), 0.02);
        assertTrue(
                judgement.findings().stream()
                        .anyMatch(
                                f ->
                                        f.code().equals("moves-like-group")
                                                && f.text().contains("ABDMG")));
        assertEquals(Decision.SUBSTELLAR, judgement.decision());
        assertTrue(judgement.properties().logLMethod().startsWith("parallax and H"));
        // -4.10 (Filippazzo et al. 2015) and -4.23 (Faherty et al. 2013), both from memory
        assertEquals(-4.17, judgement.properties().logL().orElseThrow().median(), 0.15);
    }

    @Test
    void aParallaxSharpensMassAndLuminosity() {
        Evidence alone = type(13);
        Judgement without = judge.judge(alone);
        Judgement with =
                judge.judge(
                        alone.withPhotometry(
                                        Map.of(MagnitudeBand.H_2MASS, new Magnitude(11.83, 0.03)))
                                .withAstrometry(Astrometry.ofParallax(100, 0.1)));
        assertEquals("spectral type", without.properties().logLMethod());
        double before = without.properties().logL().orElseThrow().sigma();
        assertTrue(with.properties().logL().orElseThrow().sigma() < before / 1.5);
        double mBol = with.properties().mBol().orElseThrow().median();
        assertEquals(4.74 - 2.5 * with.properties().logL().orElseThrow().median(), mBol, 1e-9);
        Judgement bright =
                judge.judge(
                        alone.withPhotometry(
                                        Map.of(MagnitudeBand.H_2MASS, new Magnitude(10.0, 0.03)))
                                .withAstrometry(Astrometry.ofParallax(100, 0.1)));
        assertTrue(
                bright.findings().stream()
                        .anyMatch(f -> f.code().equals("luminosity-unlike-type")));
    }

    private static final double STEP = 0.001;

    /**
     * Quantile of the distance modulus of a mixture: for each type a normal distribution about the
     * magnitude less the absolute one, with the scatter of the relation; all times the likelihood
     * of a parallax where there is one. Summed over moduli, in steps finer than those of the class.
     */
    private static double modulus(
            TypeMix mix, double mag, double sigma, Optional<double[]> parallax, double share) {
        PropertyRelations relations = new PropertyRelations();
        double[] density = new double[12_000];
        for (int n = 0; n < TypeAxis.SIZE; n++) {
            double type = TypeAxis.type(n);
            if (mix.type(n) == 0) {
                continue;
            }
            TypeRelation relation =
                    relations
                            .at(
                                    PropertyRelations.Quantity.ABS_MAG,
                                    MagnitudeBand.W2,
                                    Sequence.FIELD,
                                    type)
                            .orElseThrow();
            double width = Math.hypot(relation.rms(type), sigma);
            for (int i = 0; i < density.length; i++) {
                double off = (-2 + i * STEP - (mag - relation.at(type))) / width;
                density[i] += mix.type(n) * Math.exp(-off * off / 2) / width;
            }
        }
        double all = 0;
        for (int i = 0; i < density.length; i++) {
            if (parallax.isPresent()) {
                double mas = 1000 / Math.pow(10, 1 + (-2 + i * STEP) / 5);
                double off = (mas - parallax.get()[0]) / parallax.get()[1];
                density[i] *= Math.exp(-off * off / 2);
            }
            all += density[i];
        }
        double below = 0;
        for (int i = 0; i < density.length; i++) {
            below += density[i];
            if (below >= share * all) {
                return -2 + i * STEP;
            }
        }
        return Double.NaN;
    }

    private static double pc(double modulus) {
        return Math.pow(10, 1 + modulus / 5);
    }

    private final DistanceFinder finder =
            new DistanceFinder(new PropertyRelations(), JudgeNumbers.standard());

    @Test
    void photometryMixesTheTypesByTheirWeights() {
        Evidence evidence =
                Evidence.ofType(17, 2, Optional.empty())
                        .withPhotometry(Map.of(MagnitudeBand.W2, new Magnitude(13, 0.3)));
        TypeMix mix = new TypeMix(evidence);
        Estimate found = finder.find(evidence, mix).orElseThrow().pc();
        // the class works in steps of 0.05 mag: a quantile is good to a fortieth of that or so
        assertEquals(1, found.lo68() / pc(modulus(mix, 13, 0.3, Optional.empty(), 0.15866)), 2e-3);
        assertEquals(1, found.median() / pc(modulus(mix, 13, 0.3, Optional.empty(), 0.5)), 2e-3);
        assertEquals(1, found.hi95() / pc(modulus(mix, 13, 0.3, Optional.empty(), 0.975)), 2e-3);
        Optional<double[]> weak = Optional.of(new double[] {20, 10});
        Estimate both =
                finder.find(evidence.withAstrometry(Astrometry.ofParallax(20, 10)), mix)
                        .orElseThrow()
                        .pc();
        assertEquals(1, both.lo68() / pc(modulus(mix, 13, 0.3, weak, 0.15866)), 2e-3);
        assertEquals(1, both.median() / pc(modulus(mix, 13, 0.3, weak, 0.5)), 2e-3);
        assertEquals(1, both.hi68() / pc(modulus(mix, 13, 0.3, weak, 0.84134)), 2e-3);
    }

    /** The relations of H end at T8 and those of J at T9; W2 goes on to Y1. */
    @Test
    void aBandWithoutRelationForHalfOfTheTypesIsPassedOver() {
        Map<MagnitudeBand, Magnitude> hj =
                Map.of(
                        MagnitudeBand.H_2MASS, new Magnitude(17, 0.05),
                        MagnitudeBand.J_2MASS, new Magnitude(17, 0.05));
        assertEquals("photometry (H 2MASS)", method(27.8, hj));
        assertEquals("photometry (J 2MASS)", method(28.4, hj));
        assertEquals("", method(29.5, hj));
        assertEquals(
                "photometry (W2)", method(29.5, Map.of(MagnitudeBand.W2, new Magnitude(14, 0.1))));
    }

    private String method(double type, Map<MagnitudeBand, Magnitude> photometry) {
        Evidence evidence = Evidence.ofType(type, 0.3, Optional.empty()).withPhotometry(photometry);
        return finder.find(evidence, new TypeMix(evidence))
                .map(DistanceEstimate::method)
                .orElse("");
    }

    @Test
    void aParallaxOfFiveSigmaIsUsedAlone() {
        assertTrue(finder.byParallax(Astrometry.ofParallax(25, 5)));
        assertTrue(!finder.byParallax(Astrometry.ofParallax(24.9, 5)));
        assertTrue(!finder.byParallax(Astrometry.none()));
    }
}
