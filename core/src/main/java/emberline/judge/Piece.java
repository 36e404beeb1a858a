package emberline.judge;

/** The pieces of evidence, in the order in which a ledger adds them. */
public enum Piece {
    /** The spectral type, by way of the effective temperature. */
    TYPE("spectral type", true),
    /** The luminosity from a parallax and a magnitude. */
    LUMINOSITY("luminosity", true),
    /** An age that is stated. */
    AGE("stated age", false),
    /** The gravity class. */
    GRAVITY("gravity class", false),
    /** Li I 6708. */
    LITHIUM("lithium", true),
    /** H alpha. */
    HALPHA("H alpha", false),
    /** The tangential velocity. */
    VELOCITY("tangential velocity", false);

    private final String label;
    private final boolean tellsMass;

    Piece(String label, boolean tellsMass) {
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

    /** Whether it is more than another way to tell the age. */
    boolean tellsMass() {
        return tellsMass;
    }
}
