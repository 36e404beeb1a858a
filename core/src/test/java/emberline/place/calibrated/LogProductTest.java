package emberline.place.calibrated;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class LogProductTest {

    @ParameterizedTest
    @CsvSource({"0.3, 7", "1e-14, 200", "1e30, 90", "2.5, 5000", "1e-90, 3"})
    void itIsTheSumOfTheLogarithms(double factor, int times) {
        LogProduct product = new LogProduct();
        for (int i = 0; i < times; i++) {
            product.times(factor);
        }
        double expected = times * Math.log(factor);
        assertEquals(expected, product.value(), 1e-12 * Math.abs(expected));
    }
}
