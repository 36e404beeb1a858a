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

    private static final Judge JUDGE = new Judge(Judging.withDefaults());

    private static OptionalDouble of(double value) {
        return OptionalDouble.of(value);
    }

    private static Evidence type(double number) {
        return Evidence.ofType(number, 0.3, Optional.empty());
    }

    @Test
    void aGoodParallaxIsItsInverse() {
        DistanceEstimate distance =
                JUDGE.judge(type(12).withAstrometry(Astrometry.ofParallax(50, 0.05)))
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
                JUDGE.judge(type(12).withAstrometry(Astrometry.ofParallax(10, 1)))
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
                JUDGE.judge(
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
        double alone = JUDGE.judge(photometric).properties().distance().orElseThrow().pc().median();
        Judgement both = JUDGE.judge(photometric.withAstrometry(Astrometry.ofParallax(30, 8)));
        DistanceEstimate distance = both.properties().distance().orElseThrow();
        assertEquals("photometry (W2) and parallax", distance.method());
        assertTrue(distance.pc().median() > alone);
        assertTrue(both.findings().stream().anyMatch(f -> f.code().equals("parallax-weak")));
        assertTrue(
                JUDGE.judge(type(12).withAstrometry(Astrometry.ofParallax(-3, 8)))
                        .properties()
                        .distance()
                        .isEmpty());
    }

    /** A young L dwarf is fainter in J than a field object of its type, so it is nearer. */
    @Test
    void lowGravityHasItsOwnSequence() {
        Map<MagnitudeBand, Magnitude> j = Map.of(MagnitudeBand.J_2MASS, new Magnitude(15, 0.05));
        double field =
                JUDGE.judge(
                                Evidence.ofType(14, 0.2, Optional.of(GravityClass.FLD_G))
                                        .withPhotometry(j))
                        .properties()
                        .distance()
                        .orElseThrow()
                        .pc()
                        .median();
        double young =
                JUDGE.judge(
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
        Judgement judgement = JUDGE.judge(evidence);
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
        Judgement without = JUDGE.judge(alone);
        Judgement with =
                JUDGE.judge(
                        alone.withPhotometry(
                                        Map.of(MagnitudeBand.H_2MASS, new Magnitude(11.83, 0.03)))
                                .withAstrometry(Astrometry.ofParallax(100, 0.1)));
        assertEquals("spectral type", without.properties().logLMethod());
        double before = without.properties().logL().orElseThrow().sigma();
        assertTrue(with.properties().logL().orElseThrow().sigma() < before / 1.5);
        double mBol = with.properties().mBol().orElseThrow().median();
        assertEquals(4.74 - 2.5 * with.properties().logL().orElseThrow().median(), mBol, 1e-9);
        Judgement bright =
                JUDGE.judge(
                        alone.withPhotometry(
                                        Map.of(MagnitudeBand.H_2MASS, new Magnitude(10.0, 0.03)))
                                .withAstrometry(Astrometry.ofParallax(100, 0.1)));
        assertTrue(
                bright.findings().stream()
                        .anyMatch(f -> f.code().equals("luminosity-unlike-type")));
    }
}
