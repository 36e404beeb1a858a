package emberline.judge.plan;

import java.util.Arrays;
import java.util.Locale;
import java.util.stream.Collectors;

/** What a planned spectrum should decide. */
public enum PlanAim {
    /** The gravity class, which is given with the type. */
    GRAVITY("the gravity class"),
    /** Below the hydrogen-burning limit or not, at all three limits. */
    SUBSTELLAR("substellar or stellar"),
    /** Younger than 150 Myr or not. */
    YOUNG("younger than 150 Myr or not"),
    /** Cooler than 1300 K or not. */
    COOLEST("cooler than 1300 K or not");

    private final String question;

    PlanAim(String question) {
        this.question = question;
    }

    /**
     * The question.
     *
     * @return a few words
     */
    public String question() {
        return question;
    }

    /**
     * The word used in options.
     *
     * @return one word in lower case
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    /**
     * Reads an aim.
     *
     * @param text the word
     * @return the aim
     * @throws IllegalArgumentException if it is none that signal-to-noise of a spectrum decides
     */
    public static PlanAim parse(String text) {
        return Arrays.stream(values())
                .filter(aim -> aim.word().equalsIgnoreCase(text.trim()))
                .findFirst()
                .orElseThrow(
                        () ->
                                new IllegalArgumentException(
                                        "aim '"
                                                + text
                                                + "': expected "
                                                + Arrays.stream(values())
                                                        .map(PlanAim::word)
                                                        .collect(Collectors.joining(", "))
                                                + "; other aims do not hang on the signal-to-noise"
                                                + " of a near-infrared spectrum"));
    }
}
