package emberline.judge;

import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * What is stated about an age before the object itself is looked at: even between two ages, or
 * normal about one, cut to the 10 Myr to 10 Gyr of the grids.
 *
 * @param text the statement as given
 * @param lowMyr youngest age (Myr)
 * @param highMyr oldest age (Myr)
 * @param meanMyr centre of a normal distribution (Myr); not used where it is even
 * @param sigmaMyr one sigma below the centre (Myr); 0 where the ages are even in time
 * @param sigmaAboveMyr one sigma above the centre (Myr)
 */
public record AgeStatement(
        String text,
        double lowMyr,
        double highMyr,
        double meanMyr,
        double sigmaMyr,
        double sigmaAboveMyr) {

    /** Youngest age of the grids (Myr). */
    public static final double YOUNGEST_MYR = 10;

    /** Oldest age of the grids (Myr). */
    public static final double OLDEST_MYR = 10_000;

    private static final double TAIL = 4;
    private static final String NUMBER = "(\\d+(?:\\.\\d+)?)";
    private static final String UNIT = "\\s*(Myr|Gyr)";
    private static final Pattern ABOUT =
            Pattern.compile(
                    NUMBER + "\\s*(?:\\+-|\\+/-|\u00b1)\\s*" + NUMBER + UNIT,
                    Pattern.CASE_INSENSITIVE);
    private static final Pattern BETWEEN =
            Pattern.compile(NUMBER + "\\s*\\.\\.\\s*" + NUMBER + UNIT, Pattern.CASE_INSENSITIVE);

    /** Checks that the ages are ordered and that the grids know some of them. */
    public AgeStatement {
        if (!(lowMyr < highMyr) || highMyr <= YOUNGEST_MYR || lowMyr >= OLDEST_MYR) {
            throw new IllegalArgumentException(
                    "age '" + text + "': expected a range that overlaps 10 Myr to 10 Gyr");
        }
        lowMyr = Math.max(lowMyr, YOUNGEST_MYR);
        highMyr = Math.min(highMyr, OLDEST_MYR);
    }

    /**
     * Nothing is stated: even in time from 10 Myr to 10 Gyr.
     *
     * @return the default
     */
    public static AgeStatement none() {
        return between("10..10000Myr", YOUNGEST_MYR, OLDEST_MYR);
    }

    /**
     * Even in time between two ages.
     *
     * @param text how it was given
     * @param lowMyr youngest (Myr)
     * @param highMyr oldest (Myr)
     * @return the statement
     * @throws IllegalArgumentException if the range is empty or off the grids
     */
    public static AgeStatement between(String text, double lowMyr, double highMyr) {
        return new AgeStatement(text, lowMyr, highMyr, 0, 0, 0);
    }

    /**
     * Normal about an age, with errors below and above.
     *
     * @param text how it was given
     * @param meanMyr centre (Myr)
     * @param below one sigma below (Myr), positive
     * @param above one sigma above (Myr), positive
     * @return the statement
     * @throws IllegalArgumentException if it lies off the grids
     */
    public static AgeStatement about(String text, double meanMyr, double below, double above) {
        if (!(below > 0) || !(above > 0)) {
            throw new IllegalArgumentException("age '" + text + "': expected an error above zero");
        }
        return new AgeStatement(
                text, meanMyr - TAIL * below, meanMyr + TAIL * above, meanMyr, below, above);
    }

    /**
     * Reads an age: {@code 120+-8Myr}, {@code 50..150Myr}, {@code 2..8Gyr}, or the short name of a
     * group ({@link #groups}).
     *
     * @param text as given
     * @return the statement
     * @throws IllegalArgumentException if it is none of these or lies off the grids
     */
    public static AgeStatement parse(String text) {
        Matcher about = ABOUT.matcher(text.trim());
        if (about.matches()) {
            double unit = unit(about.group(3));
            double sigma = Double.parseDouble(about.group(2)) * unit;
            return about(text.trim(), Double.parseDouble(about.group(1)) * unit, sigma, sigma);
        }
        Matcher between = BETWEEN.matcher(text.trim());
        if (between.matches()) {
            double unit = unit(between.group(3));
            return between(
                    text.trim(),
                    Double.parseDouble(between.group(1)) * unit,
                    Double.parseDouble(between.group(2)) * unit);
        }
        return YoungGroup.all().stream()
                .filter(group -> group.name().equalsIgnoreCase(text.trim()))
                .findFirst()
                .map(YoungGroup::age)
                .orElseThrow(
                        () ->
                                new IllegalArgumentException(
                                        "age '"
                                                + text
                                                + "': expected an age such as 120+-8Myr,"
                                                + " 50..150Myr or 2..8Gyr, or one of the groups "
                                                + groups()));
    }

    /**
     * Names of the groups whose ages are known.
     *
     * @return separated by blanks
     */
    public static String groups() {
        return String.join(" ", YoungGroup.all().stream().map(YoungGroup::name).toList());
    }

    private static double unit(String word) {
        return word.toLowerCase(Locale.ROOT).equals("gyr") ? 1000 : 1;
    }

    /**
     * Whether anything is stated.
     *
     * @return false for the default
     */
    public boolean isStated() {
        return !equals(none());
    }

    /** Density at an age (Myr), not normalised. */
    double density(double ageMyr) {
        if (ageMyr < lowMyr || ageMyr > highMyr) {
            return 0;
        }
        if (sigmaMyr == 0) {
            return 1;
        }
        double sigma = ageMyr < meanMyr ? sigmaMyr : sigmaAboveMyr;
        double off = (ageMyr - meanMyr) / sigma;
        return Math.exp(-off * off / 2);
    }
}
