package emberline.place;

import java.util.Arrays;
import java.util.Optional;
import java.util.stream.Collectors;

/** The published gravity classes. */
public enum GravityClass {
    /** Field gravity. */
    FLD_G("FLD-G"),
    /** Intermediate gravity. */
    INT_G("INT-G"),
    /** Very low gravity. */
    VL_G("VL-G");

    private final String label;

    GravityClass(String label) {
        this.label = label;
    }

    /**
     * The class as published.
     *
     * @return {@code FLD-G}, {@code INT-G} or {@code VL-G}
     */
    public String label() {
        return label;
    }

    /**
     * The class with a label.
     *
     * @param text the label in any case
     * @return the class; empty where none is called so
     */
    public static Optional<GravityClass> ofLabel(String text) {
        return Arrays.stream(values())
                .filter(gravity -> gravity.label.equalsIgnoreCase(text.trim()))
                .findFirst();
    }

    /**
     * All labels.
     *
     * @return separated by commas
     */
    public static String labels() {
        return Arrays.stream(values()).map(GravityClass::label).collect(Collectors.joining(", "));
    }
}
