package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.EnumMap;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Decisions by the thresholds, on the limits of mass and on kinds of objects. */
class LimitsTest {

    private static final Judging JUDGING = Judging.withDefaults();

    /**
     * The lowest limit decides for substellar, the highest for stellar; thresholds belong to it.
     */
    @ParameterizedTest
    @CsvSource({
        "0.95, 1, substellar",
        "0.9499, 1, undecided",
        "0, 0.05, stellar",
        "0, 0.0501, undecided",
        "0.06, 0.94, undecided"
    })
    void allLimitsMustAgree(double low, double high, String word) {
        assertEquals(word, Limits.decide(low, high, JUDGING).word());
    }

    /** The limits that settings.csv prints, in their order. */
    @Test
    void theLimitsAreThoseOfTheTable() {
        assertEquals(new MassLimits(0.070, 0.072, 0.075, 0.01241), MassLimits.standard());
        IllegalStateException missing =
                assertThrows(
                        IllegalStateException.class, () -> JudgeNumbers.standard().of("no-such"));
        assertEquals("settings.csv: expected a row no-such", missing.getMessage());
    }

    /** Sixteen kinds: mass in four ranges, then young, then cool. */
    @Test
    void kindsAnswerTheQuestionsOfTheirAims() {
        Map<Aim, String> answers = new EnumMap<>(Aim.class);
        answers.put(Aim.SUBSTELLAR, "1100110011001100");
        answers.put(Aim.YOUNG, "0000111100001111");
        answers.put(Aim.COOLEST, "0000000011111111");
        answers.put(Aim.NEARBY, "0000000000000000");
        answers.forEach(
                (aim, expected) -> {
                    StringBuilder found = new StringBuilder();
                    for (boolean yes : Kinds.yes(aim)) {
                        found.append(yes ? '1' : '0');
                    }
                    assertEquals(expected, found.toString(), aim.word());
                });
    }

    private static double[] shares(int kindOne, double one, int kindTwo) {
        double[] share = new double[Kinds.COUNT];
        share[kindOne] = one;
        share[kindTwo] += 1 - one;
        return share;
    }

    /**
     * Mass ranges are below 0.070, to 0.072, to 0.075 and above: the two in the middle are open.
     */
    @Test
    void verdictsNeedAllThreeLimits() {
        assertEquals(
                Decision.SUBSTELLAR, Kinds.verdict(Aim.SUBSTELLAR, shares(0, 0.96, 3), JUDGING));
        assertEquals(
                Decision.SUBSTELLAR, Kinds.verdict(Aim.SUBSTELLAR, shares(12, 0.96, 3), JUDGING));
        assertEquals(
                Decision.UNDECIDED, Kinds.verdict(Aim.SUBSTELLAR, shares(1, 0.96, 3), JUDGING));
        assertEquals(
                Decision.UNDECIDED, Kinds.verdict(Aim.SUBSTELLAR, shares(2, 0.96, 3), JUDGING));
        assertEquals(Decision.STELLAR, Kinds.verdict(Aim.SUBSTELLAR, shares(3, 0.96, 0), JUDGING));
        assertEquals(Decision.SUBSTELLAR, Kinds.verdict(Aim.YOUNG, shares(4, 0.96, 3), JUDGING));
        assertEquals(Decision.STELLAR, Kinds.verdict(Aim.YOUNG, shares(4, 0.04, 3), JUDGING));
        assertEquals(Decision.UNDECIDED, Kinds.verdict(Aim.COOLEST, shares(8, 0.5, 3), JUDGING));
    }
}
