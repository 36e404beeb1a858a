package emberline.place.standard;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import org.junit.jupiter.api.Test;

/** Levels, ranges and shares of false alarms of invented standards. */
class StandardLibraryTest {

    private static final List<Range> JH = List.of(Range.J, Range.H);

    private static Standard power(double resolvingPower) {
        return FlatStandards.of("power " + resolvingPower, 10, resolvingPower, 0.65, 2.45, w -> 1);
    }

    private static void checkGrid(int expected, StandardLibrary library, double resolvingPower) {
        assertEquals(
                new CommonGrid(expected).size(),
                library.level(resolvingPower).grid().size(),
                "at " + resolvingPower);
    }

    /** The finest of 60, 80, 100 and 120 that neither the object nor a standard exceeds. */
    @Test
    void theLevelIsOfTheCoarsestSpectrum() {
        StandardLibrary fine = new StandardLibrary(List.of(power(500), power(130)));
        checkGrid(120, fine, 2000);
        checkGrid(120, fine, 120);
        checkGrid(100, fine, 119);
        checkGrid(80, fine, 99);
        checkGrid(60, fine, 79);
        checkGrid(60, fine, 20);
        StandardLibrary coarse = new StandardLibrary(List.of(power(500), power(90)));
        checkGrid(80, coarse, 2000);
        assertSame(coarse.level(2000), coarse.level(81), "binned once");
        checkGrid(60, new StandardLibrary(List.of()), 2000);
    }

    @Test
    void onlyStandardsThatCoverAllRangesAreTaken() {
        StandardLibrary.Level level =
                FlatStandards.level(
                        FlatStandards.of("all", 10, 1),
                        FlatStandards.of("J only", 11, 120, 1.0, 1.4, w -> 1),
                        FlatStandards.of("J to K", 12, 120, 1.0, 2.45, w -> 1));
        assertArrayEquals(new int[] {0, 2}, level.covering(JH, k -> true));
        assertArrayEquals(new int[] {2}, level.covering(JH, k -> k > 0));
        assertArrayEquals(new int[] {0, 1, 2}, level.covering(List.of(Range.J), k -> true));
        assertEquals(3, level.size());
    }

    /**
     * Two standards share all with the object and four share H and K: most bins times standards.
     */
    @Test
    void theCommonRangesAreWorthMost() {
        List<Standard> standards = new ArrayList<>();
        standards.add(FlatStandards.of("all", 10, 120, 1.0, 2.45, w -> 1));
        for (int k = 0; k < 8; k++) {
            standards.add(FlatStandards.of("H, K " + k, 10, 120, 1.4, 2.45, w -> 1));
        }
        StandardLibrary.Level level = FlatStandards.level(standards.toArray(Standard[]::new));
        Binned object = level.binned(0);
        assertEquals(
                Set.of(Range.H, Range.K),
                Set.copyOf(StandardLibrary.common(level, object, k -> true)));
        assertEquals(
                Set.of(Range.J, Range.H, Range.K),
                Set.copyOf(StandardLibrary.common(level, object, k -> k == 0)).stream()
                        .filter(range -> range != Range.Y)
                        .collect(java.util.stream.Collectors.toSet()));
        assertTrue(StandardLibrary.common(level, object, k -> false).isEmpty());
    }

    private static Standard sloped(int k) {
        double slope = -2 + 0.15 * k;
        return FlatStandards.of(
                "s" + k, 6 + k, 120, 1.0, 1.9, w -> Math.pow(w, slope) + 0.05 * Math.sin(40 * w));
    }

    /** Of n single objects none or all look as good as asked: 1 / (n + 1), or 1. */
    @Test
    void falseAlarmsAreCountedFromNineteenStandardsOn() {
        List<Standard> standards = new ArrayList<>();
        for (int k = 0; k < 18; k++) {
            standards.add(sloped(k));
        }
        assertTrue(
                FlatStandards.level(standards.toArray(Standard[]::new))
                        .pFalseAlarm(JH, 1)
                        .isEmpty());
        standards.add(sloped(18));
        StandardLibrary.Level level = FlatStandards.level(standards.toArray(Standard[]::new));
        assertEquals(1 / 20.0, level.pFalseAlarm(JH, 1e9).orElseThrow(), 1e-12);
        assertEquals(1, level.pFalseAlarm(JH, 1).orElseThrow(), 1e-12);
        double some = level.pFalseAlarm(JH, 1.0001).orElseThrow();
        assertTrue(some >= 1 / 20.0 && some <= 1, "" + some);
    }

    /** A standard that is one of them fits itself, scaled; one without common bins does not. */
    @Test
    void oneStandardIsFittedByItsScale() {
        Standard narrow = FlatStandards.of("narrow", 10, 120, 1.40, 1.55, w -> 1);
        StandardLibrary.Level level =
                FlatStandards.level(FlatStandards.of("bright", 10, 4), narrow, sloped(3));
        ScaleFit.Target target = new ScaleFit.Target(level.binned(0), JH);
        StandardMatch match = level.single(target, 0).orElseThrow();
        assertEquals(1, match.scale(), 1e-9);
        assertEquals(0, match.secondScale());
        assertEquals(0, match.chiSquare(), 1e-9);
        assertEquals(level.binned(0).good(JH) - 1, match.degreesOfFreedom());
        assertEquals("bright", match.first().name());
        assertTrue(match.second().isEmpty());
        assertTrue(level.single(target, 2).orElseThrow().chiSquare() > 1);
        int bins = level.binned(1).good(JH);
        assertEquals(bins >= 5, level.single(target, 1).isPresent(), bins + " bins");
    }
}
