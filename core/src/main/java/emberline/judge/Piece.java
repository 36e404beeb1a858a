package emberline.judge;

/** The pieces of evidence, in the order in which a ledger adds them. */
public enum Piece {
    /** The spectral type, by way of the effective temperature. */
    TYPE(0, "spectral type", true),
    /** The luminosity from a parallax and a magnitude. */
    LUMINOSITY(1, "luminosity", true),
    /** An age that is stated. */
    AGE(2, "stated age", false),
    /** The gravity class. */
    GRAVITY(3, "gravity class", false),
    /** Li I 6708. */
    LITHIUM(4, "lithium", true),
    /** H alpha. */
    HALPHA(5, "H alpha", false),
    /** The tangential velocity. */
    VELOCITY(6, "tangential velocity", false);

    /** Number of pieces. */
    static final int COUNT = 7;

    private final int order;
    private final String label;
    private final boolean tellsMass;

    Piece(int order, String label, boolean tellsMass) {
        this.order = order;
        this.label = label;
        this.tellsMass = tellsMass;
    }

    /**
     * The piece in words.
     *
     * @return a short label
     */
    public String label() {
        return label;
    }

    /** Place in the order, from 0. */
    int order() {
        return order;
    }

    /** Whether it is more than another way to tell the age. */
    boolean tellsMass() {
        return tellsMass;
    }
}
