package emberline.reports.attach;

import emberline.catalogue.Feature;
import emberline.catalogue.Kind;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * How many digits are printed of what: the same in every format.
 *
 * <p>Type numbers and their errors have two decimals, probabilities three, signal-to-noise one,
 * band indices four and equivalent widths (angstrom) three; other numbers have five significant
 * digits.
 */
public final class Digits {

    private static final int TYPE_DECIMALS = 2;
    private static final int PROBABILITY_DECIMALS = 3;
    private static final int INDEX_DECIMALS = 4;
    private static final int WIDTH_DECIMALS = 3;
    private static final int SIGNAL_DECIMALS = 1;
    private static final MathContext FIVE = new MathContext(5, RoundingMode.HALF_EVEN);

    /** Powers of ten by which a number is made whole without going through its decimal text. */
    private static final double[] TENS = {1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6};

    /** Whole numbers up to here are rounded by machine arithmetic. */
    private static final double LARGEST_WHOLE = 1e9;

    /** What is as near as this to the middle between two whole numbers is rounded by its text. */
    private static final double MIDDLE = 1e-5;

    private Digits() {}

    /**
     * A type number or its error.
     *
     * @param subclass finite number (subclass)
     * @return two decimals
     */
    public static String type(double subclass) {
        return fixed(subclass, TYPE_DECIMALS);
    }

    /**
     * A probability or a share.
     *
     * @param share 0 to 1
     * @return three decimals
     */
    public static String probability(double share) {
        return fixed(share, PROBABILITY_DECIMALS);
    }

    /**
     * A signal-to-noise ratio.
     *
     * @param ratio finite number
     * @return one decimal
     */
    public static String signal(double ratio) {
        return fixed(ratio, SIGNAL_DECIMALS);
    }

    /**
     * A value of a feature or its error.
     *
     * @param feature the feature
     * @param value finite number in its unit
     * @return four decimals for an index, three for an equivalent width (angstrom)
     */
    public static String feature(Feature feature, double value) {
        return fixed(value, feature.kind() == Kind.BAND_INDEX ? INDEX_DECIMALS : WIDTH_DECIMALS);
    }

    /**
     * A number without a rule of its own.
     *
     * @param value finite number
     * @return five significant digits, never in exponent form
     */
    public static String significant(double value) {
        return new BigDecimal(value).round(FIVE).stripTrailingZeros().toPlainString();
    }

    /**
     * A number with a stated number of significant digits.
     *
     * @param value finite number
     * @param digits 1 or more
     * @return the digits, never in exponent form
     */
    public static String significant(double value, int digits) {
        return new BigDecimal(value)
                .round(new MathContext(digits, RoundingMode.HALF_EVEN))
                .toPlainString();
    }

    /**
     * A number with a fixed number of decimals; never a negative zero.
     *
     * @param value finite number
     * @param decimals 0 or more
     * @return the digits
     * @throws IllegalArgumentException if the value is not finite
     */
    public static String fixed(double value, int decimals) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("number " + value + ": expected a finite number");
        }
        return rounded(value, decimals).toPlainString();
    }

    /**
     * A number rounded to a number of decimals, half to even. Its decimal text, which takes long to
     * make, is needed only where it lies in the middle.
     */
    private static BigDecimal rounded(double value, int decimals) {
        if (decimals < TENS.length) {
            double scaled = value * TENS[decimals];
            double whole = Math.rint(scaled);
            if (Math.abs(scaled) < LARGEST_WHOLE && Math.abs(scaled - whole) < 0.5 - MIDDLE) {
                return BigDecimal.valueOf((long) whole, decimals);
            }
        }
        return BigDecimal.valueOf(value).setScale(decimals, RoundingMode.HALF_EVEN);
    }
}
