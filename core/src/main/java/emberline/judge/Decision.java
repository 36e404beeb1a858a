package emberline.judge;

import java.util.Locale;

/** The decision whether an object is below the hydrogen-burning limit. */
public enum Decision {
    /** Below the limit. */
    SUBSTELLAR,
    /** Above the limit. */
    STELLAR,
    /** The evidence does not suffice. */
    UNDECIDED;

    /**
     * The word used in all outputs.
     *
     * @return lower-case word
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
