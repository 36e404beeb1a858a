package emberline.place.standard;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * Two flat standards whose absolute J magnitudes are in the table: 11.539 at L0, 11.919 at L1 and
 * 13.584 at L5, each with a scatter of 0.409 mag. Two such objects scatter by 0.578 mag about their
 * difference, and twice that is allowed.
 */
class FluxRatioTest {

    private static final double REACH = 2 * 0.409 * Math.sqrt(2);

    /** Whether a sum in which the second is so much fainter in J is allowed. */
    private static boolean allows(double one, double two, double fainterMag, List<Range> ranges) {
        double first = 3;
        double second = 0.7;
        StandardLibrary.Level level =
                FlatStandards.level(
                        FlatStandards.of("one", one, first), FlatStandards.of("two", two, second));
        double a = 2;
        double b = a * first / second * Math.pow(10, -0.4 * fainterMag);
        return FluxRatio.allows(level, ranges, 0, 1, new ScaleFit(a, b, 1, 50));
    }

    private static void check(double one, double two, double difference) {
        for (double sign : new double[] {-1, 1}) {
            assertTrue(allows(one, two, difference + sign * (REACH - 0.01), List.of(Range.J)));
            assertFalse(allows(one, two, difference + sign * (REACH + 0.01), List.of(Range.J)));
        }
    }

    @Test
    void wholeSubclassesAreReadFromTheTable() {
        check(10, 15, 13.584 - 11.539);
        check(15, 10, 11.539 - 13.584);
    }

    @Test
    void betweenThemMagnitudesRunStraight() {
        check(10.25, 15, 13.584 - (0.75 * 11.539 + 0.25 * 11.919));
        check(15, 10.5, (11.539 + 11.919) / 2 - 13.584);
    }

    @Test
    void withoutJOrBeyondTheTableEverythingIsAllowed() {
        assertFalse(allows(10, 15, 40, List.of(Range.H, Range.J)));
        assertTrue(allows(10, 15, 40, List.of(Range.H, Range.K)));
        assertTrue(allows(5.9, 15, 40, List.of(Range.J)));
        assertTrue(allows(10, 29.1, 40, List.of(Range.J)));
        assertFalse(allows(6, 29, 40, List.of(Range.J)), "the ends belong to the table");
    }

    @Test
    void flatStandardsHaveTheFluxTheySay() {
        assertEquals(3, FlatStandards.level(FlatStandards.of("one", 5, 3)).binned(0).mean(Range.J));
    }
}
