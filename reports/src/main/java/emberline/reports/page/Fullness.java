package emberline.reports.page;

/**
 * How much of what does not carry the answer the second page says, from all to the least. What
 * carries it is said in each: only paragraphs become shorter.
 */
enum Fullness {
    /** All that is known, and every measured feature. */
    FULL(5, 30, 40, 12),
    /** Fewer kin, no ranges of relations that do not apply, measured features as room allows. */
    LESS(3, 14, 20, 4),
    /** Notes by their names only; features that hardly pull the type stand with the others. */
    SHORT(2, 8, 16, 1),
    /** The least. */
    SPARE(1, 2, 3, 0);

    private final int kin;
    private final int paragraphLines;
    private final int findings;
    private final int observations;

    Fullness(int kin, int paragraphLines, int findings, int observations) {
        this.kin = kin;
        this.paragraphLines = paragraphLines;
        this.findings = findings;
        this.observations = observations;
    }

    /** The most nearest reference objects. */
    int kin() {
        return kin;
    }

    /** The most lines of a paragraph. */
    int paragraphLines() {
        return paragraphLines;
    }

    /** The most findings, the gravest first. */
    int findings() {
        return findings;
    }

    /** The most spectra whose origin is told. */
    int spectra() {
        return this == SPARE ? 1 : Math.max(2, observations);
    }

    /** The most further observations besides the best. */
    int observations() {
        return observations;
    }

    /** Whether every measured feature must find room. */
    boolean everyFeature() {
        return this == FULL;
    }

    /** Whether the ranges of relations that do not apply are told. */
    boolean ranges() {
        return this == FULL;
    }

    /** Whether remarks that explain and notes that change nothing are told in words. */
    boolean remarks() {
        return this == FULL || this == LESS;
    }

    /** Whether what was not measured and relations that were only shown are named. */
    boolean names() {
        return this != SPARE;
    }

    /**
     * Features that pull the type by less stand with those that do not carry it (subclass). The
     * least leaves room for the papers where a hundred features pull.
     */
    double leastPullSubclass() {
        return switch (this) {
            case FULL, LESS -> 0;
            case SHORT -> 0.005;
            case SPARE -> 0.015;
        };
    }
}
