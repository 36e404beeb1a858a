package emberline.place.kind;

import java.util.Optional;
import java.util.OptionalDouble;

/** The kinds of objects that are told apart. */
public enum ObjectKind {
    /** A dwarf of M0 or later, subdwarfs, young dwarfs and unresolved pairs of dwarfs included. */
    LATE_DWARF("late dwarf"),
    /** A giant or supergiant. */
    GIANT("giant"),
    /** A dwarf earlier than M0, or a white dwarf. */
    EARLY_STAR("early star"),
    /** A carbon star. */
    CARBON_STAR("carbon star"),
    /** A star earlier than M5 seen through much interstellar dust. */
    REDDENED_BACKGROUND("reddened background"),
    /** A galaxy or quasar. */
    EXTRAGALACTIC("extragalactic"),
    /** Nothing of the above. */
    UNLIKE_KNOWN("unlike known");

    private final String label;

    ObjectKind(String label) {
        this.label = label;
    }

    /**
     * The kind in words.
     *
     * @return for instance {@code late dwarf}
     */
    public String label() {
        return label;
    }

    /** The place of this kind in arrays; model files rest on it, so kinds keep their order. */
    @SuppressWarnings("EnumOrdinal") // the one place that knows
    int position() {
        return ordinal();
    }

    /** The kind at a place. */
    @SuppressWarnings("EnumOrdinal")
    static ObjectKind at(int position) {
        return values()[position];
    }

    /**
     * The kind with a label.
     *
     * @param label for instance {@code late dwarf}
     * @return the kind, or empty where there is none of this label
     */
    public static Optional<ObjectKind> labelled(String label) {
        for (ObjectKind kind : values()) {
            if (kind.label.equals(label)) {
                return Optional.of(kind);
            }
        }
        return Optional.empty();
    }

    /**
     * The kind of an object of a reference list.
     *
     * @param known the word of the list: {@code dwarf, subdwarf, pair, giant, early, carbon,
     *     reddened, extragalactic}
     * @param typeNumber its type (M0 = 0), if it has one
     * @return the kind; empty for other words, such as a dwarf that is itself reddened
     */
    public static Optional<ObjectKind> ofReference(String known, OptionalDouble typeNumber) {
        return switch (known) {
            case "dwarf", "subdwarf", "pair" ->
                    Optional.of(typeNumber.orElse(0) < 0 ? EARLY_STAR : LATE_DWARF);
            case "giant" -> Optional.of(GIANT);
            case "early" -> Optional.of(EARLY_STAR);
            case "carbon" -> Optional.of(CARBON_STAR);
            case "reddened" -> Optional.of(REDDENED_BACKGROUND);
            case "extragalactic" -> Optional.of(EXTRAGALACTIC);
            default -> Optional.empty();
        };
    }
}
