package emberline.judge;

/** The pieces of evidence, in the order in which a ledger adds them. */
public enum Piece {
    /** The spectral type, by way of the effective temperature. */
    TYPE(0, "spectral type"),
    /** The luminosity from a parallax and a magnitude. */
    LUMINOSITY(1, "luminosity"),
    /** An age that is stated. */
    AGE(2, "stated age"),
    /** The gravity class. */
    GRAVITY(3, "gravity class"),
    /** Li I 6708. */
    LITHIUM(4, "lithium"),
    /** H alpha. */
    HALPHA(5, "H alpha"),
    /** The tangential velocity. */
    VELOCITY(6, "tangential velocity");

    /** Number of pieces. */
    static final int COUNT = 7;

    private final int order;
    private final String label;

    Piece(int order, String label) {
        this.order = order;
        this.label = label;
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
}
