package emberline.survey;

import emberline.spectrum.Candidate;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The name that the spectra of one object share, so that a test never learns from the object it is
 * tested on.
 */
public final class ObjectGroup {

    private static final Pattern NUMBER_IN_BRACKETS = Pattern.compile(" \\(.*\\)$");
    private static final Pattern COORDINATE = Pattern.compile("J(\\d{4})\\S*?([+-]\\d{2})");

    private ObjectGroup() {}

    /**
     * The group of a row of a list: its cell {@code group}, or what its name says. Names of spectra
     * of one object are told apart by a number in brackets, or differ in the digits of a
     * coordinate.
     *
     * @param candidate a row of a list
     * @return the name of the group, e.g. {@code J0355+11}; the name of the object where it holds
     *     no coordinate
     */
    public static String of(Candidate candidate) {
        return candidate.text("group").orElseGet(() -> named(candidate.name()));
    }

    private static String named(String name) {
        String plain = NUMBER_IN_BRACKETS.matcher(name).replaceFirst("");
        Matcher coordinate = COORDINATE.matcher(plain);
        return coordinate.find() ? "J" + coordinate.group(1) + coordinate.group(2) : plain;
    }
}
