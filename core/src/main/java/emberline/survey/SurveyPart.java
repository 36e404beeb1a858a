package emberline.survey;

import java.nio.charset.StandardCharsets;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * One of several parts into which a list is divided, each of which can be run on its own machine.
 * An object belongs to a part by its name alone, so that adding rows to a list moves no object from
 * one part to another.
 *
 * @param number number of the part, from 1
 * @param of number of parts, at least 1
 */
public record SurveyPart(int number, int of) {

    private static final SurveyPart WHOLE = new SurveyPart(1, 1);
    private static final Pattern WRITTEN = Pattern.compile("(\\d{1,7})/(\\d{1,7})");

    /** Checks the numbers. */
    public SurveyPart {
        if (!(1 <= number && number <= of)) {
            throw new IllegalArgumentException(
                    number + "/" + of + ": expected i/n with i from 1 to n, such as 3/10");
        }
    }

    /**
     * The whole list as its only part.
     *
     * @return part 1 of 1
     */
    public static SurveyPart whole() {
        return WHOLE;
    }

    /**
     * Reads a part as written.
     *
     * @param text such as {@code 3/10}
     * @return the part
     * @throws IllegalArgumentException if the text names no part; its message says what was
     *     expected
     */
    public static SurveyPart parse(String text) {
        Matcher matcher = WRITTEN.matcher(text.trim());
        if (!matcher.matches()) {
            throw new IllegalArgumentException(
                    "'" + text + "': expected i/n with i from 1 to n, such as 3/10");
        }
        return new SurveyPart(
                Integer.parseInt(matcher.group(1)), Integer.parseInt(matcher.group(2)));
    }

    /**
     * Whether this is all of the list.
     *
     * @return true for 1 of 1
     */
    public boolean isWhole() {
        return of == 1;
    }

    /**
     * Whether an object belongs to this part: by the 64-bit Fowler-Noll-Vo hash (FNV-1a) of its
     * name in UTF-8, mixed, modulo the number of parts.
     *
     * @param name name of the object as listed
     * @return whether it is in this part; it is in exactly one
     */
    public boolean holds(String name) {
        long hash = 0xcbf29ce484222325L;
        for (byte b : name.getBytes(StandardCharsets.UTF_8)) {
            hash = (hash ^ (b & 0xff)) * 0x100000001b3L;
        }
        hash ^= hash >>> 32;
        return Long.remainderUnsigned(hash, of) == number - 1;
    }

    /**
     * The part as written.
     *
     * @return such as {@code 3/10}; empty for the whole
     */
    public String text() {
        return isWhole() ? "" : number + "/" + of;
    }
}
