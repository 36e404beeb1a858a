package emberline.reports.attach;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class DigitsTest {

    @ParameterizedTest
    @CsvSource({
        "0.12345, 4, 0.1234",
        "0.12355, 4, 0.1236",
        "-0.12345, 4, -0.1234",
        "2.5, 0, 2",
        "3.5, 0, 4",
        "0.15, 1, 0.2",
        "1.005, 2, 1.00",
        "-0.00004, 4, 0.0000",
        "-0.0, 2, 0.00",
        "1e20, 2, 100000000000000000000.00",
        "4.9e-324, 3, 0.000",
        "0.1234567, 8, 0.12345670"
    })
    void aNumberIsRoundedByItsDecimalTextHalfToEven(double value, int decimals, String expected) {
        assertEquals(expected, Digits.fixed(value, decimals));
    }

    /** The short way of rounding must tell what the long one tells, near middles most of all. */
    @Test
    void everyNumberIsRoundedAsItsDecimalTextIs() {
        SplittableRandom random = new SplittableRandom(1);
        for (int i = 0; i < 200_000; i++) {
            int decimals = random.nextInt(7);
            double size = Math.pow(10, random.nextDouble(-8, 10));
            double value = random.nextDouble(-1, 1) * size;
            if (i % 2 == 0) {
                value = (Math.rint(value) + 0.5) / Math.pow(10, decimals);
                value += random.nextInt(-2, 3) * Math.ulp(value);
            }
            String expected =
                    BigDecimal.valueOf(value)
                            .setScale(decimals, RoundingMode.HALF_EVEN)
                            .toPlainString();
            assertEquals(expected, Digits.fixed(value, decimals), value + " to " + decimals);
        }
    }

    @Test
    void noNumberHasNoDigits() {
        assertThrows(IllegalArgumentException.class, () -> Digits.fixed(Double.NaN, 2));
        assertThrows(
                IllegalArgumentException.class, () -> Digits.fixed(Double.POSITIVE_INFINITY, 2));
    }

    @ParameterizedTest
    @CsvSource({"1999.96, 2000", "0.000123456, 0.00012346", "-3.5, -3.5", "123456, 123460"})
    void otherNumbersHaveFiveSignificantDigits(double value, String expected) {
        assertEquals(expected, Digits.significant(value));
    }
}
