package emberline.read;

import java.nio.charset.StandardCharsets;
import java.util.Locale;
import java.util.Set;

/**
 * Reads decimal numbers straight from bytes. Numbers whose digits are exact in double arithmetic
 * (at most 2^53 times or over a power of ten up to 10^22, which are exact too) are computed with
 * one rounding, hence equal to {@link Double#parseDouble}; all others are left to it.
 */
final class DecimalText {

    private static final int MAX_EXACT_POWER = 22;
    private static final long MAX_EXACT_DIGITS = 1L << 53;
    private static final int NO_EXPONENT = Integer.MIN_VALUE;
    private static final double[] POWERS_OF_TEN = powersOfTen();
    private static final Set<String> NO_NUMBER =
            Set.of(
                    "nan",
                    "-nan",
                    "+nan",
                    "null",
                    "none",
                    "na",
                    "n/a",
                    "--",
                    "-",
                    "...",
                    "masked",
                    "inf",
                    "-inf",
                    "+inf",
                    "infinity",
                    "-infinity",
                    "indef");

    private DecimalText() {}

    /** Tells apart what a cell can hold. */
    enum Cell {
        NUMBER,
        /** Empty or a word for "no value". */
        NO_VALUE,
        /** Anything else. */
        OTHER
    }

    /** Whether a cell is a number, a word for none, or something else. */
    static Cell kind(byte[] text, int from, int to) {
        if (from == to) {
            return Cell.NO_VALUE;
        }
        if (!Double.isNaN(parse(text, from, to))) {
            return Cell.NUMBER;
        }
        String word = new String(text, from, to - from, StandardCharsets.ISO_8859_1);
        return NO_NUMBER.contains(word.toLowerCase(Locale.ROOT)) ? Cell.NO_VALUE : Cell.OTHER;
    }

    /** The number in a range of bytes without blanks around it; NaN where it is not a number. */
    static double parse(byte[] text, int from, int to) {
        int at = from;
        boolean negative = at < to && text[at] == '-';
        if (negative || (at < to && text[at] == '+')) {
            at++;
        }
        long digits = 0;
        int scale = 0;
        boolean point = false;
        boolean seen = false;
        for (; at < to; at++) {
            int c = text[at];
            if (c >= '0' && c <= '9') {
                if (digits >= MAX_EXACT_DIGITS) {
                    return byLibrary(text, from, to);
                }
                digits = digits * 10 + (c - '0');
                scale -= point ? 1 : 0;
                seen = true;
            } else if (c == '.' && !point) {
                point = true;
            } else {
                break;
            }
        }
        int exponent = at < to ? exponent(text, at, to) : 0;
        if (!seen || exponent == NO_EXPONENT) {
            return Double.NaN;
        }
        scale += exponent;
        if (digits > MAX_EXACT_DIGITS || Math.abs(scale) > MAX_EXACT_POWER) {
            return byLibrary(text, from, to);
        }
        double value = scale < 0 ? digits / POWERS_OF_TEN[-scale] : digits * POWERS_OF_TEN[scale];
        return negative ? -value : value;
    }

    /** The exponent that begins at a letter E or D; the least int where there is none. */
    private static int exponent(byte[] text, int at, int to) {
        if ("eEdD".indexOf(text[at]) < 0) {
            return NO_EXPONENT;
        }
        int i = at + 1;
        boolean negative = i < to && text[i] == '-';
        if (negative || (i < to && text[i] == '+')) {
            i++;
        }
        if (i == to || to - i > 3) {
            return NO_EXPONENT;
        }
        int value = 0;
        for (; i < to; i++) {
            if (text[i] < '0' || text[i] > '9') {
                return NO_EXPONENT;
            }
            value = value * 10 + (text[i] - '0');
        }
        return negative ? -value : value;
    }

    private static double byLibrary(byte[] text, int from, int to) {
        char[] java = new char[to - from];
        for (int i = from; i < to; i++) {
            char c = (char) text[i];
            java[i - from] = c == 'D' || c == 'd' ? 'e' : c;
            if ("0123456789+-.eEdD".indexOf(c) < 0) {
                return Double.NaN;
            }
        }
        try {
            return Double.parseDouble(new String(java));
        } catch (NumberFormatException e) {
            return Double.NaN;
        }
    }

    private static double[] powersOfTen() {
        double[] powers = new double[MAX_EXACT_POWER + 1];
        powers[0] = 1;
        for (int i = 1; i < powers.length; i++) {
            powers[i] = powers[i - 1] * 10;
        }
        return powers;
    }
}
