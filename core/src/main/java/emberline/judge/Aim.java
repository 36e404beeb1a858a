package emberline.judge;

import java.util.Arrays;
import java.util.EnumMap;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;

/** What an observer looks for: the question that a further observation should decide. */
public enum Aim {
    /** Is it below the hydrogen-burning limit? */
    SUBSTELLAR("substellar"),
    /** Is it younger than 150 Myr? */
    YOUNG("younger than 150 Myr"),
    /** Is it cooler than 1300 K? */
    COOLEST("cooler than 1300 K"),
    /** Is it metal-poor? */
    METAL_POOR("metal-poor"),
    /** Is it within 20 pc? */
    NEARBY("within 20 pc"),
    /** Is it an unresolved pair? */
    PAIRS("an unresolved pair");

    private final String claim;

    Aim(String claim) {
        this.claim = claim;
    }

    /**
     * The claim whose probability counts.
     *
     * @return words that follow "is"
     */
    public String claim() {
        return claim;
    }

    /**
     * The word used in options.
     *
     * @return lower-case word with hyphens
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    /**
     * Reads aims with weights: {@code substellar}, or {@code young=2,nearby}.
     *
     * @param text words separated by commas, each with a weight after {@code =} or without
     * @return weights by aim, all positive
     * @throws IllegalArgumentException if a word is no aim or a weight not positive
     */
    public static Map<Aim, Double> parse(String text) {
        Map<Aim, Double> weights = new EnumMap<>(Aim.class);
        for (String one : text.split(",", -1)) {
            String[] parts = one.trim().split("=", 2);
            Aim aim =
                    Arrays.stream(values())
                            .filter(a -> a.word().equalsIgnoreCase(parts[0].trim()))
                            .findFirst()
                            .orElseThrow(() -> unknown(parts[0]));
            weights.put(aim, parts.length == 1 ? 1 : weight(one, parts[1]));
        }
        return weights;
    }

    private static IllegalArgumentException unknown(String word) {
        return new IllegalArgumentException(
                "aim '"
                        + word
                        + "': expected "
                        + Arrays.stream(values()).map(Aim::word).collect(Collectors.joining(", ")));
    }

    private static double weight(String one, String digits) {
        try {
            double weight = Double.parseDouble(digits.trim());
            if (weight > 0 && !Double.isInfinite(weight)) {
                return weight;
            }
        } catch (NumberFormatException e) {
            throw new IllegalArgumentException("aim '" + one + "': expected a number after =", e);
        }
        throw new IllegalArgumentException("aim '" + one + "': expected a positive weight");
    }
}
