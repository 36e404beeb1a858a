package emberline.prepare;

/** A band in which ground-based spectrographs observe: a window of the atmosphere. */
public enum ObservedBand {
    /** 0.60 to 1.00 micron. */
    OPTICAL(0.60, 1.00),
    /** 1.10 to 1.35 micron. */
    J(1.10, 1.35),
    /** 1.45 to 1.80 micron. */
    H(1.45, 1.80),
    /** 1.95 to 2.40 micron. */
    K(1.95, 2.40);

    private final double lowMicron;
    private final double highMicron;

    ObservedBand(double lowMicron, double highMicron) {
        this.lowMicron = lowMicron;
        this.highMicron = highMicron;
    }

    /**
     * Whether a wavelength lies in the band, ends included.
     *
     * @param wavelengthMicron wavelength (micron; air or vacuum, the ends are no finer)
     * @return true if it does
     */
    public boolean contains(double wavelengthMicron) {
        return wavelengthMicron >= lowMicron && wavelengthMicron <= highMicron;
    }

    /**
     * The band as printed.
     *
     * @return {@code optical}, {@code J}, {@code H} or {@code K}
     */
    public String word() {
        return this == OPTICAL ? "optical" : name();
    }
}
