package emberline.place.standard;

/** A wavelength range in which a comparison with standards is made. */
public enum Range {
    /** 0.70 to 0.95 micron. */
    OPTICAL("0.70-0.95", 0.70, 0.95),
    /** 0.98 to 1.10 micron. */
    Y("Y", 0.98, 1.10),
    /** 1.10 to 1.34 micron. */
    J("J", 1.10, 1.34),
    /** 1.45 to 1.80 micron. */
    H("H", 1.45, 1.80),
    /** 1.98 to 2.38 micron. */
    K("K", 1.98, 2.38);

    private final String label;
    private final double lowMicron;
    private final double highMicron;

    Range(String label, double lowMicron, double highMicron) {
        this.label = label;
        this.lowMicron = lowMicron;
        this.highMicron = highMicron;
    }

    /**
     * The range as it stands in tables.
     *
     * @return the letter of the band, or the wavelengths (micron)
     */
    public String label() {
        return label;
    }

    /**
     * The start of the range.
     *
     * @return wavelength in vacuum (micron)
     */
    public double lowMicron() {
        return lowMicron;
    }

    /**
     * The end of the range.
     *
     * @return wavelength in vacuum (micron)
     */
    public double highMicron() {
        return highMicron;
    }
}
