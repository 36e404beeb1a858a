package emberline.demo;

import java.math.BigDecimal;
import java.math.MathContext;

/** Rounding to significant digits, so that files are small and the same everywhere. */
final class SignificantDigits {

    private SignificantDigits() {}

    /**
     * Rounds a number.
     *
     * @param value finite
     * @param digits number of significant digits
     * @return the nearest double to the rounded decimal
     */
    static double round(double value, int digits) {
        return new BigDecimal(value).round(new MathContext(digits)).doubleValue();
    }
}
