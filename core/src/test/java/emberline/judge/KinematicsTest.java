package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class KinematicsTest {

    private static final OptionalDouble NO = OptionalDouble.empty();
    private static final DistanceEstimate TEN_PC =
            new DistanceEstimate(Estimate.normal(10, 2), "parallax");

    private static OptionalDouble of(double value) {
        return OptionalDouble.of(value);
    }

    /** 300 and 400 mas/yr are half an arcsecond a year: at 10 pc 5 au/yr, 4.7405 km/s each. */
    @Test
    void properMotionAndDistanceGiveTheTangentialVelocity() {
        Astrometry moving = new Astrometry(NO, NO, NO, NO, of(300), of(-400), NO);
        Kinematics motion = Kinematics.of(moving, TEN_PC).orElseThrow();
        assertEquals(5 * 4.740470446, motion.vtanKms(), 1e-9);
        assertEquals(4.740470446, motion.vtanSigmaKms(), 1e-9);
        assertTrue(motion.space().isEmpty());
        assertTrue(Kinematics.of(Astrometry.none(), TEN_PC).isEmpty());
        assertTrue(
                Kinematics.of(new Astrometry(NO, NO, NO, NO, of(300), NO, NO), TEN_PC).isEmpty());
    }

    /**
     * Radial velocities towards the galactic centre (266.4050, -28.9362 deg), the pole (192.8595,
     * 27.1283 deg) and the direction of rotation (318.0044, 48.3298 deg) are U, W and V alone.
     */
    @ParameterizedTest
    @CsvSource({
        "266.4050, -28.9362, 10, 0, 0",
        "318.0044, 48.3298, 0, 10, 0",
        "192.8595, 27.1283, 0, 0, 10"
    })
    void theAxesAreThoseOfTheGalaxy(double ra, double dec, double u, double v, double w) {
        Astrometry radial = new Astrometry(of(ra), of(dec), NO, NO, of(0), of(0), of(10));
        Kinematics.Space space = Kinematics.of(radial, TEN_PC).orElseThrow().space().orElseThrow();
        assertEquals(u, space.uKms(), 1e-3);
        assertEquals(v, space.vKms(), 1e-3);
        assertEquals(w, space.wKms(), 1e-3);
    }

    /** Without position or radial velocity there is none. */
    @Test
    void aSpaceVelocityNeedsAllSix() {
        for (int missing = 0; missing < 3; missing++) {
            Astrometry part =
                    new Astrometry(
                            missing == 0 ? NO : of(10),
                            missing == 1 ? NO : of(10),
                            NO,
                            NO,
                            of(1),
                            of(1),
                            missing == 2 ? NO : of(10));
            assertTrue(
                    Kinematics.of(part, TEN_PC).orElseThrow().space().isEmpty(), "no " + missing);
        }
    }

    /** The Hyades move with -41.6, -20.1, -0.2 in groups.csv, far from every other group. */
    @Test
    void aGroupIsNamedWithinEightKilometresASecond() {
        assertEquals(
                "HYA", new Kinematics.Space(-41.6, -20.1, -8.1).likeGroup().orElseThrow().name());
        assertTrue(new Kinematics.Space(-41.6, -20.1, -8.3).likeGroup().isEmpty());
        assertTrue(new Kinematics.Space(-41.6 - 5, -20.1 - 5, -5.2).likeGroup().isEmpty());
        // TWA and BPMG lie 3.9 km/s apart, one nearer
        assertEquals(
                "TWA", new Kinematics.Space(-12.7, -17.2, -6.3).likeGroup().orElseThrow().name());
    }

    @Test
    void aParallaxNeedsItsError() {
        for (OptionalDouble error : new OptionalDouble[] {NO, of(0), of(-1)}) {
            IllegalArgumentException refused =
                    assertThrows(
                            IllegalArgumentException.class,
                            () -> new Astrometry(NO, NO, of(50), error, NO, NO, NO));
            assertEquals("parallax 50.0 mas: expected its error beside it", refused.getMessage());
        }
    }
}
