package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.survey.StageTimes.Stage;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SurveyPartTest {

    @Test
    void everyObjectIsInExactlyOnePart() {
        int parts = 7;
        int[] sizes = new int[parts];
        for (int i = 0; i < 7000; i++) {
            int holders = 0;
            for (int number = 1; number <= parts; number++) {
                if (new SurveyPart(number, parts).holds("Object J" + i)) {
                    holders++;
                    sizes[number - 1]++;
                }
            }
            assertEquals(1, holders);
        }
        for (int size : sizes) {
            assertTrue(size > 850 && size < 1150, "parts of unlike size: " + size);
        }
    }

    @Test
    void theWholeHoldsAllAndHasNoText() {
        assertTrue(SurveyPart.whole().holds("anything") && SurveyPart.whole().isWhole());
        assertEquals("", SurveyPart.parse("1/1").text());
        assertEquals("3/10", SurveyPart.parse(" 3/10 ").text());
    }

    @ParameterizedTest
    @ValueSource(strings = {"0/3", "4/3", "x", "1", "1/0", "-1/2", "99999999/3"})
    void whatIsNoPartIsRefused(String text) {
        IllegalArgumentException refused =
                assertThrows(IllegalArgumentException.class, () -> SurveyPart.parse(text));
        assertTrue(refused.getMessage().contains("expected i/n"), refused.getMessage());
    }

    @Test
    void timesAreSummedAlsoWhereSomethingFails() {
        StageTimes times = new StageTimes();
        assertEquals(3, times.<Integer, RuntimeException>timed(Stage.READ, () -> 3));
        assertThrows(
                IllegalStateException.class,
                () ->
                        times.timed(
                                Stage.JUDGE,
                                () -> {
                                    throw new IllegalStateException("no");
                                }));
        assertTrue(times.seconds(Stage.READ) > 0 && times.seconds(Stage.JUDGE) > 0);
        assertEquals(0, times.seconds(Stage.PLACE));
    }
}
