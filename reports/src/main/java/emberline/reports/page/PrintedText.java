package emberline.reports.page;

import emberline.reports.attach.Digits;

/** Text of a terminal with the signs of print, and numbers that span many powers of ten. */
final class PrintedText {

    private static final String RAISED =
            "\u2070\u00b9\u00b2\u00b3\u2074\u2075\u2076\u2077\u2078\u2079";

    /** Powers of ten from which a number is written with its power. */
    private static final int PLAIN = 4;

    private PrintedText() {}

    /** A text with plus-minus, minus and comparison signs. */
    static String signs(String text) {
        return text.replace("+-", "\u00b1")
                .replace(">=", "\u2265")
                .replace("<=", "\u2264")
                .replaceAll("(?<=[ (])-(?=[0-9])", "\u2212")
                .replace("Msun", "solar masses");
    }

    /** A text with these signs and the first letter a capital. */
    static String line(String text) {
        String signs = signs(text);
        return signs.isEmpty()
                ? ""
                : signs.substring(0, 1).toUpperCase(java.util.Locale.ROOT) + signs.substring(1);
    }

    /** A line that ends with a full stop. */
    static String sentence(String text) {
        String line = line(text);
        return line.endsWith(".") ? line : line + ".";
    }

    /**
     * A positive number to three digits.
     *
     * @param log10 its logarithm, finite
     * @return for instance {@code 0.138} or {@code 9.05 \u00d7 10\u00b9\u00b9}
     */
    static String power(double log10) {
        if (Math.abs(log10) < PLAIN) {
            return Digits.significant(Math.pow(10, log10), 3);
        }
        int power = (int) Math.floor(log10);
        String digits = Digits.fixed(Math.pow(10, log10 - power), 2);
        StringBuilder text = new StringBuilder(digits).append(" \u00d7 10");
        if (power < 0) {
            text.append('\u207b');
        }
        Integer.toString(Math.abs(power))
                .chars()
                .forEach(digit -> text.append(RAISED.charAt(digit - '0')));
        return text.toString();
    }
}
