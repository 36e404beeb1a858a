package emberline.place;

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
}
