package emberline.spectrum;

import java.util.Locale;
import java.util.Optional;

/** The medium in which wavelengths are given. */
public enum Medium {
    /** Standard air. */
    AIR,
    /** Vacuum. */
    VACUUM;

    /**
     * Reads the word for a medium, in any case; a word that starts with "vac" or "air" counts.
     *
     * @param word for instance {@code vacuum}, {@code Vac}, {@code AIR}
     * @return the medium, or empty where the word names none
     */
    public static Optional<Medium> named(String word) {
        String lower = word.trim().toLowerCase(Locale.ROOT);
        if (lower.startsWith("vac")) {
            return Optional.of(VACUUM);
        }
        return lower.startsWith("air") ? Optional.of(AIR) : Optional.empty();
    }

    /**
     * The word for this medium.
     *
     * @return {@code air} or {@code vacuum}
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
