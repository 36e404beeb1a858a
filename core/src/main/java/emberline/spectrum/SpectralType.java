package emberline.spectrum;

import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A spectral type on one scale of subclasses: M0 = 0, L0 = 10, T0 = 20, Y0 = 30. Below M0 the scale
 * runs through K7 = -1 and K5 = -2; K8 and K9, hardly in use, lie between K7 and M0.
 *
 * @param number position on the scale (subclass), finite, from -9 (K) to below 40 (Y)
 */
public record SpectralType(double number) implements Comparable<SpectralType> {

    private static final String CLASSES = "MLTY";
    private static final Pattern CODE =
            Pattern.compile("(?:[eu]?s?d/?)*(?<class>[KMLTY])\\s*(?<sub>\\d(?:\\.\\d+)?).*");

    /** Checks the range. */
    public SpectralType {
        if (!(number >= -9) || !(number < 40)) {
            throw new IllegalArgumentException(
                    "type number " + number + ": expected -9 (K) up to below 40 (Y)");
        }
    }

    /**
     * Reads a type code such as {@code M8}, {@code L3.5}, {@code sdM6} or {@code T2:}. What follows
     * the subclass (luminosity class, gravity suffix, marks of doubt) is passed over.
     *
     * @param code the type as written
     * @return the type, or empty where the code is not of class K, M, L, T or Y
     */
    public static Optional<SpectralType> parse(String code) {
        Matcher matcher = CODE.matcher(code.trim());
        if (!matcher.matches()) {
            return Optional.empty();
        }
        double sub = Double.parseDouble(matcher.group("sub"));
        char letter = matcher.group("class").charAt(0);
        if (letter == 'K') {
            return Optional.of(
                    new SpectralType(sub <= 7 ? -1 + (sub - 7) / 2 : -1 + (sub - 7) / 3));
        }
        return Optional.of(new SpectralType(CLASSES.indexOf(letter) * 10 + sub));
    }

    /**
     * The code to the nearest half subclass, as types are quoted.
     *
     * @return for instance {@code L3.5} or {@code T0}
     */
    public String code() {
        return code(Math.rint(number * 2) / 2 + 0.0); // no negative zero
    }

    /**
     * The code to a tenth of a subclass, for tables that carry an error.
     *
     * @return for instance {@code L3.4}
     */
    public String fineCode() {
        return code(Math.rint(number * 10) / 10 + 0.0);
    }

    private static String code(double rounded) {
        String letter;
        double sub;
        if (rounded < 0) {
            letter = "K";
            sub = rounded >= -1 ? 8 + rounded : 5 + (rounded + 2) * 2;
        } else {
            int index = Math.min((int) (rounded / 10), CLASSES.length() - 1);
            letter = CLASSES.substring(index, index + 1);
            sub = rounded - 10 * index;
        }
        String digits = String.format(Locale.ROOT, "%.1f", sub);
        return letter + (digits.endsWith(".0") ? digits.substring(0, digits.length() - 2) : digits);
    }

    @Override
    public int compareTo(SpectralType other) {
        return Double.compare(number, other.number);
    }

    @Override
    public String toString() {
        return code();
    }
}
