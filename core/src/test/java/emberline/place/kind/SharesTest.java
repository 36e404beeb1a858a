package emberline.place.kind;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

class SharesTest {

    @Test
    void anExponentOfTwoSquaresTheOdds() {
        double[] weights = {2, 1, 0};
        Shares.sharpen(weights, 2);
        assertArrayEquals(new double[] {0.8, 0.2, 0}, weights, 1e-15);
    }

    @Test
    void logarithmsBecomeSharesOfTheKnownKinds() {
        double[] logs = {1000 + Math.log(3), 5000, 1000};
        double divisor = Shares.fromLogarithms(logs, new boolean[] {true, false, true});
        assertArrayEquals(new double[] {0.75, 0, 0.25}, logs, 1e-12);
        assertEquals(1000 + Math.log(4), divisor, 1e-12);
    }
}
