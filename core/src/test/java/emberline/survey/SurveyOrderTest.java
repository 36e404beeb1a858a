package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;

import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

class SurveyOrderTest {

    @Test
    void theGreatestScoreComesFirstAndTiesKeepTheOrderOfTheList() {
        assertArrayEquals(
                new int[] {3, 1, 4, 2, 5},
                SurveyOrder.ranks(
                        List.of(
                                OptionalDouble.of(0.2),
                                OptionalDouble.of(0.9),
                                OptionalDouble.of(0.2),
                                OptionalDouble.of(0.5),
                                OptionalDouble.empty())));
    }

    @Test
    void objectsWithoutScoreComeLast() {
        assertArrayEquals(
                new int[] {2, 1, 3},
                SurveyOrder.ranks(
                        List.of(
                                OptionalDouble.empty(),
                                OptionalDouble.of(0),
                                OptionalDouble.empty())));
    }
}
