package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class LithiumEvidenceTest {

    private final LithiumEvidence lithium = new LithiumEvidence(JudgeNumbers.standard());

    /** Rows of lithium.csv: 0.7 angstrom at M8, 2 at L0, 4 at L2; linear between, level beyond. */
    @ParameterizedTest
    @CsvSource({"3, 0.5", "4, 0.5", "8, 0.7", "9, 1.35", "10, 2", "11, 3", "21, 2", "25, 1"})
    void widthsAreThoseOfTheTable(double type, double width) {
        assertEquals(width, lithium.width(type), 1e-12);
    }

    /** A limit at 0.8 of the width of L2, 4 angstrom, halves the chance of 0.9. */
    @Test
    void aShallowLimitLowersTheChance() {
        assertEquals(0.9, lithium.chance(12, 0), 1e-12);
        assertEquals(0.45, lithium.chance(12, 3.2), 1e-12);
        assertEquals(0.9 / 17, lithium.chance(12, 6.4), 1e-12);
        assertEquals(0.7, lithium.chance(17, 0), 1e-12);
    }

    /** Over types about L2 only the test that saw nothing has a limit. */
    @Test
    void theChanceIsAveragedOverTypes() {
        TypeMix sharp = new TypeMix(Evidence.ofType(12, 0.01, Optional.empty()));
        assertEquals(0.45, lithium.chance(sharp, LithiumTest.notSeen(3.2)), 0.005);
        assertEquals(
                0.9,
                lithium.chance(sharp, new LithiumTest(LithiumTest.Outcome.SEEN, 3.2, true)),
                1e-9);
        // symmetric about L7, where the chance falls evenly from 0.9 at L6 to 0.5 at L8
        TypeMix late = new TypeMix(Evidence.ofType(17, 0.2, Optional.empty()));
        assertEquals(0.7, lithium.chance(late, LithiumTest.unknown()), 1e-3);
    }

    @Test
    void youngDwarfsOfTypeLShowItLess() {
        assertEquals(0.5, lithium.youngFactor(10, 99));
        assertEquals(1, lithium.youngFactor(10, 100));
        assertEquals(1, lithium.youngFactor(9.9, 50));
    }

    /** A tenth of the lithium left is seen half of the time; noise feigns what is not there. */
    @Test
    void whatIsLeftIsSeen() {
        double half = 0.9 / 2;
        assertEquals(half + (1 - half) * 0.0005, lithium.seen(0.1, 0.9, false), 1e-12);
        assertEquals(half + (1 - half) * 0.002, lithium.seen(0.1, 0.9, true), 1e-12);
        double all = 0.9 / 1.01;
        assertEquals(all + (1 - all) * 0.0005, lithium.seen(1, 0.9, false), 1e-12);
        assertEquals(0.002, lithium.seen(0, 0.9, true), 1e-9);
    }
}
