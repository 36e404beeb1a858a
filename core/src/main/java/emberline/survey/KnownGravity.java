package emberline.survey;

import emberline.place.GravityClass;
import emberline.spectrum.Candidate;
import emberline.spectrum.SpectralType;
import java.util.EnumSet;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The gravity class that a list states: a column, or the Greek letters behind the type, as optical
 * types are written (Kirkpatrick 2005, Annual Review of Astronomy and Astrophysics 43, 195; from
 * memory): alpha for field gravity, beta for intermediate, gamma and delta for very low gravity.
 */
public final class KnownGravity {

    /** Low gravity whose class is not stated. */
    private static final String LOW = "young";

    private static final Pattern LETTER =
            Pattern.compile("(?<![a-z_])(alpha|beta|gamma|delta)(?![a-z0-9_])|[αβγδ]");

    private KnownGravity() {}

    /**
     * The gravity class of an object.
     *
     * @param candidate the object as listed, with {@code known_gravity} or {@code known_type}
     * @return what {@code known_gravity} says; where it is empty {@code FLD-G}, {@code INT-G} or
     *     {@code VL-G} by the remark on the type, {@code young} for a remark of two low classes
     *     such as {@code L5 beta/gamma}; else empty text
     */
    public static String of(Candidate candidate) {
        Optional<String> stated = candidate.text("known_gravity");
        return stated.orElseGet(
                () -> candidate.text("known_type").map(KnownGravity::remarked).orElse(""));
    }

    private static String remarked(String type) {
        if (SpectralType.parse(type).isEmpty()) {
            return "";
        }
        Set<GravityClass> classes = EnumSet.noneOf(GravityClass.class);
        Matcher letter = LETTER.matcher(type);
        while (letter.find()) {
            classes.add(ofLetter(letter.group()));
        }
        if (classes.size() == 1) {
            return classes.iterator().next().label();
        }
        return classes.isEmpty() || classes.contains(GravityClass.FLD_G) ? "" : LOW;
    }

    private static GravityClass ofLetter(String letter) {
        return switch (letter) {
            case "alpha", "α" -> GravityClass.FLD_G;
            case "beta", "β" -> GravityClass.INT_G;
            default -> GravityClass.VL_G;
        };
    }
}
